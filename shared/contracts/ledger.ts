import { z } from 'zod';
import { answerStates, attendances, exportKinds, itemKinds, ledgerChips, ledgerSorts, rulingKinds } from './enums';
import { deskCrop } from './desk';
import { code, grains, idParams, instant, rev, uuid } from './parts';
import { defineRoute } from './route';

const leads = { who: 'course', roles: ['lead'] } as const;
const overseers = { who: 'course', roles: ['lead', 'external'] } as const;

/** What a reading says; null where it is covered: kept back until the person who looks has typed a reading of the image. */
const shownGiven = z.object({ text: z.string().nullable(), code: code.nullable() }).nullable();

const reason = z.object({ head: z.string(), detail: z.string() });

export const ledgerRow = z.object({
  answerId: uuid,
  candidateNumber: z.string(),
  itemNumber: z.int(),
  label: z.string(),
  state: z.enum(answerStates),
  isCovered: z.boolean(),
  readingsDue: z.int(),
  readings: z.array(shownGiven),
  /** The value that stands and the key, for the hairline scale; null where there is none to show. Printed numbers have no scale. */
  value: z.number().nullable(),
  key: z.number().nullable(),
  /** Half the width of the hairline scale of this item. */
  span: z.number(),
  why: z.string(),
  /** The number of the earlier item that the mark waits for. */
  waitsFor: z.int().nullable(),
  grains: grains.nullable(),
  maxGrains: grains,
  isRuled: z.boolean(),
  rev,
});
export type LedgerRow = z.infer<typeof ledgerRow>;

export const getLedger = defineRoute({
  method: 'get',
  path: '/sittings/:id/answers',
  summary: 'The moderation ledger: one row an answer, a window of it, with counts by state and where the held rows are.',
  access: overseers,
  params: idParams,
  query: z.object({
    offset: z.coerce.number().int().min(0).default(0),
    limit: z.coerce.number().int().min(1).max(200).default(100),
    show: z.enum(ledgerChips).default('all'),
    item: uuid.optional(),
    find: z.string().trim().max(64).optional(),
    sort: z.enum(ledgerSorts).default('candidate'),
    direction: z.enum(['up', 'down']).default('up'),
  }),
  response: z.object({
    asOf: z.int(),
    total: z.int(),
    counts: z.record(z.enum(ledgerChips), z.int()),
    heldOffsets: z.array(z.int()),
    items: z.array(z.object({ id: uuid, number: z.int(), label: z.string() })),
    rows: z.array(ledgerRow),
  }),
});

const shownReading = z.object({
  id: uuid,
  /** A pseudonym, steady within the sitting: `reader 2`. */
  reader: z.string(),
  given: shownGiven,
  /** What the scheme in force gives for it; null where it is covered, waits for an earlier item, or where the scheme leaves it to a person. */
  grains: grains.nullable(),
  note: z.string().nullable(),
  /** Ids of the method marks struck; empty where it is covered. */
  method: z.array(z.string()),
  recordedAt: instant,
  /** Whether it has the form of the third reading of the person who looks. */
  isAsMine: z.boolean().nullable(),
});

export const answerView = z.object({
  answerId: uuid,
  sittingId: uuid,
  candidateNumber: z.string(),
  itemId: uuid,
  itemNumber: z.int(),
  label: z.string(),
  prompt: z.string(),
  kind: z.enum(itemKinds),
  units: z.array(z.string()),
  maxGrains: grains,
  state: z.enum(answerStates),
  methodMarks: z.array(z.object({ id: z.string(), text: z.string(), grains })),
  /** The number of the earlier item that the mark waits for. */
  waitsFor: z.int().nullable(),
  /** The own values that it follows from, as settled. */
  follows: z.array(z.object({ itemNumber: z.int(), label: z.string(), answerId: uuid.nullable(), canonical: z.string().nullable() })),
  isCovered: z.boolean(),
  /** Why this person cannot type a third reading here, or null. */
  cannotSettle: z.string().nullable(),
  crops: z.array(deskCrop),
  pageImageId: uuid.nullable(),
  pageImageRev: z.int(),
  pageNo: z.int().nullable(),
  readings: z.array(shownReading),
  mine: z.object({ id: uuid, text: z.string().nullable(), code: code.nullable(), method: z.array(z.string()), grains: grains.nullable(), waitsFor: z.int().nullable() }).nullable(),
  /** The exact distance between two readings that differ, once uncovered. */
  gap: z.string().nullable(),
  ruling: z
    .object({
      id: uuid,
      kind: z.enum(rulingKinds),
      text: z.string().nullable(),
      code: code.nullable(),
      grains: grains.nullable(),
      method: z.array(z.string()),
      reason: z.string().nullable(),
      isOwn: z.boolean(),
      at: instant,
    })
    .nullable(),
  score: z.object({ grains, why: reason, schemeOrdinal: z.int() }).nullable(),
  /** Slips that the value fits, strongest first, with the numbers of the candidate's other items that each explains; empty while it is covered. */
  likely: z.array(z.object({ letter: z.string(), name: z.string(), feedback: z.string(), alsoOn: z.array(z.int()) })),
  scheme: z.object({
    key: z.string(),
    quantity: z.string(),
    convention: z.string(),
    /** Data for the scale and the worked key, as the item editor draws them; null where there is none. */
    scale: z.unknown(),
    derivation: z.unknown(),
  }),
  rev,
});
export type AnswerView = z.infer<typeof answerView>;

