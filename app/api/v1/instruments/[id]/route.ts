import { reviseInstrumentRoute } from '@/lib/reports/handlers/instruments';

export const PUT = reviseInstrumentRoute.handler;
