import 'server-only';
import type { Work } from '@/lib/platform/database/transaction';
import { AppError } from '@/lib/platform/errors';
import { STATE_WORDS } from '@/lib/reports/schema';
import type { Report } from '@/models/report';
import type { ReportRevision } from '@/models/report-revision';
import { VERDICTS } from '../schema';

/** Tells who decided first, and which revision is current. */
export async function alreadyDecided(work: Work, report: Report, revision: ReportRevision): Promise<AppError> {
  const { models, transaction } = work;
  const review = await models.Review.findOne({ where: { reportRevisionId: revision.id }, transaction });
  const reviewer = review && (await models.PersonalDetail.findByPk(review.reviewerId, { transaction }));
  const currentId = report.pendingRevisionId ?? report.publishedRevisionId;
  const current = currentId === null ? null : await models.ReportRevision.findByPk(currentId, { transaction });
  const facts = {
    state: report.state,
    currentRevision: current?.n ?? null,
    decidedBy: review ? (reviewer?.name ?? 'a former member') : null,
    verdict: review?.verdict ?? null,
    decidedAt: review?.createdAt.toISOString() ?? null,
  };
  const message = review
    ? `${facts.decidedBy} has decided this already: ${VERDICTS[review.verdict]}. Nothing of yours was saved.`
    : current && current.n > revision.n
      ? `Revision ${current.n} has come since you opened revision ${revision.n}. Look at that one.`
      : `This report does not wait for a verdict any more: it is ${STATE_WORDS[report.state]}. Nothing of yours was saved.`;
  return new AppError('conflict', message, { facts });
}
