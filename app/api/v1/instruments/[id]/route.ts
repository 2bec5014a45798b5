import { retireInstrumentRoute, reviseInstrumentRoute } from '@/lib/reports/handlers/instruments';

export const PUT = reviseInstrumentRoute.handler;
export const DELETE = retireInstrumentRoute.handler;
