import { listDevicesRoute } from '@/lib/catalogue/handlers';

export const GET = listDevicesRoute.handler;
