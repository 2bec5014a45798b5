import 'server-only';
import { QueryTypes } from 'sequelize';
import type { Actor } from '@/lib/auth/schema';
import { database } from '@/lib/platform/database/connection';
import { notFound } from '@/lib/platform/errors';
import { reportsOfMember } from '@/lib/reports/queries/report-lists';
import { reportByPublicId } from '@/lib/reports/queries/reports';
import { findWarnings, type Peers, type SameFile } from '../rules/warnings';
import type { Desk } from '../schema';

const MOST_OTHER_REPORTS = 20;

/**
 * A report as its moderator needs it: the newest revision, what to look at, and what else its member has sent.
 * @throws {AppError} not-found where there is none that a moderator may see.
 */
export async function deskOf(actor: Actor, publicId: string): Promise<Desk> {
  const row = await database().models.Report.findOne({ where: { publicId } });
  const revisionId = row?.pendingRevisionId ?? row?.publishedRevisionId ?? null;
  if (!row || revisionId === null) throw notFound('report');
  const [report, peers, sameFiles, ofMember] = await Promise.all([
    reportByPublicId(actor, publicId, 'newest'),
    peersOf(row.id, row.deviceId, revisionId),
    sameFilesElsewhere(row.id, row.memberId, revisionId),
    reportsOfMember(row.memberId),
  ]);
  return {
    report,
    isOwn: row.memberId === actor.memberId,
    isWaiting: row.state === 'submitted',
    warnings: findWarnings({ report, peers, sameFiles }),
    otherReports: ofMember
      .filter((other) => other.publicId !== publicId && other.state !== 'draft')
      .slice(0, MOST_OTHER_REPORTS),
  };
}

function peersOf(reportId: number, deviceId: number, revisionId: number): Promise<Peers[]> {
  return database().sequelize.query<Peers>(
    `select f.id as "figureId",
            coalesce((select array_agg(coalesce(o.censored_at, o.value) order by o.id)
                      from report r join report_figure o on o.report_revision_id = r.published_revision_id
                      where r.device_id = $2 and r.id <> $1 and r.state not in ('withdrawn', 'lapsed')
                        and o.mode_id is not distinct from f.mode_id and o.quantity = f.quantity
                        and o.power_kind = f.power_kind and o.supply_class = f.supply_class
                        and not exists (select 1 from set_aside a
                                        where a.report_figure_id = o.id and a.until_at is null)), '{}') as values,
            (select p.median from published_figure p join figure_scope s on s.id = p.scope_id
             join device d on d.category_id = s.category_id
             where d.id = $2 and p.mode_id is not distinct from f.mode_id and p.quantity = f.quantity
               and p.power_kind = f.power_kind and p.supply_stratum = f.supply_class) as "categoryMedian"
     from report_figure f where f.report_revision_id = $3`,
    { bind: [reportId, deviceId, revisionId], type: QueryTypes.SELECT },
  );
}

/** Traces and photos of the revision that stand in other reports too: by the hash of the file as it came. */
function sameFilesElsewhere(reportId: number, memberId: number, revisionId: number): Promise<SameFile[]> {
  return database().sequelize.query<SameFile>(
    `select distinct 'trace' as kind, mine.index, r.public_id as "reportPublicId", r.member_id = $2 as "isSameMember"
     from (select t.id, t.file_hash, (row_number() over (order by t.id))::int - 1 as index
           from report_revision_trace l join trace t on t.id = l.trace_id where l.report_revision_id = $3) mine
     join trace other on other.file_hash = mine.file_hash
     join report_revision_trace l on l.trace_id = other.id
     join report_revision v on v.id = l.report_revision_id
     join report r on r.id = v.report_id
     where r.id <> $1
     union all
     select distinct 'photo', l.position - 1, r.public_id, r.member_id = $2
     from report_revision_attachment l
     join attachment mine on mine.id = l.attachment_id
     join attachment other on other.original_hash = mine.original_hash
     join report_revision_attachment ol on ol.attachment_id = other.id
     join report_revision v on v.id = ol.report_revision_id
     join report r on r.id = v.report_id
     where l.report_revision_id = $3 and r.id <> $1
     order by 1 desc, 2, 3`,
    { bind: [reportId, memberId, revisionId], type: QueryTypes.SELECT },
  );
}
