import { uploadTraceRoute } from '@/lib/reports/handlers/traces';

export const POST = uploadTraceRoute.handler;
