import { readTraceAgainRoute } from '@/lib/reports/handlers/traces';

export const POST = readTraceAgainRoute.handler;
