import { getDeviceRoute } from '@/lib/catalogue/handlers';

export const GET = getDeviceRoute.handler;
