import { z } from 'zod';
import { itemKinds } from './enums';
import { code, idParams, instant, uuid } from './parts';
import { defineRoute } from './route';

/** The desk is key-blind: nothing here holds a key, a band, a score, a verdict, or which reading of a pair this is. */

const readers = { who: 'course', roles: ['reader', 'lead'] } as const;

export const deskCrop = z.object({
  box: uuid,
  /** Begins the hash of the picture: an address that names it never shows another. */
  version: z.string(),
  use: z.enum(['answer', 'working']),
  widthPx: z.int(),
  heightPx: z.int(),
  /** Not all four sides of its printed frame were seen: what was cut out may lie beside the box. */
  isDoubtful: z.boolean(),
});

export const deskLease = z.object({
  id: uuid,
  answerId: uuid,
  candidateNumber: z.string(),
  pageNo: z.int(),
  pageCount: z.int(),
  pageImageId: uuid,
  pageImageRev: z.int(),
  crops: z.array(deskCrop),
});
export type DeskLease = z.infer<typeof deskLease>;

export const takeLeases = defineRoute({
  method: 'post',
  path: '/desk/leases',
  summary: 'Take the next answers of one item to read, in random order; what this reader already holds comes first.',
  access: readers,
  body: z.strictObject({ itemId: uuid, count: z.int().min(1).max(20).default(5) }),
  response: z.object({ leases: z.array(deskLease) }),
});

export const endLease = defineRoute({
  method: 'delete',
  path: '/desk/leases/:id',
  summary: 'Give an answer back unread.',
  access: readers,
  params: idParams,
  status: 204,
});

const sentReading = z.strictObject({
  answerId: uuid,
  leaseId: uuid,
  text: z.string().min(1).max(64).optional(),
  code: code.optional(),
  note: z.string().trim().min(1).max(500).optional(),
  /** Ids of the method marks struck. */
  method: z.array(z.string().max(40)).max(6).default([]),
  openedAt: instant,
});
export type SentReading = z.infer<typeof sentReading>;

export const recordReading = defineRoute({
  method: 'put',
  path: '/readings/:id',
  summary: 'Record one reading. The id comes from the device, so that a repeat is the same reading; the answer comes once it is on disk.',
  access: readers,
  params: idParams,
  body: sentReading.refine((sent) => (sent.text === undefined) !== (sent.code === undefined), {
    message: 'Send a text or a code, never both.',
    path: ['text'],
  }),
  response: z.object({ kept: z.literal(true) }),
});

export const takeBackReading = defineRoute({
  method: 'post',
  path: '/readings/:id/take-back',
  summary: 'Take back an own reading; the answer comes back to this reader first.',
  access: readers,
  params: idParams,
  response: z.object({ lease: deskLease.nullable() }),
});

export const recentReading = z.object({
  id: uuid,
  answerId: uuid,
  itemId: uuid,
  candidateNumber: z.string(),
  text: z.string().nullable(),
  code: code.nullable(),
  /** Ids of the method marks struck. */
  method: z.array(z.string()),
  note: z.string().nullable(),
  recordedAt: instant,
});
export type RecentReading = z.infer<typeof recentReading>;

const ofSitting = z.object({ sitting: uuid });

export const getRecentReadings = defineRoute({
  method: 'get',
  path: '/desk/recent',
  summary: 'The last readings of this reader in a sitting, newest first.',
  access: readers,
  query: ofSitting.extend({ item: uuid.optional() }),
  response: z.object({ readings: z.array(recentReading) }),
});

export const deskItem = z.object({
  id: uuid,
  number: z.int(),
  /** Species and electron, such as `Cl 3p`. */
  label: z.string(),
  prompt: z.string(),
  kind: z.enum(itemKinds),
  units: z.array(z.string()),
  /** Criteria to strike from the working, in words; never what they are worth. */
  methodMarks: z.array(z.object({ id: z.string(), text: z.string() })),
  /** Where the last answer written counts, it is typed: of two left standing, of one crossed out with nothing in its place. */
  typesLast: z.object({ twoAnswers: z.boolean(), crossedOut: z.boolean() }),
  /** Read by this reader, and still to be read by this reader. */
  read: z.int(),
  toRead: z.int(),
});
export type DeskItem = z.infer<typeof deskItem>;

export const getDeskStanding = defineRoute({
  method: 'get',
  path: '/desk/standing',
  summary: 'The items of a sitting as this reader has them to read.',
  access: readers,
  query: ofSitting,
  response: z.object({
    sittingId: uuid,
    courseCode: z.string(),
    title: z.string(),
    isOpenForReading: z.boolean(),
    /** Boxes that look empty: they can be looked at many at once. */
    emptyBoxes: z.int(),
    items: z.array(deskItem),
  }),
});

export const deskRoutes = { takeLeases, endLease, recordReading, takeBackReading, getRecentReadings, getDeskStanding };
