import { endSessionRoute, getSessionRoute } from '@/lib/auth/handlers/session';

export const GET = getSessionRoute.handler;
export const DELETE = endSessionRoute.handler;
