import { accountRoutes } from './accounts/account-routes.ts';
import { catalogueRoutes } from './catalogue/catalogue-routes.ts';
import { documentRoutes } from './documents/document-routes.ts';
import { importRoutes } from './imports/import-routes.ts';
import type { Route } from './platform/http/route.ts';
import { eventRoutes } from './projects/event-routes.ts';
import { projectRoutes } from './projects/project-routes.ts';
import { rowRoutes } from './projects/row-routes.ts';

/** Every route below /api/v1: what the server is built from, and the OpenAPI document and the test of all roles. */
export const routes: readonly Route[] = [
  ...accountRoutes, ...catalogueRoutes, ...projectRoutes, ...rowRoutes, ...eventRoutes,
  ...importRoutes, ...documentRoutes,
];
