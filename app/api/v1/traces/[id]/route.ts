import { getTraceRoute } from '@/lib/reports/handlers/traces';

export const GET = getTraceRoute.handler;
