import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/platform/database/connection';
import type { ReportListItem } from '../schema';
import { memberName } from './report-parts';

const LIST = `
  select r.public_id as "publicId", r.state, ${memberName('d', 'm')} as member, m.public_id as "memberPublicId",
         mk.name || ' ' || dev.model as device, ds.slug as "deviceSlug", v.content ->> 'measuredOn' as "measuredOn",
         ir.kind as "instrumentKind", ir.percent_of_reading as "percentOfReading",
         coalesce((select sum(p.duration_seconds) from phase p where p.report_revision_id = v.id), 0) as "durationSeconds",
         f.value, f.standard_uncertainty as "standardUncertainty", f.censored_at as "censoredAt", f.quantity,
         coalesce((select bool_or(i.flagged) from published_figure_input i where i.report_revision_id = v.id), false)
           as flagged,
         exists (select 1 from set_aside a join report_figure rf on rf.id = a.report_figure_id
                 where rf.report_revision_id = v.id and a.until_at is null) as "setAside"
  from report r
  join member m on m.id = r.member_id
  left join personal_detail d on d.member_id = m.id
  join device dev on dev.id = r.device_id
  join maker mk on mk.id = dev.maker_id
  join slug ds on ds.target_kind = 'device' and ds.target_id = dev.id and ds.current
  join category c on c.id = dev.category_id
  join category_revision cr on cr.id = c.current_revision_id`;

const HEADLINE = `
  join instrument_revision ir on ir.id = v.instrument_revision_id
  left join report_figure f on f.report_revision_id = v.id and f.quantity = cr.basis_quantity
    and f.mode_id is not distinct from cr.basis_mode_id and f.power_kind = 'real'`;

/** The verified reports of a device, the latest first, each with its figure on the category's basis. */
export function reportsOfDevice(deviceId: number): Promise<ReportListItem[]> {
  return database().sequelize.query<ReportListItem>(
    `${LIST} join report_revision v on v.id = r.published_revision_id ${HEADLINE}
     where r.device_id = $1 and r.state not in ('withdrawn', 'lapsed') order by r.id desc`,
    { bind: [deviceId], type: QueryTypes.SELECT },
  );
}

/** A member's own reports in every state, the latest first. */
export function reportsOfMember(memberId: number): Promise<ReportListItem[]> {
  return database().sequelize.query<ReportListItem>(
    `${LIST} join report_revision v on v.id = coalesce(r.pending_revision_id, r.published_revision_id) ${HEADLINE}
     where r.member_id = $1 order by r.id desc`,
    { bind: [memberId], type: QueryTypes.SELECT },
  );
}

/** The middle of the rooms in which a device's verified reports were measured, or null where none says. */
export async function ambientOfDevice(deviceId: number): Promise<number | null> {
  const [row] = await database().sequelize.query<{ middle: number | null }>(
    `select percentile_cont(0.5) within group (order by v.ambient_celsius) as middle
     from report r join report_revision v on v.id = r.published_revision_id
     where r.device_id = $1 and r.state not in ('withdrawn', 'lapsed')`,
    { bind: [deviceId], type: QueryTypes.SELECT },
  );
  return row?.middle ?? null;
}
