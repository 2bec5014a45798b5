import { readBandsRoute } from '@/lib/reports/handlers/trace-readings';

export const POST = readBandsRoute.handler;
