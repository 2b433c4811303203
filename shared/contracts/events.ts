import { z } from 'zod';
import { idParams } from './parts';
import { defineRoute } from './route';

const many = z.int().min(0);

/** What changed, in counts of files and pages. Nothing here comes from a reading. */
export const sittingEvent = z.object({
  /** The number of change of the sitting. */
  seq: z.int(),
  pages: z.object({ due: many, in: many, excused: many, loose: many }),
  /** Files on their way, and those whose pages are being made. */
  files: z.object({ sending: many, received: many }),
  /** Pages made of those that the files in the making hold. */
  making: z.object({ done: many, of: many }),
  /** Files whose pages could not be made. */
  stuck: many,
});
export type SittingEvent = z.infer<typeof sittingEvent>;

export const getEvents = defineRoute({
  method: 'get',
  path: '/sittings/:id/events',
  summary: 'Where the scans of a sitting are. Asked for as text/event-stream it goes on telling, an event for each change; else, and with `since`, it answers once.',
  access: { who: 'course', roles: ['lead', 'reader', 'external'] },
  params: idParams,
  query: z.object({ since: z.coerce.number().int().min(0).optional() }),
  response: sittingEvent,
});

export const eventRoutes = { getEvents };
