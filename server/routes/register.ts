import type { Router } from 'express';
import type { AppPassport } from '../auth/passport';
import type { Context } from '../context';
import { deskRoutes } from './desk';
import { ledgerRoutes } from './ledger';
import { serviceRoutes } from './service';
import { sessionRoutes } from './session';

/** Every resource of the interface. */
export function registerRoutes(router: Router, context: Context, passport: AppPassport): void {
  serviceRoutes(router, context);
  sessionRoutes(router, context, passport);
  deskRoutes(router, context);
  ledgerRoutes(router, context);
}
