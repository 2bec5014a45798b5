import { decideRoute } from '@/lib/review/handlers';

export const POST = decideRoute.handler;