export const getAnswer = defineRoute({
  method: 'get',
  path: '/answers/:id',
  summary: 'One answer whole: cut-outs, readings (covered until typed), ruling, score with its reason, key and derivation.',
  access: overseers,
  params: idParams,
  response: answerView,
});

export const historyAct = z.object({
  at: instant,
  who: z.string(),
  act: z.enum(['read', 'read-again', 'taken-back', 'surplus', 'ruled', 'ruling-ended', 'scored']),
  given: shownGiven,
  /** Ids of the method marks struck; empty where it is covered. */
  method: z.array(z.string()),
  isCovered: z.boolean(),
  grains: grains.nullable(),
  reason: z.string().nullable(),
  schemeOrdinal: z.int().nullable(),
});
export type HistoryAct = z.infer<typeof historyAct>;

export const getAnswerHistory = defineRoute({
  method: 'get',
  path: '/answers/:id/history',
  summary: 'What happened to one answer, oldest first; readings stay covered as in the answer itself.',
  access: overseers,
  params: idParams,
  response: z.object({ acts: z.array(historyAct) }),
});

/** Ids of the method marks struck. */
const method = z.array(z.string().max(40)).max(6).default([]);

export const recordThirdReading = defineRoute({
  method: 'put',
  path: '/answers/:id/third-reading/:reading',
  summary: 'Type what the image says; only then are the readings uncovered.',
  access: leads,
  params: z.object({ id: uuid, reading: uuid }),
  body: z
    .strictObject({ text: z.string().min(1).max(64).optional(), code: code.optional(), method, openedAt: instant })
    .refine((sent) => (sent.text === undefined) !== (sent.code === undefined), { message: 'Send a text or a code, never both.', path: ['text'] }),
  response: answerView,
});

const why = z.string().trim().min(3).max(500).optional();
export const rulingBody = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('value'), text: z.string().min(1).max(64), method, reason: why }),
  z.strictObject({ kind: z.literal('code'), code, method, reason: why }),
  z.strictObject({ kind: z.literal('mark'), marks: z.string().min(1).max(16), reason: why }),
]);
export type RulingBody = z.infer<typeof rulingBody>;

export const ruleAnswer = defineRoute({
  method: 'post',
  path: '/answers/:id/rulings',
  summary: 'Rule a value, a code or a mark. Names the rev it saw; a reason where the ruling is neither reading.',
  access: leads,
  params: idParams,
  body: rulingBody,
  response: answerView,
});

export const takeBackRuling = defineRoute({
  method: 'post',
  path: '/rulings/:id/take-back',
  summary: 'Take back an own ruling: state, mark and total are as before it.',
  access: leads,
  params: idParams,
  response: answerView,
});

export const getTotals = defineRoute({
  method: 'get',
  path: '/sittings/:id/totals',
  summary: 'Marks of every script by item, with totals and what is missing.',
  access: overseers,
  params: idParams,
  response: z.object({
    asOf: z.int(),
    status: z.string(),
    boardDate: z.string().nullable(),
    items: z.array(z.object({ id: uuid, number: z.int(), label: z.string(), maxGrains: grains })),
    rows: z.array(
      z.object({
        candidateId: uuid,
        candidateNumber: z.string(),
        attendance: z.enum(attendances),
        marks: z.array(z.object({ answerId: uuid, grains: grains.nullable(), state: z.enum(answerStates) })),
        totalGrains: grains.nullable(),
        /** Numbers of the items without a mark. */
        missing: z.array(z.int()),
      }),
    ),
  }),
});

export const makeExport = defineRoute({
  method: 'post',
  path: '/sittings/:id/exports',
  summary: 'Make a file of the marks as they stand.',
  access: leads,
  params: idParams,
  body: z.strictObject({ kind: z.enum(exportKinds) }),
  response: z.object({ id: uuid, fileName: z.string() }),
  status: 201,
});

export const getExportFile = defineRoute({
  method: 'get',
  path: '/exports/:id/file',
  summary: 'The file of an export.',
  access: leads,
  params: idParams,
  bytes: 'text/csv',
});

export const ledgerRoutes = {
  getLedger,
  getAnswer,
  getAnswerHistory,
  recordThirdReading,
  ruleAnswer,
  takeBackRuling,
  getTotals,
  makeExport,
  getExportFile,
};
