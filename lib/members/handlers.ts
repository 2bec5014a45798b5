import 'server-only';
import { z } from 'zod';
import { defineRoute, type Route } from '@/lib/platform/http/route';
import { takeToken } from '@/lib/platform/rate-limit';
import { changeProfile, endOwnSession } from './commands/profile';
import { confirmAddress, signUp } from './commands/sign-up';
import { accountOf } from './queries';
import { account, profileInput, signUpInput } from './schema';

const told = z.object({ message: z.string() });

export const signUpRoute = defineRoute({
  operationId: 'signUp',
  method: 'POST',
  path: '/api/v1/members',
  summary: 'Makes an account, to be confirmed by a mailed link. The answer is the same for an address that has one.',
  access: 'anyone',
  limit: { name: 'sign-up address', atOnce: 10, perMinute: 2 },
  body: signUpInput,
  success: { status: 202, description: 'A letter is on its way.', body: told },
  handle: async ({ body }) => {
    // One mailbox must not be flooded from many addresses either.
    takeToken({ name: 'sign-up mailbox', atOnce: 5, perMinute: 0.2 }, body.email);
    await signUp(body);
    return { body: { message: `A letter is on its way to ${body.email}. Open its link to confirm the address.` } };
  },
});

export const confirmAddressRoute = defineRoute({
  operationId: 'confirmAddress',
  method: 'POST',
  path: '/api/v1/confirmations',
  summary: 'Confirms an address by the secret of its link, once.',
  access: 'anyone',
  limit: { name: 'confirmations', atOnce: 20, perMinute: 5 },
  body: z.object({ secret: z.string().min(1, 'The link is not whole. Open it from the letter.').max(200) }),
  success: { status: 200, description: 'The account is open.', body: told },
  handle: async ({ body }) => {
    await confirmAddress(body.secret);
    return { body: { message: 'Your address is confirmed. Sign in with it.' } };
  },
});

export const getAccountRoute = defineRoute({
  operationId: 'getMyAccount',
  method: 'GET',
  path: '/api/v1/account',
  summary: 'My account, with the sessions that are open.',
  access: 'member',
  success: { status: 200, description: 'The account.', body: account },
  handle: async ({ actor }) => ({ body: await accountOf(actor) }),
});

export const changeProfileRoute = defineRoute({
  operationId: 'changeMyProfile',
  method: 'PATCH',
  path: '/api/v1/account',
  summary: 'Changes the name and region that stand beside my reports.',
  access: 'member',
  body: profileInput,
  success: { status: 200, description: 'The account as it is now.', body: account },
  handle: async ({ actor, body }) => {
    await changeProfile(actor, body);
    return { body: await accountOf(actor) };
  },
});

export const endSessionRoute = defineRoute({
  operationId: 'endMySession',
  method: 'DELETE',
  path: '/api/v1/account/sessions/{id}',
  summary: 'Ends one of my sessions.',
  access: 'member',
  params: z.object({
    id: z
      .string()
      .regex(/^\d{1,9}$/, 'A session has a number.')
      .transform(Number),
  }),
  success: { status: 200, description: 'The account as it is now.', body: account },
  handle: async ({ actor, params: { id } }) => {
    await endOwnSession(actor, id);
    return { body: await accountOf(actor) };
  },
});

export const membersRoutes: Route[] = [
  signUpRoute,
  confirmAddressRoute,
  getAccountRoute,
  changeProfileRoute,
  endSessionRoute,
];
