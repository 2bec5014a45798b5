import 'server-only';
import type { z } from 'zod';
import { endSession } from '@/lib/auth/commands/sessions';
import type { Actor } from '@/lib/auth/schema';
import { now } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { recordEvent } from '@/lib/platform/database/record-event';
import { inTransaction } from '@/lib/platform/database/transaction';
import { notFound } from '@/lib/platform/errors';
import type { profileInput } from '../schema';

/** Changes what stands beside a member's reports. The event names no name: that would outlive an erasure. */
export async function changeProfile(actor: Actor, input: z.infer<typeof profileInput>): Promise<void> {
  await inTransaction(async (work) => {
    await work.models.PersonalDetail.update(
      { name: input.name, region: input.region, updatedAt: now() },
      { where: { memberId: actor.memberId }, transaction: work.transaction },
    );
    await recordEvent(work, {
      actorId: actor.memberId,
      action: 'member.profile-changed',
      subject: { kind: 'member', id: actor.memberId },
    });
    const reports = await work.models.Report.findAll({
      where: { memberId: actor.memberId },
      attributes: ['publicId', 'deviceId'],
      transaction: work.transaction,
    });
    for (const report of reports) {
      work.dropTag(`report:${report.publicId}`);
      work.dropTag(`device:${report.deviceId}`);
    }
  });
}

/** Ends one of a member's own sessions. */
export async function endOwnSession(actor: Actor, sessionId: number): Promise<void> {
  const own = await database().models.Session.findOne({ where: { id: sessionId, memberId: actor.memberId } });
  if (!own) throw notFound('session');
  await endSession(own.id, actor.memberId);
}
