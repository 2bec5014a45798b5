import 'server-only';
import type { Actor } from '@/lib/auth/schema';
import { now } from '@/lib/platform/clock';
import { recordEvent } from '@/lib/platform/database/record-event';
import { inTransaction } from '@/lib/platform/database/transaction';
import { AppError, notFound } from '@/lib/platform/errors';
import { mayWithdraw } from '../policy';

/**
 * Withdraws one's own report: it stays on the record, but counts nowhere any more.
 * @param reason for whoever follows a link to it, or null.
 * @throws {AppError} not-found where it is not one's own; conflict where its state doesn't allow it.
 */
export async function withdrawReport(
  actor: Actor,
  reportPublicId: string,
  reason: string | null = null,
): Promise<void> {
  await inTransaction(async (work) => {
    const report = await work.models.Report.findOne({
      where: { publicId: reportPublicId, memberId: actor.memberId },
      transaction: work.transaction,
      lock: work.transaction.LOCK.UPDATE,
    });
    if (!report) throw notFound('report');
    if (!mayWithdraw(actor, report)) {
      throw new AppError('conflict', 'This report can’t be withdrawn in its present state.', {
        facts: { state: report.state },
      });
    }
    const before = report.state;
    await report.update(
      { state: 'withdrawn', decidedAt: now(), withdrawalReason: reason },
      { transaction: work.transaction },
    );
    await recordEvent(work, {
      actorId: actor.memberId,
      action: 'report.withdrawn',
      subject: { kind: 'report', id: report.id },
      before: { state: before },
      after: { state: 'withdrawn' },
    });
    if (report.publishedRevisionId !== null) work.touch({ kind: 'device', id: report.deviceId });
    work.dropTag(`report:${report.publicId}`);
  });
}
