import { getTraceWindowRoute } from '@/lib/reports/handlers/trace-readings';

export const GET = getTraceWindowRoute.handler;
