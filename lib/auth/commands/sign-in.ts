import 'server-only';
import { database } from '@/lib/platform/database/connection';
import { log } from '@/lib/platform/log';
import { takeToken, type Limit } from '@/lib/platform/rate-limit';
import { actorOfSession } from '../queries';
import { passwordMatches } from './hash-password';
import { endSession, openSession } from './sessions';

const BY_ADDRESS: Limit = { name: 'sign-in address', atOnce: 20, perMinute: 6 };
const BY_ACCOUNT: Limit = { name: 'sign-in account', atOnce: 10, perMinute: 4 };
const SLOWED_MS = 1500;

interface SignInAttempt {
  email: string;
  password: string;
  address: string;
  /** The session that this browser had before: it ends, so that a planted cookie is worth nothing. */
  formerSecret: string | null;
}

/**
 * Checks an address and a password and opens a session; null says no more than that it was no match. An empty bucket of
 * the network address refuses; an empty bucket of the account only slows, or a stranger could lock a member out.
 * @throws {AppError} too-many.
 */
export async function signIn(attempt: SignInAttempt): Promise<string | null> {
  takeToken(BY_ADDRESS, attempt.address);
  await slowDown(attempt.email);
  const { Member } = database().models;
  const member = await Member.findOne({ where: { email: attempt.email } });
  const matches = await passwordMatches(member?.passwordHash ?? null, attempt.password);
  if (!member || !matches || member.state !== 'active') {
    log().info({ event: 'sign-in.refused', memberId: member?.id ?? null, address: attempt.address }, 'sign-in refused');
    return null;
  }
  const former = attempt.formerSecret === null ? null : await actorOfSession(attempt.formerSecret);
  if (former) await endSession(former.sessionId, former.memberId);
  log().info({ event: 'sign-in', memberId: member.id, address: attempt.address }, 'signed in');
  return openSession(member.id);
}

async function slowDown(account: string): Promise<void> {
  try {
    takeToken(BY_ACCOUNT, account.toLowerCase());
  } catch {
    await new Promise((resolve) => setTimeout(resolve, SLOWED_MS));
  }
}
