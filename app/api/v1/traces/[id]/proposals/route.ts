import { proposePhasesRoute } from '@/lib/reports/handlers/trace-readings';

export const POST = proposePhasesRoute.handler;
