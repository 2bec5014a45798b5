import { deleteDraftRoute, getDraftRoute, saveDraftRoute } from '@/lib/reports/handlers/drafts';

export const GET = getDraftRoute.handler;
export const PUT = saveDraftRoute.handler;
export const DELETE = deleteDraftRoute.handler;
