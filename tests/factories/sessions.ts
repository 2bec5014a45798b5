import { encode } from 'next-auth/jwt';
import { openSession } from '@/lib/auth/commands/sessions';
import { sessionCookieName } from '@/lib/auth/rules';
import { env } from '@/lib/platform/env';

/** A Cookie header of a session that was opened as a sign-in opens it. */
export async function aSessionCookie(memberId: number): Promise<string> {
  const secret = await openSession(memberId);
  const token = await encode({ token: { sid: secret }, secret: env().secret });
  return `${sessionCookieName(false)}=${token}`;
}

/** A request of a page of ours, with this cookie. */
export function ownRequest(path: string, cookie: string | null, init: RequestInit = {}): Request {
  return new Request(`${env().publicOrigin}${path}`, {
    ...init,
    headers: {
      origin: env().publicOrigin,
      ...(init.body ? { 'content-type': 'application/json' } : {}),
      ...(cookie === null ? {} : { cookie }),
      ...(init.headers as Record<string, string> | undefined),
    },
  });
}
