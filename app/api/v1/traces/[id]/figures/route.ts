import { readBandsRoute } from '@/lib/reports/handlers/traces';

export const POST = readBandsRoute.handler;
