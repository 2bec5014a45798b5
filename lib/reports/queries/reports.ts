import 'server-only';
import { QueryTypes } from 'sequelize';
import type { Actor } from '@/lib/auth/schema';
import { database } from '@/lib/platform/database/connection';
import { AppError, notFound } from '@/lib/platform/errors';
import { maySeeUnpublished } from '../policy';
import type { ReportState, ReportView } from '../schema';
import { figuresOf, memberName, photosOf, reviewsOf, tracesOf } from './report-parts';

type ReportRow = Omit<ReportView, 'figures' | 'traces' | 'photos' | 'reviews' | 'state'>;

interface Standing {
  memberId: number;
  state: ReportState;
  withdrawalReason: string | null;
  publishedId: number | null;
  newestId: number | null;
}

/**
 * A report as this reader may see it.
 *
 * @param which 'published' for readers' pages; 'newest' is, for its member and for moderators, the revision that waits,
 * and for everybody else the published one.
 * @throws {AppError} not-found where this reader may see nothing of it; gone where it was published and withdrawn.
 */
export async function reportByPublicId(
  actor: Pick<Actor, 'memberId' | 'role'> | null,
  publicId: string,
  which: 'published' | 'newest',
): Promise<ReportView> {
  const standing = await standingOfReport(publicId);
  const isInsider = maySeeUnpublished(actor, standing);
  const seesNewest = which === 'newest' && isInsider;
  const revisionId = seesNewest ? standing.newestId : standing.publishedId;
  if (revisionId === null) throw notFound('report');
  if (standing.state === 'withdrawn' && !seesNewest) throw withdrawn(standing.withdrawalReason);
  const report = await reportOfRevision(publicId, revisionId);
  return {
    ...report,
    // An amendment that waits changes nothing of what is published.
    state: seesNewest || standing.state === 'lapsed' ? standing.state : 'verified',
    figures: await figuresOf(revisionId),
    traces: await tracesOf(revisionId, isInsider),
    photos: await photosOf(revisionId),
    reviews: await reviewsOf(publicId, report.revision),
  };
}

function withdrawn(reason: string | null): AppError {
  const why = reason === null ? '' : ` The reason given: “${reason}”`;
  const message = `This report was withdrawn by its member and counts nowhere any more.${why}`;
  return new AppError('gone', message, { facts: { reason } });
}

async function standingOfReport(publicId: string): Promise<Standing> {
  const [row] = await database().sequelize.query<Standing>(
    `select member_id as "memberId", state, withdrawal_reason as "withdrawalReason",
            published_revision_id as "publishedId", coalesce(pending_revision_id, published_revision_id) as "newestId"
     from report where public_id = $1`,
    { bind: [publicId], type: QueryTypes.SELECT },
  );
  if (!row) throw notFound('report');
  return row;
}

async function reportOfRevision(publicId: string, revisionId: number): Promise<ReportRow> {
  const [row] = await database().sequelize.query<ReportRow>(
    `select r.public_id as "publicId", v.n as revision,
            v.content, v.hash, v.previous_hash as "previousHash", v.licence, v.created_at as "sentAt",
            jsonb_build_object('publicId', m.public_id, 'name', ${memberName('d', 'm')}) as member,
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
     join report_revision v on v.report_id = r.id and v.id = $2
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
    { bind: [publicId, revisionId], type: QueryTypes.SELECT },
  );
  if (!row) throw notFound('report');
  return { ...row, sentAt: new Date(row.sentAt).toISOString() };
}
