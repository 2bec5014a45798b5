import { listCategoriesRoute } from '@/lib/catalogue/handlers';

export const GET = listCategoriesRoute.handler;
