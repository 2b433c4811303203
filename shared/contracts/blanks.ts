import { z } from 'zod';
import { deskLease } from './desk';
import { idParams, instant, uuid } from './parts';
import { defineRoute } from './route';

/** Boxes that look empty are put before a person, many at once; no answer is read without one. Key-blind, as the desk is. */

const readers = { who: 'course', roles: ['reader', 'lead'] } as const;

export const blankItem = z.object({
  id: uuid,
  number: z.int(),
  label: z.string(),
  /** Boxes that look empty and are still to be read by this reader. */
  count: z.int(),
});
export type BlankItem = z.infer<typeof blankItem>;

export const getBlankSuggestions = defineRoute({
  method: 'get',
  path: '/sittings/:id/blank-suggestions',
  summary: 'Answers of one item whose boxes look empty, leased to this reader as at the desk; the first item with any where none is named.',
  access: readers,
  params: idParams,
  query: z.object({
    item: uuid.optional(),
    limit: z.coerce.number().int().min(1).max(100).default(40),
    /** The last answer of the sheet before. */
    cursor: uuid.optional(),
  }),
  response: z.object({
    items: z.array(blankItem),
    itemId: uuid.nullable(),
    suggestions: z.array(deskLease),
    /** Where the next sheet goes on; null at the end. */
    cursor: uuid.nullable(),
  }),
});

const blankReading = z.strictObject({ readingId: uuid, answerId: uuid, leaseId: uuid });
export type BlankReading = z.infer<typeof blankReading>;

export const blankOutcomes = ['recorded', 'already-read', 'gone'] as const;

const isOnceEach = (ids: readonly string[]): boolean => new Set(ids).size === ids.length;

export const recordBlankReadings = defineRoute({
  method: 'post',
  path: '/sittings/:id/blank-readings',
  summary: 'Record the code blank as readings of this person, all or none on disk, each with what became of it; what was found written is given back.',
  access: readers,
  params: idParams,
  body: z
    .strictObject({
      readings: z.array(blankReading).max(100),
      /** Leases of answers that go to the desk instead. */
      giveBack: z.array(uuid).max(100).default([]),
      openedAt: instant,
    })
    .refine(({ readings }) => isOnceEach(readings.map(({ readingId }) => readingId)) && isOnceEach(readings.map(({ answerId }) => answerId)), {
      message: 'Each reading and each answer once.',
      path: ['readings'],
    }),
  response: z.object({ rows: z.array(z.object({ readingId: uuid, outcome: z.enum(blankOutcomes) })) }),
});

export const blankRoutes = { getBlankSuggestions, recordBlankReadings };
