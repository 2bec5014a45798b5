import { changeProfileRoute, getAccountRoute } from '@/lib/members/handlers';

export const GET = getAccountRoute.handler;
export const PATCH = changeProfileRoute.handler;
