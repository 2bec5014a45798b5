import { listMyReportsRoute, sendReportRoute } from '@/lib/reports/handlers/reports';

export const GET = listMyReportsRoute.handler;
export const POST = sendReportRoute.handler;
