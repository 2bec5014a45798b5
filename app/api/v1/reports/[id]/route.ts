import { getReportRoute } from '@/lib/reports/handlers/reports';

export const GET = getReportRoute.handler;
