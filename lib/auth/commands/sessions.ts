import 'server-only';
import { now, secondsFromNow } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { recordEvent } from '@/lib/platform/database/record-event';
import { inTransaction } from '@/lib/platform/database/transaction';
import { secretToken, sha256 } from '@/lib/platform/ids';
import { SESSION_ABSOLUTE_SECONDS, SESSION_IDLE_SECONDS } from '../rules';

/** Opens a session and returns its secret, of which only the hash is kept. */
export async function openSession(memberId: number): Promise<string> {
  const secret = secretToken();
  await inTransaction(async (work) => {
    const session = await work.models.Session.create(
      {
        memberId,
        tokenHash: sha256(secret),
        createdAt: now(),
        seenAt: now(),
        idleEndsAt: secondsFromNow(SESSION_IDLE_SECONDS),
        absoluteEndsAt: secondsFromNow(SESSION_ABSOLUTE_SECONDS),
      },
      { transaction: work.transaction },
    );
    await recordEvent(work, {
      actorId: memberId,
      action: 'session.opened',
      subject: { kind: 'session', id: session.id },
    });
  });
  return secret;
}

/** Ends one session, if it is still open. */
export async function endSession(sessionId: number, actorId: number): Promise<void> {
  await inTransaction(async (work) => {
    const [ended] = await work.models.Session.update(
      { endedAt: now() },
      { where: { id: sessionId, endedAt: null }, transaction: work.transaction },
    );
    if (ended === 1) {
      await recordEvent(work, { actorId, action: 'session.ended', subject: { kind: 'session', id: sessionId } });
    }
  });
}

/** Moves a session's idle end; called at most once an hour a session. */
export async function touchSession(sessionId: number): Promise<void> {
  await database().models.Session.update(
    { seenAt: now(), idleEndsAt: secondsFromNow(SESSION_IDLE_SECONDS) },
    { where: { id: sessionId, endedAt: null } },
  );
}
