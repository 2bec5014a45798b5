import 'server-only';
import { QueryTypes } from 'sequelize';
import type { Pool } from '@/lib/measurement/aggregation/pooling';
import type { FigureColumns, FigureScope, InputColumns, ScopedFigure } from '../rules/columns';
import type { DeviceContribution } from '../rules/pile-figures';
import { instrumentModel, type Reading } from './verified-figures';

/** A device's part in its category, with where its row is found again. */
export interface CountedDevice extends DeviceContribution {
  ofDevice: number;
}

export interface StoredFigure extends ScopedFigure {
  id: number;
}

interface Row extends FigureColumns {
  id: number;
  deviceId: number | null;
  categoryId: number | null;
}

/** The columns of a published figure f in scope s, by the names that the code has for them. */
export const FIGURE_COLUMNS = `
  f.id, s.device_id as "deviceId", s.category_id as "categoryId", f.variant_id as "variantId", f.mode_id as "modeId",
  f.quantity, f.power_kind as "powerKind", f.supply_stratum as "supplyStratum", f.n, f.median,
  f.median_low as "medianLow", f.lower_quartile as "lowerQuartile", f.upper_quartile as "upperQuartile", f.minimum,
  f.maximum, f.interval_low as "intervalLow", f.interval_high as "intervalHigh",
  f.interval_coverage as "intervalCoverage", f.tenth_percentile as "tenthPercentile",
  f.ninetieth_percentile as "ninetiethPercentile", f.at_most as "atMost",
  f.standard_uncertainty as "standardUncertainty", f.degrees_of_freedom as "degreesOfFreedom", f.flagged,
  f.set_aside as "setAside", f.devices, f.contributors, f.instruments, f.reports, f.rule_version as "ruleVersion",
  f.receipt_hash as "receiptHash"`;

/** What is published of the scopes, with its inputs. */
export async function storedFigures(
  { sequelize, transaction }: Reading,
  scopes: { deviceIds: number[]; categoryIds: number[] },
): Promise<StoredFigure[]> {
  const rows = await sequelize.query<Row>(
    `select ${FIGURE_COLUMNS} from published_figure f join figure_scope s on s.id = f.scope_id
     where s.device_id = any($1::int[]) or s.category_id = any($2::int[])`,
    { bind: [scopes.deviceIds, scopes.categoryIds], type: QueryTypes.SELECT, transaction },
  );
  const inputs = await sequelize.query<InputColumns & { figureId: number }>(
    `select published_figure_id as "figureId", report_figure_id as "reportFigureId",
            report_revision_id as "reportRevisionId", device_id as "deviceId", voice, value, counted, flagged, reason
     from published_figure_input where published_figure_id = any($1::int[])`,
    { bind: [rows.map((row) => row.id)], type: QueryTypes.SELECT, transaction },
  );
  const byFigure = new Map<number, InputColumns[]>(rows.map((row) => [row.id, []]));
  for (const { figureId, ...input } of inputs) byFigure.get(figureId)?.push(input);
  return rows.map(({ id, deviceId, categoryId, ...columns }) => ({
    id,
    scope: scopeOf(deviceId, categoryId),
    columns,
    inputs: byFigure.get(id) ?? [],
  }));
}

function scopeOf(deviceId: number | null, categoryId: number | null): FigureScope {
  return deviceId === null ? { kind: 'category', id: categoryId ?? 0 } : { kind: 'device', id: deviceId };
}

interface ContributionRow extends Omit<DeviceContribution, 'pool' | 'instruments'>, Pool {
  categoryId: number;
  ofDevice: number;
  instruments: { kind: string; model: string }[];
}

/** What the published figures of the categories' devices bring to them, as it is stored at this moment. */
export async function storedContributions({ sequelize, transaction }: Reading, categoryIds: number[]) {
  const rows = await sequelize.query<ContributionRow>(
    `select d.category_id as "categoryId", d.id as "ofDevice", d.public_id as "deviceId", f.variant_id as "variantId",
            f.mode_id as "modeId", f.quantity, f.power_kind as "powerKind", f.supply_stratum as "supplyStratum",
            f.median, f.median_low as "medianLow", f.set_aside as "setAside",
            array_agg(distinct m.public_id) as contributors, array_agg(distinct r.public_id) as reports,
            jsonb_agg(distinct jsonb_build_object('kind', ir.kind, 'model', ir.model_name)) as instruments
     from device d
     join figure_scope s on s.device_id = d.id
     join published_figure f on f.scope_id = s.id
     join published_figure_input i on i.published_figure_id = f.id and i.counted
     join report_revision rr on rr.id = i.report_revision_id
     join report r on r.id = rr.report_id
     join member m on m.id = r.member_id
     join instrument_revision ir on ir.id = rr.instrument_revision_id
     where d.category_id = any($1::int[]) and d.state in ('new', 'confirmed')
     group by d.id, f.id`,
    { bind: [categoryIds], type: QueryTypes.SELECT, transaction },
  );
  return rows.map(
    ({ categoryId, ofDevice, instruments, variantId, modeId, quantity, powerKind, supplyStratum, ...rest }) => ({
      categoryId,
      contribution: {
        ...rest,
        ofDevice,
        pool: { variantId, modeId, quantity, powerKind, supplyStratum },
        instruments: instruments.map(({ kind, model }) => instrumentModel(kind, model)),
      } satisfies CountedDevice,
    }),
  );
}
