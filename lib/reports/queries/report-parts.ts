import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/platform/database/connection';
import type { ReportView } from '../schema';

/** How a member is named in public: SQL over a personal_detail and a member by their aliases. */
export const memberName = (detail: string, member: string) =>
  `coalesce(${detail}.name, 'former member ' || ${member}.former_number)`;

/** The figures of a revision, in the order in which they were computed. */
export function figuresOf(revisionId: number): Promise<ReportView['figures']> {
  return database().sequelize.query<ReportView['figures'][number]>(
    `select f.id, mo.code as "modeCode", mo.name as "modeName", f.quantity, f.power_kind as "powerKind", f.value,
            f.standard_uncertainty as "standardUncertainty", f.censored_at as "censoredAt",
            f.averaging_seconds as "averagingSeconds", f.coverage, f.counted_seconds as "countedSeconds",
            jsonb_build_object('gain', f.gain, 'offset', f."offset", 'resolution', f.resolution,
              'repeatability', f.repeatability, 'drift', f.drift, 'belowLimit', f.below_limit) as parts,
            (select a.reason from set_aside a where a.report_figure_id = f.id and a.until_at is null) as "setAside"
     from report_figure f left join operating_mode mo on mo.id = f.mode_id
     where f.report_revision_id = $1 order by f.id`,
    { bind: [revisionId], type: QueryTypes.SELECT },
  );
}

/**
 * The traces of a revision.
 * @param withNames as the member called the files: that may say more of them than a measurement does.
 */
export function tracesOf(revisionId: number, withNames: boolean): Promise<ReportView['traces']> {
  return database().sequelize.query<ReportView['traces'][number]>(
    `select t.public_id as "publicId",
            case when $2 then t.file_name else 'trace-' || t.public_id || '.csv' end as "fileName", t.kind, t.power_kind as "powerKind", t.samples,
            to_char(t.starts_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS"Z"') as "startsAt",
            to_char(t.ends_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS"Z"') as "endsAt",
            t.averaging_seconds as "averagingSeconds", t.levels
     from report_revision_trace l join trace t on t.id = l.trace_id
     where l.report_revision_id = $1 order by t.id`,
    { bind: [revisionId, withNames], type: QueryTypes.SELECT },
  );
}

export function photosOf(revisionId: number): Promise<ReportView['photos']> {
  return database().sequelize.query<ReportView['photos'][number]>(
    `select a.public_id as "publicId", l.kind, l.caption, a.large_width as "largeWidth",
            a.large_height as "largeHeight", a.small_width as "smallWidth", a.small_height as "smallHeight", a.licence
     from report_revision_attachment l join attachment a on a.id = l.attachment_id
     where l.report_revision_id = $1 order by l.position`,
    { bind: [revisionId], type: QueryTypes.SELECT },
  );
}

/**
 * The review record up to a revision. While a second moderator looks, nobody is shown what the first one found.
 */
export function reviewsOf(publicId: string, revision: number): Promise<ReportView['reviews']> {
  return database().sequelize.query<ReportView['reviews'][number]>(
    `select v.n as revision, w.slot, w.verdict, w.checklist, w.reason, ${memberName('d', 'm')} as reviewer,
            to_char(w.created_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS"Z"') as "at",
            coalesce((select jsonb_agg(jsonb_build_object('pointer', x.pointer, 'remark', x.remark) order by x.id)
                      from review_remark x where x.review_id = w.id), '[]') as remarks
     from review w
     join report r on r.id = w.report_id
     join report_revision v on v.id = w.report_revision_id
     join member m on m.id = w.reviewer_id
     left join personal_detail d on d.member_id = m.id
     where r.public_id = $1 and v.n <= $2
       and not (r.state = 'second-review' and v.id = r.pending_revision_id)
     order by w.id`,
    { bind: [publicId, revision], type: QueryTypes.SELECT },
  );
}
