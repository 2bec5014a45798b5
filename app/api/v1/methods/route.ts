import { listMethodsRoute } from '@/lib/reports/handlers/reports';

export const GET = listMethodsRoute.handler;
