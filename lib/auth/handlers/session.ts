import 'server-only';
import { env } from '@/lib/platform/env';
import { defineRoute, type Route } from '@/lib/platform/http/route';
import { endSession } from '../commands/sessions';
import { sessionCookieName } from '../rules';
import { sessionAnswer } from '../schema';

export const getSessionRoute = defineRoute({
  operationId: 'getSession',
  method: 'GET',
  path: '/api/v1/session',
  summary: 'Who is signed in.',
  access: 'anyone',
  success: { status: 200, description: 'The member, or null.', body: sessionAnswer },
  handle: async ({ actor }) => ({
    body: { member: actor && { publicId: actor.publicId, name: actor.name, role: actor.role } },
  }),
});

export const endSessionRoute = defineRoute({
  operationId: 'signOut',
  method: 'DELETE',
  path: '/api/v1/session',
  summary: 'Signs out: the session ends on the server, and the browser forgets what it cached.',
  access: 'anyone',
  success: { status: 200, description: 'Nobody is signed in any more.', body: sessionAnswer },
  handle: async ({ actor }) => {
    if (actor) await endSession(actor.sessionId, actor.memberId);
    const secure = env().publicOrigin.startsWith('https:');
    return {
      body: { member: null },
      headers: {
        'clear-site-data': '"cache"',
        'set-cookie': `${sessionCookieName(secure)}=; Path=/; Max-Age=0; HttpOnly; SameSite=Lax${secure ? '; Secure' : ''}`,
      },
    };
  },
});

export const authRoutes: Route[] = [getSessionRoute, endSessionRoute];
