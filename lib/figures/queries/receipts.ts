import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/platform/database/connection';
import { presentFigure, type NamedFigure } from '../presenter';
import type { HistoryEntry, Receipt } from '../schema';
import { selectFigures } from './named-figures';

/** What a published figure rests on, by the hash of its receipt; null where no figure of today has it. */
export async function receiptByHash(hash: string): Promise<Receipt | null> {
  const [row] = await selectFigures('where f.receipt_hash = $1', [hash]);
  if (!row) return null;
  const inputs = await database().sequelize.query<Receipt['inputs'][number]>(
    `select r.public_id as "reportPublicId", rr.n as revision, d.public_id as "devicePublicId", i.voice, i.value,
            rf.standard_uncertainty as "standardUncertainty", i.counted, i.flagged, i.reason
     from published_figure_input i
     left join report_figure rf on rf.id = i.report_figure_id
     left join report_revision rr on rr.id = rf.report_revision_id
     left join report r on r.id = rr.report_id
     left join device d on d.id = i.device_id
     where i.published_figure_id = $1 order by i.voice, i.id`,
    { bind: [row.id], type: QueryTypes.SELECT },
  );
  // Alone, it neither leads nor follows.
  const figure = { ...presentFigure(row), isHeadline: false, isMain: false };
  return { scope: await nameOfScope(row), figure, inputs };
}

async function nameOfScope({ deviceId, categoryId }: NamedFigure): Promise<Receipt['scope']> {
  const [scope] = await database().sequelize.query<Receipt['scope']>(
    deviceId === null
      ? `select 'category' as kind, public_id as "publicId", name from category where id = $1`
      : `select 'device' as kind, d.public_id as "publicId", m.name || ' ' || d.model as name
         from device d join maker m on m.id = d.maker_id where d.id = $1`,
    { bind: [deviceId ?? categoryId], type: QueryTypes.SELECT },
  );
  if (!scope) throw new Error('A published figure’s device or category is gone.');
  return scope;
}

/** How the figure with this receipt came about, the oldest first. */
export async function historyOf(hash: string): Promise<HistoryEntry[]> {
  const rows = await database().sequelize.query<Omit<HistoryEntry, 'at'> & { at: Date }>(
    `select h.at, h.n, h.median, h.minimum, h.maximum, h.at_most as "atMost", e.action as cause,
            r.public_id as "reportPublicId", h.receipt_hash as "receiptHash"
     from published_figure f
     join published_figure_history h on h.scope_id = f.scope_id and h.mode_id is not distinct from f.mode_id
       and h.quantity = f.quantity and h.power_kind = f.power_kind and h.supply_stratum = f.supply_stratum
       and h.variant_id is not distinct from f.variant_id
     left join event e on e.id = h.event_id
     left join report r on e.subject_kind = 'report' and r.id = e.subject_id
     where f.receipt_hash = $1 order by h.id`,
    { bind: [hash], type: QueryTypes.SELECT },
  );
  return rows.map(({ at, ...row }) => ({ ...row, at: at.toISOString() }));
}
