import { downloadTraceRoute } from '@/lib/reports/handlers/traces';

export const GET = downloadTraceRoute.handler;
