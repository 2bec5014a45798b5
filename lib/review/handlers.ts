import 'server-only';
import { z } from 'zod';
import { defineRoute, type Route } from '@/lib/platform/http/route';
import { decide } from './commands/decide';
import { deskOf } from './queries/desk';
import { reviewQueue } from './queries/queue';
import { desk, queue, verdictInput, verdictResult } from './schema';

const params = z.object({ id: z.string() });

export const getQueueRoute = defineRoute({
  operationId: 'getReviewQueue',
  method: 'GET',
  path: '/api/v1/review/queue',
  summary: 'The reports that wait for a verdict.',
  access: 'moderator',
  query: z.object({ category: z.string().max(120).optional() }),
  success: { status: 200, description: 'The longest waiting first.', body: queue },
  handle: async ({ actor, query }) => ({ body: await reviewQueue(actor.memberId, query.category ?? null) }),
});

export const getDeskRoute = defineRoute({
  operationId: 'getReviewDesk',
  method: 'GET',
  path: '/api/v1/review/reports/{id}',
  summary: 'A report with what a moderator should look at before deciding.',
  access: 'moderator',
  params,
  success: { status: 200, description: 'The newest revision.', body: desk },
  handle: async ({ actor, params: { id } }) => ({ body: await deskOf(actor, id) }),
});

export const decideRoute = defineRoute({
  operationId: 'decideReport',
  method: 'POST',
  path: '/api/v1/review/reports/{id}/verdict',
  summary: 'Verifies a report, requests changes or declines it. The same verdict again gets the same answer.',
  access: 'moderator',
  params,
  body: verdictInput,
  success: { status: 200, description: 'What was decided.', body: verdictResult },
  handle: async ({ actor, params: { id }, body }) => ({ body: await decide(actor, id, body) }),
});

export const reviewRoutes: Route[] = [getQueueRoute, getDeskRoute, decideRoute];
