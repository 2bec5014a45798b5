import { withdrawReportRoute } from '@/lib/reports/handlers/reports';

export const POST = withdrawReportRoute.handler;
