import { deskRoutes } from './desk';
import { ledgerRoutes } from './ledger';
import type { RouteContract } from './route';
import { serviceRoutes } from './service';
import { sessionRoutes } from './session';

/** Every route of the interface, by name: for OpenAPI and for the test that walks them all. */
export const allRoutes: Readonly<Record<string, RouteContract>> = {
  ...serviceRoutes,
  ...sessionRoutes,
  ...deskRoutes,
  ...ledgerRoutes,
};
