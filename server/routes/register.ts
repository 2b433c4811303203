import type { Router } from 'express';
import type { AppPassport } from '../auth/passport';
import type { Context } from '../context';
import { blankRoutes } from './blanks';
import { classListRoutes } from './class-list';
import { deskRoutes } from './desk';
import { eventRoutes } from './events';
import { itemRoutes } from './items';
import { layoutRoutes } from './layouts';
import { ledgerRoutes } from './ledger';
import { paperFileRoutes } from './paper-file';
import { peopleAndPaperRoutes } from './people-and-paper';
import { printingRoutes } from './printings';
import { scanRoutes } from './scans';
import { serviceRoutes } from './service';
import { sessionRoutes } from './session';
import { sittingRoutes } from './sittings';
import { vettingRoutes } from './vetting';

/** Every resource of the interface. */
export function registerRoutes(router: Router, context: Context, passport: AppPassport): void {
  serviceRoutes(router, context);
  sessionRoutes(router, context, passport);
  deskRoutes(router, context);
  blankRoutes(router, context);
  ledgerRoutes(router, context);
  sittingRoutes(router, context);
  layoutRoutes(router, context);
  peopleAndPaperRoutes(router, context);
  printingRoutes(router, context);
  itemRoutes(router, context);
  classListRoutes(router, context);
  scanRoutes(router, context);
  eventRoutes(router, context);
  vettingRoutes(router, context);
  paperFileRoutes(router, context);
}
