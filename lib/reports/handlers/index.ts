import 'server-only';
import type { Route } from '@/lib/platform/http/route';
import { draftRoutes } from './drafts';
import { instrumentRoutes } from './instruments';
import { photoRoutes } from './photos';
import { reportRoutes } from './reports';
import { traceReadingRoutes } from './trace-readings';
import { traceRoutes } from './traces';

/** Every operation of this domain, for the API's description and the tests that go over all of them. */
export const reportsRoutes: Route[] = [
  ...instrumentRoutes,
  ...draftRoutes,
  ...traceRoutes,
  ...traceReadingRoutes,
  ...photoRoutes,
  ...reportRoutes,
];
