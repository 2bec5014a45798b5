import 'server-only';
import { z } from 'zod';
import { authRoutes } from '@/lib/auth/handlers/session';
import { catalogueRoutes } from '@/lib/catalogue/handlers';
import { figureRoutes } from '@/lib/figures/handlers';
import { membersRoutes } from '@/lib/members/handlers';
import { env } from '@/lib/platform/env';
import { openApiDocument } from '@/lib/platform/http/openapi';
import { defineRoute, type Route } from '@/lib/platform/http/route';
import { reportsRoutes } from '@/lib/reports/handlers';
import { reviewRoutes } from '@/lib/review/handlers';

export const getOpenApiRoute = defineRoute({
  operationId: 'getOpenApi',
  method: 'GET',
  path: '/api/v1/openapi.json',
  summary: 'This description, OpenAPI 3.1, from the objects that serve the operations.',
  access: 'anyone',
  success: { status: 200, description: 'The document.', body: z.record(z.string(), z.unknown()) },
  handle: async () => ({
    body: openApiDocument(
      allRoutes().map((route) => route.spec),
      env().publicOrigin,
    ),
  }),
});

/** Every operation that the site serves. A test holds it against the files below app/api/v1. */
export function allRoutes(): Route[] {
  return [
    ...authRoutes,
    ...membersRoutes,
    ...catalogueRoutes,
    ...reportsRoutes,
    ...reviewRoutes,
    ...figureRoutes,
    getOpenApiRoute,
  ];
}
