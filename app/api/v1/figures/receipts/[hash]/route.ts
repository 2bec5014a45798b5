import { getReceiptRoute } from '@/lib/figures/handlers';

export const GET = getReceiptRoute.handler;
