import { getDeviceFiguresRoute } from '@/lib/figures/handlers';

export const GET = getDeviceFiguresRoute.handler;
