import { getOpenApiRoute } from '@/lib/open-data/handlers';

export const GET = getOpenApiRoute.handler;
