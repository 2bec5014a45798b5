import 'server-only';
import { z } from 'zod';
import { defineRoute } from '@/lib/platform/http/route';
import { beginDraft, deleteDraft, saveDraft } from '../commands/drafts';
import { draftOf, draftsOf } from '../queries/drafts';
import { draftContent } from '../schema';

const draft = z.object({
  publicId: z.string(),
  version: z.int(),
  content: z.record(z.string(), z.unknown()),
  updatedAt: z.string(),
  amendsPublicId: z.string().nullable(),
});
const params = z.object({ id: z.string() });
const saved = z.object({ publicId: z.string(), version: z.int() });

export const listDraftsRoute = defineRoute({
  operationId: 'listMyDrafts',
  method: 'GET',
  path: '/api/v1/drafts',
  summary: 'My open drafts.',
  access: 'member',
  success: { status: 200, description: 'The latest first.', body: z.object({ drafts: z.array(draft) }) },
  handle: async ({ actor }) => ({ body: { drafts: await draftsOf(actor.memberId) } }),
});

export const beginDraftRoute = defineRoute({
  operationId: 'beginDraft',
  method: 'POST',
  path: '/api/v1/drafts',
  summary: 'Begins a draft, of a new report or of an amendment.',
  access: 'member',
  idempotent: true,
  body: z.object({ content: draftContent, amendsPublicId: z.string().nullable().optional() }),
  success: { status: 201, description: 'Its id and first version.', body: saved },
  handle: async ({ actor, body }) => ({
    body: await beginDraft(actor.memberId, body.content, body.amendsPublicId ?? null),
  }),
});

export const getDraftRoute = defineRoute({
  operationId: 'getDraft',
  method: 'GET',
  path: '/api/v1/drafts/{id}',
  summary: 'One of my drafts.',
  access: 'member',
  params,
  success: { status: 200, description: 'The draft with its version.', body: draft },
  handle: async ({ actor, params: { id } }) => ({ body: await draftOf(actor.memberId, id) }),
});

export const saveDraftRoute = defineRoute({
  operationId: 'saveDraft',
  method: 'PUT',
  path: '/api/v1/drafts/{id}',
  summary: 'Saves a draft over the version named in If-Match.',
  access: 'member',
  params,
  body: z.object({ content: draftContent }),
  success: { status: 200, description: 'The new version.', body: saved },
  handle: async ({ actor, params: { id }, body, ifMatch }) => ({
    body: { publicId: id, version: await saveDraft(actor.memberId, id, ifMatch, body.content) },
  }),
});

export const deleteDraftRoute = defineRoute({
  operationId: 'deleteDraft',
  method: 'DELETE',
  path: '/api/v1/drafts/{id}',
  summary: 'Deletes a draft.',
  access: 'member',
  params,
  success: { status: 204, description: 'It is gone.', body: null },
  handle: async ({ actor, params: { id } }) => {
    await deleteDraft(actor.memberId, id);
    return {};
  },
});

export const draftRoutes = [listDraftsRoute, beginDraftRoute, getDraftRoute, saveDraftRoute, deleteDraftRoute];
