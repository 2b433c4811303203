import { z } from 'zod';
import { code, idParams, instant, uuid } from './parts';
import { itemKinds } from './enums';
import { defineRoute } from './route';

const leads = { who: 'course', roles: ['lead'] } as const;
const readers = { who: 'course', roles: ['reader', 'lead'] } as const;
const overseers = { who: 'course', roles: ['lead', 'external'] } as const;

const reason = z.string().trim().min(3, 'Say why, in a few words.').max(300);

/** A strip to read, without a number or a name beside it. */
export const numberStrip = z.object({ scriptId: uuid, version: z.string(), widthPx: z.int(), heightPx: z.int() });
export type NumberStrip = z.infer<typeof numberStrip>;

export const listNumberStrips = defineRoute({
  method: 'get',
  path: '/sittings/:id/number-strips',
  summary: 'Hand-written candidate numbers not read yet, in no order, without the printed number.',
  access: readers,
  params: idParams,
  query: z.object({ limit: z.coerce.number().int().min(1).max(100).default(20) }),
  response: z.object({ strips: z.array(numberStrip), left: z.int() }),
});

export const getNumberStrip = defineRoute({
  method: 'get',
  path: '/scripts/:id/number-strip',
  summary: 'The cut-out of a hand-written candidate number.',
  access: { who: 'course', roles: ['lead', 'reader', 'external'] },
  params: idParams,
  query: z.object({ v: z.string().max(64).optional() }),
  bytes: 'image/jpeg',
});

export const readNumber = defineRoute({
  method: 'put',
  path: '/number-readings/:id',
  summary: 'Record what a strip says; null where nothing is written. The id comes from the device.',
  access: readers,
  params: idParams,
  body: z.strictObject({ scriptId: uuid, text: z.string().trim().min(1).max(32).nullable() }),
  response: z.object({ kept: z.literal(true) }),
});

const scriptSheet = z.object({ scriptId: uuid, scriptNumber: z.int(), candidateId: uuid.nullable(), candidateNumber: z.string().nullable(), pagesIn: z.int(), pages: z.int() });

/** A number that is not the printed one. */
export const numberDiffers = scriptSheet.extend({
  read: z.string().nullable(),
  version: z.string(),
  /** Who has the number that was read, and the script bound to them. */
  claimed: z.object({ candidateId: uuid, candidateNumber: z.string(), scriptId: uuid.nullable(), pagesIn: z.int() }).nullable(),
  /** Whether that script's strip says the number of this one: two sheets were exchanged. */
  isExchange: z.boolean(),
});
export type NumberDiffers = z.infer<typeof numberDiffers>;

export const peopleAndPaper = z.object({
  numbers: z.object({ unread: z.int(), agree: z.int(), settled: z.int() }),
  differ: z.array(numberDiffers),
  /** Nothing is written in the box. */
  unwritten: z.array(scriptSheet),
  /** Spare sheets with a page in and nobody's yet. */
  spares: z.array(scriptSheet.extend({ read: z.string().nullable(), version: z.string().nullable() })),
  /** To be marked, and no page in. */
  without: z.array(z.object({ candidateId: uuid, candidateNumber: z.string(), attendance: z.string(), scriptId: uuid.nullable() })),
  /** Some pages in, some missing. */
  missing: z.array(scriptSheet.extend({ pageNos: z.array(z.int()) })),
  /** Absent, withdrawn or deferred, and pages are in. */
  unexpected: z.array(scriptSheet.extend({ attendance: z.string() })),
  byHand: z.array(z.object({ scriptId: uuid, candidateNumber: z.string(), typed: z.int(), wanted: z.int() })),
  /** What was bound, swapped or made by hand, newest first. */
  traces: z.array(z.object({ at: instant, scriptNumber: z.int(), act: z.string(), was: z.string().nullable(), candidateNumber: z.string().nullable(), reason: z.string() })),
});
export type PeopleAndPaper = z.infer<typeof peopleAndPaper>;

export const getPeopleAndPaper = defineRoute({
  method: 'get',
  path: '/sittings/:id/people-and-paper',
  summary: 'Whether every sheet is with its candidate: numbers that differ, spare sheets, missing and unexpected pages, scripts by hand.',
  access: overseers,
  params: idParams,
  response: peopleAndPaper,
});

/** `seen` is the candidate that the script had when it was looked at. */
export const bindScript = defineRoute({
  method: 'post',
  path: '/scripts/:id/bind',
  summary: 'Bind a script to a candidate who has no page in; an empty script of theirs is set aside. Leaves a trace.',
  access: leads,
  params: idParams,
  body: z.strictObject({ candidateId: uuid, seen: uuid.nullable(), reason }),
  response: peopleAndPaper,
});

export const swapScripts = defineRoute({
  method: 'post',
  path: '/scripts/:id/swap',
  summary: 'Exchange the candidates of two scripts; readings stay with the paper. Leaves a trace on both.',
  access: leads,
  params: idParams,
  body: z.strictObject({ withScriptId: uuid, seen: uuid, seenOther: uuid, reason }),
  response: peopleAndPaper,
});

export const settleNumber = defineRoute({
  method: 'post',
  path: '/scripts/:id/number-settled',
  summary: 'Say that a script stays with its candidate although the hand-written number differs.',
  access: leads,
  params: idParams,
  body: z.strictObject({ seen: uuid.nullable(), reason }),
  response: peopleAndPaper,
});

export const makeByHand = defineRoute({
  method: 'post',
  path: '/candidates/:id/by-hand',
  summary: 'Have the values of a candidate without a usable scan typed from the paper, twice, by two people.',
  access: leads,
  params: idParams,
  body: z.strictObject({ reason }),
  response: peopleAndPaper,
});

export const listByHand = defineRoute({
  method: 'get',
  path: '/sittings/:id/by-hand',
  summary: 'Scripts to be typed from the paper that this person has not typed yet.',
  access: readers,
  params: idParams,
  response: z.object({ scripts: z.array(z.object({ scriptId: uuid, candidateNumber: z.string() })) }),
});

export const handSheet = z.object({
  scriptId: uuid,
  candidateNumber: z.string(),
  items: z.array(z.object({ itemId: uuid, number: z.int(), label: z.string(), prompt: z.string(), kind: z.enum(itemKinds), units: z.array(z.string()), methodMarks: z.array(z.object({ id: z.string(), text: z.string() })) })),
});
export type HandSheet = z.infer<typeof handSheet>;

export const getByHand = defineRoute({
  method: 'get',
  path: '/scripts/:id/by-hand',
  summary: 'The items of a script to type from the paper; nothing that decides a mark.',
  access: readers,
  params: idParams,
  response: handSheet,
});

const handReading = z
  .strictObject({ id: uuid, itemId: uuid, text: z.string().min(1).max(64).optional(), code: code.optional(), method: z.array(z.string().max(40)).max(6).default([]) })
  .refine((sent) => (sent.text === undefined) !== (sent.code === undefined), { message: 'Send a text or a code, never both.', path: ['text'] });

export const typeByHand = defineRoute({
  method: 'put',
  path: '/scripts/:id/by-hand',
  summary: 'Record all values of a script typed from the paper, one reading an item, all or none.',
  access: readers,
  params: idParams,
  body: z.strictObject({ readings: z.array(handReading).min(1).max(200), openedAt: instant }),
  response: z.object({ kept: z.literal(true) }),
});

export const peopleAndPaperRoutes = { listNumberStrips, getNumberStrip, readNumber, getPeopleAndPaper, bindScript, swapScripts, settleNumber, makeByHand, listByHand, getByHand, typeByHand };
