import { addInstrumentRoute, listInstrumentsRoute } from '@/lib/reports/handlers/instruments';

export const GET = listInstrumentsRoute.handler;
export const POST = addInstrumentRoute.handler;
