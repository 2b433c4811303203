import { z } from 'zod';
import { attendances, sittingStatuses } from './enums';
import { idParams, uuid } from './parts';
import { defineRoute } from './route';

const many = z.int().min(0);

/** How far a sitting is: counts only, never a value, and never which round of reading they belong to. */
export const progressView = z.object({
  sittingId: uuid,
  seq: z.int(),
  status: z.enum(sittingStatuses),
  isLocked: z.boolean(),
  items: many,
  /** Items that have their answer box on a page. */
  itemsPlaced: many,
  layoutPages: many,
  /** Candidates who have a printed sheet. */
  sheetsPrinted: many,
  candidates: z.record(z.enum(attendances), many),
  /** Pages of candidates who are to be marked. */
  pages: z.object({ due: many, in: many, excused: many, loose: many }),
  readings: z.object({ taken: many, due: many }),
  /** Held and scored are null for someone who only reads: seen after each reading they would tell whether it agreed with another. */
  answers: z.object({ all: many, readable: many, held: many.nullable(), scored: many.nullable() }),
});
export type ProgressView = z.infer<typeof progressView>;

export const getProgress = defineRoute({
  method: 'get',
  path: '/sittings/:id/progress',
  summary: 'Counts for every stage of a sitting.',
  access: { who: 'course', roles: ['lead', 'reader', 'external', 'officer'] },
  params: idParams,
  response: progressView,
});

export const progressRoutes = { getProgress };
