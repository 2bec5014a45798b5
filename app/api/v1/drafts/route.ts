import { beginDraftRoute, listDraftsRoute } from '@/lib/reports/handlers/drafts';

export const GET = listDraftsRoute.handler;
export const POST = beginDraftRoute.handler;
