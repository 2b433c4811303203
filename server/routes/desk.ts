import type { Router } from 'express';
import { endLease, getDeskStanding, getRecentReadings, recordReading, takeBackReading, takeLeases } from '../../shared/contracts/desk';
import type { Context } from '../context';
import { route, togetherRoute } from '../http/route';
import * as desk from '../services/desk';
import * as readings from '../services/readings';

export function deskRoutes(router: Router, context: Context): void {
  route(router, context, takeLeases, ({ actor, body }) => ({ leases: desk.takeLeases(context, actor, body.itemId, body.count) }));
  route(router, context, endLease, ({ actor, params }) => desk.endLease(context, actor, params.id));
  togetherRoute(router, context, recordReading, ({ actor, params, body }) => {
    readings.recordReading(context, actor, params.id, body);
    return { kept: true as const };
  });
  route(router, context, takeBackReading, ({ actor, params }) => ({ lease: readings.takeBackReading(context, actor, params.id) }));
  route(router, context, getRecentReadings, ({ actor, query }) => ({ readings: desk.recentReadingsOf(context, actor, query.sitting, query.item) }));
  route(router, context, getDeskStanding, ({ actor, query }) => desk.deskStanding(context, actor, query.sitting));
}
