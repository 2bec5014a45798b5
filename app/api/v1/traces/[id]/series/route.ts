import { downloadTraceRoute } from '@/lib/reports/handlers/trace-readings';

export const GET = downloadTraceRoute.handler;
