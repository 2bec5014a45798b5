import 'server-only';
import { z } from 'zod';
import { inTransaction } from '@/lib/platform/database/transaction';
import { defineRoute } from '@/lib/platform/http/route';
import { addInstrument, retireInstrument, reviseInstrument } from '../commands/instruments';
import { instrumentsOf } from '../queries/instruments';
import { instrument, instrumentInput } from '../schema';

const list = z.object({ instruments: z.array(instrument) });

export const listInstrumentsRoute = defineRoute({
  operationId: 'listMyInstruments',
  method: 'GET',
  path: '/api/v1/instruments',
  summary: 'My instruments with their stated accuracy.',
  access: 'member',
  success: { status: 200, description: 'By name.', body: list },
  handle: async ({ actor }) => ({ body: { instruments: await instrumentsOf(actor.memberId) } }),
});

export const addInstrumentRoute = defineRoute({
  operationId: 'addInstrument',
  method: 'POST',
  path: '/api/v1/instruments',
  summary: 'Adds an instrument.',
  access: 'member',
  idempotent: true,
  limit: { name: 'instruments', atOnce: 20, perMinute: 10 },
  body: instrumentInput,
  success: { status: 201, description: 'It is there.', body: z.object({ publicId: z.string() }) },
  handle: async ({ actor, body }) => ({
    body: { publicId: await inTransaction((work) => addInstrument(work, actor.memberId, body)) },
  }),
});

export const reviseInstrumentRoute = defineRoute({
  operationId: 'reviseInstrument',
  method: 'PUT',
  path: '/api/v1/instruments/{id}',
  summary: 'Changes the instrument whose revision If-Match names: a new one, while reports keep theirs.',
  access: 'member',
  params: z.object({ id: z.string() }),
  body: instrumentInput,
  success: { status: 200, description: 'My instruments as they are now.', body: list },
  handle: async ({ actor, params, body, ifMatch }) => {
    await inTransaction((work) => reviseInstrument(work, actor.memberId, params.id, ifMatch, body));
    return { body: { instruments: await instrumentsOf(actor.memberId) } };
  },
});

export const retireInstrumentRoute = defineRoute({
  operationId: 'retireInstrument',
  method: 'DELETE',
  path: '/api/v1/instruments/{id}',
  summary: 'Takes an instrument out of use; reports keep it.',
  access: 'member',
  params: z.object({ id: z.string() }),
  success: { status: 204, description: 'It is offered no more.', body: null },
  handle: async ({ actor, params }) => {
    await inTransaction((work) => retireInstrument(work, actor.memberId, params.id));
    return {};
  },
});

export const instrumentRoutes = [
  listInstrumentsRoute,
  addInstrumentRoute,
  reviseInstrumentRoute,
  retireInstrumentRoute,
];
