import 'server-only';
import { decode } from 'next-auth/jwt';
import { QueryTypes } from 'sequelize';
import { now } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { env } from '@/lib/platform/env';
import { sha256 } from '@/lib/platform/ids';
import { touchSession } from './commands/sessions';
import { SESSION_SEEN_EVERY_SECONDS, sessionCookieName } from './rules';
import type { Actor } from './schema';

/** The longest cookie that can be ours; a longer one is not looked at. */
const LONGEST_COOKIE = 4096;

/** Who makes this request, or null. A cookie that is malformed, forged or of a session that ended is nobody's. */
export async function readActor(request: Request): Promise<Actor | null> {
  const secret = await readSessionSecret(request.headers.get('cookie'));
  return secret === null ? null : actorOfSession(secret);
}

/** The session's secret from a Cookie header: the signed and encrypted cookie carries nothing else. */
export async function readSessionSecret(cookies: string | null): Promise<string | null> {
  const name = sessionCookieName(env().publicOrigin.startsWith('https:'));
  const cookie = cookies
    ?.split(';')
    .map((part) => part.trim())
    .find((part) => part.startsWith(`${name}=`))
    ?.slice(name.length + 1);
  if (!cookie || cookie.length > LONGEST_COOKIE) return null;
  try {
    const token = await decode({ token: cookie, secret: env().secret });
    return typeof token?.sid === 'string' ? token.sid : null;
  } catch {
    return null;
  }
}

/** The member of an open session, as the database knows them now. */
export async function actorOfSession(secret: string): Promise<Actor | null> {
  const [row] = await database().sequelize.query<Actor & { seenAt: Date }>(
    `select m.id as "memberId", m.public_id as "publicId", d.name, m.role, s.id as "sessionId",
            s.second_factor_at as "secondFactorAt", s.seen_at as "seenAt"
     from session s
     join member m on m.id = s.member_id
     join personal_detail d on d.member_id = m.id
     where s.token_hash = $1 and s.ended_at is null and s.idle_ends_at > $2 and s.absolute_ends_at > $2
       and m.state = 'active'`,
    { bind: [sha256(secret), now()], type: QueryTypes.SELECT },
  );
  if (!row) return null;
  const { seenAt, ...actor } = row;
  if (now().getTime() - seenAt.getTime() > SESSION_SEEN_EVERY_SECONDS * 1000) await touchSession(actor.sessionId);
  return actor;
}
