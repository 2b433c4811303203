import { z } from 'zod';
import { uuid } from './parts';
import { defineRoute } from './route';

/** What waits: answers to read, boxes that look empty, held answers to rule, loose pages to sort, sheets with another's number, numbers to read, scripts to type from the paper, a paper to lock. */
export const waitingKinds = ['rule', 'read', 'blanks', 'sort', 'differ', 'numbers', 'by-hand', 'lock'] as const;

export const waitingLine = z.object({
  kind: z.enum(waitingKinds),
  sittingId: uuid,
  sitting: z.string(),
  count: z.int(),
  /** The item with most to read, of lines to read. */
  item: z.object({ id: uuid, number: z.int(), label: z.string() }).nullable(),
});
export type WaitingLine = z.infer<typeof waitingLine>;

export const getWaiting = defineRoute({
  method: 'get',
  path: '/waiting',
  summary: 'What waits for the person who is signed in, over all sittings, most pressing first.',
  access: { who: 'signed-in' },
  response: z.object({ lines: z.array(waitingLine) }),
});

export const waitingRoutes = { getWaiting };
