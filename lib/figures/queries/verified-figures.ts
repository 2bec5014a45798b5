import 'server-only';
import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { PoolableFigure, PoolingSettings } from '../rules/pile-figures';

/** Where a figure's own rows are found again, beside what the aggregation needs of it. */
export interface ReportedFigure extends PoolableFigure {
  ofDevice: number;
}

export interface Reading {
  sequelize: Sequelize;
  transaction: Transaction;
}

interface Row extends Omit<ReportedFigure, 'setAside' | 'instrumentModel'> {
  instrumentKind: string;
  modelName: string;
  setAsideReason: string | null;
}

/**
 * Every figure of the devices' verified reports, whether it counts or not; all devices' where none are named. A report
 * that was withdrawn or has lapsed yields nothing, whatever revision of it was published.
 */
export async function verifiedFigures({ sequelize, transaction }: Reading, deviceIds: number[]) {
  const rows = await sequelize.query<Row>(
    `select f.id::text as "figureId", r.public_id as "reportId", f.report_revision_id::text as "revisionId",
            m.public_id as "contributorId", null as "householdId", u.public_id as "unitId", d.public_id as "deviceId",
            d.id as "ofDevice", ir.kind as "instrumentKind", ir.model_name as "modelName", f.value,
            f.standard_uncertainty as "standardUncertainty", f.gain as "gainUncertainty", f.censored_at as "censoredAt",
            s.reason as "setAsideReason", r.variant_id as "variantId", f.mode_id as "modeId", f.quantity,
            f.power_kind as "powerKind", f.supply_class as "supplyClass", f.averaging_seconds as "averagingSeconds",
            mr.counts as "methodCounts"
     from report r
     join report_revision rr on rr.id = r.published_revision_id
     join report_figure f on f.report_revision_id = rr.id
     join method_revision mr on mr.id = rr.method_revision_id
     join instrument_revision ir on ir.id = rr.instrument_revision_id
     join device d on d.id = r.device_id
     join member m on m.id = r.member_id
     left join unit u on u.id = r.unit_id
     left join set_aside s on s.report_figure_id = f.id and s.until_at is null
     where r.device_id = any($1::int[]) and r.state not in ('withdrawn', 'lapsed')`,
    { bind: [deviceIds], type: QueryTypes.SELECT, transaction },
  );
  return rows.map(({ instrumentKind, modelName, setAsideReason, ...figure }): ReportedFigure => {
    return {
      ...figure,
      instrumentModel: instrumentModel(instrumentKind, modelName),
      setAside: setAsideReason === null ? null : { reason: setAsideReason },
    };
  });
}

/** Members write a model's name by hand: case and spaces at its ends don't make another model. */
export function instrumentModel(kind: string, modelName: string): string {
  return `${kind} ${modelName.trim().toLowerCase()}`;
}

export interface DeviceSettings extends PoolingSettings {
  deviceId: number;
  publicId: string;
  categoryId: number;
  /** A device that was refused or merged away has no voice in its category. */
  inCatalogue: boolean;
}

/** How each device's figures are pooled, by its category's revision in force. */
export async function settingsOfDevices({ sequelize, transaction }: Reading, deviceIds: number[]) {
  return sequelize.query<DeviceSettings>(
    `select d.id as "deviceId", d.public_id as "publicId", d.category_id as "categoryId",
            d.state in ('new', 'confirmed') as "inCatalogue", r.pools_variants as "poolsVariants",
            r.pools_supplies as "poolsSupplies", r.unit_spread as "unitSpread"
     from device d
     join category c on c.id = d.category_id
     join category_revision r on r.id = c.current_revision_id
     where d.id = any($1::int[]) order by d.id`,
    { bind: [deviceIds], type: QueryTypes.SELECT, transaction },
  );
}

/** The devices of the categories, in rising id. */
export async function devicesOfCategories({ sequelize, transaction }: Reading, categoryIds: number[]) {
  const rows = await sequelize.query<{ id: number }>(
    'select id from device where category_id = any($1::int[]) order by id',
    { bind: [categoryIds], type: QueryTypes.SELECT, transaction },
  );
  return rows.map((row) => row.id);
}

export async function categoriesOf({ sequelize, transaction }: Reading, ids: number[]) {
  return sequelize.query<{ id: number; publicId: string }>(
    'select id, public_id as "publicId" from category where id = any($1::int[]) order by id',
    { bind: [ids], type: QueryTypes.SELECT, transaction },
  );
}

/** Every device and category: what a recomputation from scratch goes over. */
export async function everyScope({ sequelize, transaction }: Reading) {
  const ids = async (table: 'device' | 'category') => {
    const rows = await sequelize.query<{ id: number }>(`select id from ${table} order by id`, {
      type: QueryTypes.SELECT,
      transaction,
    });
    return rows.map((row) => row.id);
  };
  return { deviceIds: await ids('device'), categoryIds: await ids('category') };
}
