import type { Router } from 'express';
import { allRoutes } from '../../shared/contracts/all-routes';
import { getHealth, getOpenApi, getReady } from '../../shared/contracts/service';
import type { Context } from '../context';
import { openApiDocument } from '../http/openapi';
import { openRoute } from '../http/route';
import { assertReady } from '../services/service';
import { version } from '../version';

export function serviceRoutes(router: Router, context: Context): void {
  openRoute(router, context, getHealth, () => ({ ok: true as const, version }));
  openRoute(router, context, getReady, () => {
    assertReady(context);
    return { ok: true as const };
  });
  const document = openApiDocument(allRoutes, version);
  openRoute(router, context, getOpenApi, () => document);
}
