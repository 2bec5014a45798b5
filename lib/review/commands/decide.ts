import 'server-only';
import type { Actor } from '@/lib/auth/schema';
import { now } from '@/lib/platform/clock';
import { recordEvent } from '@/lib/platform/database/record-event';
import { inTransaction, type Work } from '@/lib/platform/database/transaction';
import { AppError, notFound } from '@/lib/platform/errors';
import type { Report } from '@/models/report';
import type { ReportRevision } from '@/models/report-revision';
import type { Review } from '@/models/review';
import { mayReview } from '../policy';
import type { VerdictInput, VerdictResult } from '../schema';
import { alreadyDecided } from './already-decided';
import { checkVerdict } from './check-verdict';
import { tellMember } from './tell-member';

/**
 * Decides about the revision of a report that waits: verified, changes requested or declined. The report's row is
 * locked, so of several moderators at once the first decides and the others are told who did. The same moderator's same
 * verdict again (a double click, a lost answer) gets the first answer.
 *
 * @throws {AppError} not-allowed for one's own report; conflict where it was decided or is no longer the newest
 * revision; bad-input where the checklist is not complete, does not lead to the verdict, or a remark points nowhere.
 */
export async function decide(actor: Actor, reportPublicId: string, input: VerdictInput): Promise<VerdictResult> {
  return inTransaction(async (work) => {
    const report = await lockReport(work, actor, reportPublicId);
    const revision = await work.models.ReportRevision.findOne({
      where: { reportId: report.id, n: input.revision },
      transaction: work.transaction,
    });
    if (!revision) throw notFound('revision of this report');
    const mine = await work.models.Review.findOne({
      where: { reportRevisionId: revision.id, reviewerId: actor.memberId },
      transaction: work.transaction,
    });
    if (mine?.verdict === input.verdict) return resultOf(work, report, revision, mine);
    if (mine || report.state !== 'submitted' || report.pendingRevisionId !== revision.id) {
      throw await alreadyDecided(work, report, revision);
    }
    await checkVerdict(work, revision, input);
    const review = await work.models.Review.create(
      {
        reportId: report.id,
        reportRevisionId: revision.id,
        authorId: report.memberId,
        reviewerId: actor.memberId,
        slot: 'first',
        verdict: input.verdict,
        checklist: input.checklist,
        reason: input.reason,
        createdAt: now(),
      },
      { transaction: work.transaction },
    );
    await work.models.ReviewRemark.bulkCreate(
      input.remarks.map(({ pointer, remark }) => ({ reviewId: review.id, pointer, remark })),
      { transaction: work.transaction },
    );
    await applyVerdict(work, actor, report, review);
    await tellMember(work, report, review, input.remarks.length);
    return resultOf(work, report, revision, review);
  });
}

async function lockReport(work: Work, actor: Actor, publicId: string): Promise<Report> {
  const { models, transaction } = work;
  const report = await models.Report.findOne({ where: { publicId }, transaction, lock: transaction.LOCK.UPDATE });
  if (!report || report.state === 'draft') throw notFound('report');
  // The role as it is now: whoever was demoted since the request began decides nothing.
  const member = await models.Member.findByPk(actor.memberId, { transaction, lock: transaction.LOCK.SHARE });
  const isActive = member?.state === 'active';
  if (!member || !isActive || !mayReview({ memberId: member.id, role: member.role }, report)) {
    const isOwn = report.memberId === actor.memberId;
    throw new AppError(
      'not-allowed',
      isOwn ? 'This is your own report: another moderator decides it.' : 'Only a moderator decides about reports.',
    );
  }
  return report;
}

async function applyVerdict(work: Work, actor: Actor, report: Report, { verdict, createdAt }: Review): Promise<void> {
  const before = { state: report.state, publishedRevisionId: report.publishedRevisionId };
  const { pendingRevisionId } = report;
  if (verdict === 'verified') {
    report.set({ state: 'verified', publishedRevisionId: pendingRevisionId, pendingRevisionId: null });
    work.touch({ kind: 'device', id: report.deviceId });
  } else if (verdict === 'declined' && report.publishedRevisionId !== null) {
    // An amendment was declined: what was verified before stays so.
    report.set({ state: 'verified', pendingRevisionId: null });
  } else {
    report.set({ state: verdict });
  }
  report.set({ decidedAt: createdAt });
  await report.save({ transaction: work.transaction });
  await recordEvent(work, {
    actorId: actor.memberId,
    action: `report.${verdict}`,
    subject: { kind: 'report', id: report.id },
    before,
    after: { state: report.state, publishedRevisionId: report.publishedRevisionId, revisionId: pendingRevisionId },
  });
  work.dropTag(`report:${report.publicId}`);
}

async function resultOf(work: Work, report: Report, revision: ReportRevision, review: Review): Promise<VerdictResult> {
  const { Device } = work.models;
  const device = await Device.findByPk(report.deviceId, { transaction: work.transaction, rejectOnEmpty: true });
  return {
    publicId: report.publicId,
    revision: revision.n,
    verdict: review.verdict,
    devicePublicId: device.publicId,
    decidedAt: review.createdAt.toISOString(),
  };
}
