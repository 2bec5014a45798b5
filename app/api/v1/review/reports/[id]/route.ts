import { getDeskRoute } from '@/lib/review/handlers';

export const GET = getDeskRoute.handler;
