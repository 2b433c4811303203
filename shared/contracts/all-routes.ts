import { blankRoutes } from './blanks';
import { classListRoutes } from './class-list';
import { deskRoutes } from './desk';
import { itemBankRoutes } from './item-bank';
import { eventRoutes } from './events';
import { itemRoutes } from './items';
import { layoutRoutes } from './layouts';
import { ledgerRoutes } from './ledger';
import { paperFileRoutes } from './paper-file';
import { progressRoutes } from './progress';
import { peopleAndPaperRoutes } from './people-and-paper';
import { printingRoutes } from './printings';
import type { RouteContract } from './route';
import { scanRoutes } from './scans';
import { serviceRoutes } from './service';
import { sessionRoutes } from './session';
import { sittingRoutes } from './sittings';
import { vettingRoutes } from './vetting';
import { waitingRoutes } from './waiting';

/** Every route of the interface, by name: for OpenAPI and for the test that walks them all. */
export const allRoutes: Readonly<Record<string, RouteContract>> = {
  ...serviceRoutes,
  ...sessionRoutes,
  ...deskRoutes,
  ...blankRoutes,
  ...ledgerRoutes,
  ...sittingRoutes,
  ...progressRoutes,
  ...itemRoutes,
  ...itemBankRoutes,
  ...classListRoutes,
  ...layoutRoutes,
  ...peopleAndPaperRoutes,
  ...printingRoutes,
  ...scanRoutes,
  ...eventRoutes,
  ...waitingRoutes,
  ...vettingRoutes,
  ...paperFileRoutes,
};
