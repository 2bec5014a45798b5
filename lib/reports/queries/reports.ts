import 'server-only';
import { QueryTypes } from 'sequelize';
import type { Actor } from '@/lib/auth/schema';
import { database } from '@/lib/platform/database/connection';
import { AppError, notFound } from '@/lib/platform/errors';
import { maySeeReport } from '../policy';
import type { ReportListItem, ReportView } from '../schema';

interface ReportRow extends Omit<ReportView, 'figures' | 'phases' | 'traces' | 'photos' | 'reviews'> {
  revisionId: number;
  memberId: number;
  isPublished: boolean;
}

const MEMBER_NAME = `coalesce(d.name, 'former member ' || m.former_number)`;

/**
 * A report as this reader may see it: the published revision, or the one that waits for those who may see that.
 * @param which 'published' for readers' pages; 'newest' for its member and for moderators.
 * @throws {AppError} not-found, or gone where it was withdrawn.
 */
export async function reportByPublicId(
  actor: Pick<Actor, 'memberId' | 'role'> | null,
  publicId: string,
  which: 'published' | 'newest',
): Promise<ReportView> {
  const revision =
    which === 'published' ? 'r.published_revision_id' : 'coalesce(r.pending_revision_id, r.published_revision_id)';
  const [row] = await database().sequelize.query<ReportRow>(
    `select r.public_id as "publicId", r.state, r.member_id as "memberId", v.id as "revisionId", v.n as revision,
            v.content, v.hash, v.previous_hash as "previousHash", v.licence, v.created_at as "sentAt",
            r.published_revision_id is not null as "isPublished",
            jsonb_build_object('publicId', m.public_id, 'name', ${MEMBER_NAME}) as member,
            jsonb_build_object('publicId', dev.public_id, 'name', mk.name || ' ' || dev.model, 'slug', ds.slug,
                               'category', c.name, 'categorySlug', cs.slug, 'categoryId', c.id, 'id', dev.id) as device,
            case when va.id is null then null
                 else concat_ws(', ', va.generation, va.region) end as variant,
            jsonb_build_object('kind', ir.kind, 'modelName', ir.model_name, 'percentOfReading', ir.percent_of_reading,
              'percentOfRange', ir.percent_of_range, 'counts', ir.counts, 'resolutionWatts', ir.resolution_watts,
              'lowerLimitWatts', ir.lower_limit_watts, 'readsTruePower', ir.reads_true_power,
              'calibratedOn', ir.calibrated_on) as instrument,
            jsonb_build_object('code', me.code, 'name', mr.name, 'minimumSeconds', mr.minimum_seconds,
              'minimumCycles', mr.minimum_cycles, 'checklist', mr.checklist, 'caution', mr.caution) as method
     from report r
     join report_revision v on v.id = ${revision}
     join member m on m.id = r.member_id
     left join personal_detail d on d.member_id = m.id
     join device dev on dev.id = r.device_id
     join maker mk on mk.id = dev.maker_id
     join slug ds on ds.target_kind = 'device' and ds.target_id = dev.id and ds.current
     join category c on c.id = dev.category_id
     join slug cs on cs.target_kind = 'category' and cs.target_id = c.id and cs.current
     left join variant va on va.id = r.variant_id
     join instrument_revision ir on ir.id = v.instrument_revision_id
     join method_revision mr on mr.id = v.method_revision_id
     join method me on me.id = mr.method_id
     where r.public_id = $1`,
    { bind: [publicId], type: QueryTypes.SELECT },
  );
  if (!row) throw notFound('report');
  if (row.state === 'withdrawn' && which === 'published') {
    throw new AppError('gone', 'This report was withdrawn by its member. It counts nowhere any more.');
  }
  if (!maySeeReport(actor, row)) throw notFound('report');
  const { revisionId, memberId: _memberId, isPublished: _isPublished, ...report } = row;
  return {
    ...report,
    sentAt: new Date(row.sentAt).toISOString(),
    figures: await figuresOf(revisionId),
    traces: await tracesOf(revisionId),
    photos: await photosOf(revisionId),
    reviews: await reviewsOf(publicId),
  };
}

function figuresOf(revisionId: number): Promise<ReportView['figures']> {
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

function tracesOf(revisionId: number): Promise<ReportView['traces']> {
  return database().sequelize.query<ReportView['traces'][number]>(
    `select t.public_id as "publicId", t.file_name as "fileName", t.kind, t.power_kind as "powerKind", t.samples,
            to_char(t.starts_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS"Z"') as "startsAt",
            to_char(t.ends_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS"Z"') as "endsAt",
            t.averaging_seconds as "averagingSeconds", t.levels
     from report_revision_trace l join trace t on t.id = l.trace_id
     where l.report_revision_id = $1 order by t.id`,
    { bind: [revisionId], type: QueryTypes.SELECT },
  );
}

function photosOf(revisionId: number): Promise<ReportView['photos']> {
  return database().sequelize.query<ReportView['photos'][number]>(
    `select a.public_id as "publicId", l.kind, l.caption, a.large_width as "largeWidth",
            a.large_height as "largeHeight", a.small_width as "smallWidth", a.small_height as "smallHeight", a.licence
     from report_revision_attachment l join attachment a on a.id = l.attachment_id
     where l.report_revision_id = $1 order by l.position`,
    { bind: [revisionId], type: QueryTypes.SELECT },
  );
}

function reviewsOf(publicId: string): Promise<ReportView['reviews']> {
  return database().sequelize.query<ReportView['reviews'][number]>(
    `select v.n as revision, w.slot, w.verdict, w.checklist, w.reason, ${MEMBER_NAME} as reviewer,
            to_char(w.created_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS"Z"') as "at",
            coalesce((select jsonb_agg(jsonb_build_object('pointer', x.pointer, 'remark', x.remark) order by x.id)
                      from review_remark x where x.review_id = w.id), '[]') as remarks
     from review w
     join report r on r.id = w.report_id
     join report_revision v on v.id = w.report_revision_id
     join member m on m.id = w.reviewer_id
     left join personal_detail d on d.member_id = m.id
     where r.public_id = $1 order by w.id`,
    { bind: [publicId], type: QueryTypes.SELECT },
  );
}

const LIST = `
  select r.public_id as "publicId", r.state, ${MEMBER_NAME} as member, m.public_id as "memberPublicId",
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
