import { getTraceWindowRoute } from '@/lib/reports/handlers/traces';

export const GET = getTraceWindowRoute.handler;
