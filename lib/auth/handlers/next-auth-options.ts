import 'server-only';
import type { NextAuthOptions } from 'next-auth';
import CredentialsProvider from 'next-auth/providers/credentials';
import { env } from '@/lib/platform/env';
import { signIn } from '../commands/sign-in';
import { endSession } from '../commands/sessions';
import { actorOfSession, readSessionSecret } from '../queries';
import { SESSION_ABSOLUTE_SECONDS, sessionCookieName } from '../rules';
import { credentials as credentialsSchema } from '../schema';

/**
 * next-auth's settings: an encrypted cookie that carries the secret of a session row and nothing else. The row is
 * looked up at each request, so that sign-out, a ban and a change of role count at once.
 */
export function authOptions(): NextAuthOptions {
  const secure = env().publicOrigin.startsWith('https:');
  return {
    secret: env().secret,
    useSecureCookies: secure,
    session: { strategy: 'jwt', maxAge: SESSION_ABSOLUTE_SECONDS },
    pages: { signIn: '/sign-in', error: '/sign-in', signOut: '/account' },
    cookies: {
      sessionToken: {
        name: sessionCookieName(secure),
        options: { httpOnly: true, sameSite: 'lax', path: '/', secure },
      },
    },
    providers: [
      CredentialsProvider({
        name: 'E-mail and password',
        credentials: { email: {}, password: {} },
        async authorize(given, request) {
          const read = credentialsSchema.safeParse({ email: given?.email, password: given?.password });
          if (!read.success) return null;
          const headers = (request.headers ?? {}) as Record<string, string | undefined>;
          const secret = await signIn({
            ...read.data,
            address: headers['x-wattcairn-address'] ?? 'unknown',
            formerSecret: await readSessionSecret(headers.cookie ?? null),
          });
          return secret === null ? null : { id: secret };
        },
      }),
    ],
    callbacks: {
      jwt: ({ token, user }) => ({ sid: user ? user.id : token.sid }),
      // Who is signed in is told by /api/v1/session; next-auth's own answer says nothing.
      session: ({ session }) => ({ expires: session.expires }),
      redirect: ({ url, baseUrl }) => (isOwnPath(url, baseUrl) ? new URL(url, baseUrl).href : baseUrl),
    },
    events: {
      async signOut({ token }) {
        const actor = typeof token.sid === 'string' ? await actorOfSession(token.sid) : null;
        if (actor) await endSession(actor.sessionId, actor.memberId);
      },
    },
  };
}

/** Whether an address stays on this site: "//elsewhere" and "\elsewhere" don't. */
function isOwnPath(url: string, baseUrl: string): boolean {
  if (/[\\\u0000-\u001f]/.test(url)) return false;
  try {
    return new URL(url, baseUrl).origin === new URL(baseUrl).origin;
  } catch {
    return false;
  }
}
