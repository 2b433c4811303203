import type { Router } from 'express';
import { getEvents, sittingEvent } from '../../shared/contracts/events';
import type { Context } from '../context';
import { sendEvents, wantsEvents } from '../http/event-stream';
import { asyncRoute } from '../http/route';
import { eventFor, eventsFor } from '../services/events';

export function eventRoutes(router: Router, context: Context): void {
  asyncRoute(router, context, getEvents, async ({ actor, params, query, req, res }) => {
    const first = eventFor(context, actor, params.id);
    if (query.since !== undefined || !wantsEvents(req)) return first;
    const next = eventsFor(context, actor, params.id);
    await sendEvents(res, () => {
      const event = next();
      return event === null ? null : sittingEvent.parse(event);
    });
    return undefined;
  });
}
