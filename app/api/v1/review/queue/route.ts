import { getQueueRoute } from '@/lib/review/handlers';

export const GET = getQueueRoute.handler;
