import { getCategoryFiguresRoute } from '@/lib/figures/handlers';

export const GET = getCategoryFiguresRoute.handler;
