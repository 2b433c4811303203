import { z } from 'zod';
import { paperSizeNames, printedFor, printingStates } from './enums';
import { idParams, instant, uuid } from './parts';
import { defineRoute } from './route';

const leads = { who: 'course', roles: ['lead'] } as const;
const overseers = { who: 'course', roles: ['lead', 'external'] } as const;

export const mostSpares = 500;

export const printingView = z.object({
  id: uuid,
  /** The ordinal of its layout; it stands in every code and as text on every page. */
  layout: z.int(),
  paperSize: z.enum(paperSizeNames),
  /** Sheets with a candidate's number, and spare ones. */
  candidates: z.int(),
  spares: z.int(),
  pagesEach: z.int(),
  state: z.enum(printingStates),
  /** Of candidates and spares together, how many are in the file. */
  done: z.int(),
  of: z.int(),
  madeBy: z.string(),
  madeAt: instant,
  /** Bytes of the file; null until it is made. */
  size: z.int().nullable(),
});
export type PrintingView = z.infer<typeof printingView>;

const word = z.object({ fount: z.enum(['text', 'strong', 'value', 'symbol']), sizeMm: z.number(), text: z.string(), x: z.number(), y: z.number(), side: z.enum(['left', 'right']) });

/** One page as it would be printed, in millimetres. */
const previewPage = z.object({
  pageNo: z.int(),
  frames: z.array(z.object({ x: z.number(), y: z.number(), w: z.number(), h: z.number() })),
  lines: z.array(z.object({ x1: z.number(), x2: z.number(), y: z.number() })),
  words: z.array(word),
  /** Codes drawn as one path each; their check is not a valid one, so that a picture of the preview is no sheet. */
  codes: z.array(z.string()),
});
export type PreviewPage = z.infer<typeof previewPage>;

export const sheetPreview = z.object({
  isLocked: z.boolean(),
  paperSize: z.enum(paperSizeNames),
  widthMm: z.number(),
  heightMm: z.number(),
  items: z.int(),
  /** Candidates a sheet would be printed for, and of these how many have none yet. */
  candidates: z.int(),
  withoutSheet: z.int(),
  /** Left out: a page of theirs is in already; absent, withdrawn or deferred. */
  withPagesIn: z.int(),
  away: z.int(),
  /** Whether sheets were printed before: those keep their layout. */
  printings: z.int(),
  /** Why nothing can be printed, in a sentence; null where it can. */
  problem: z.string().nullable(),
  /** The candidate number that is shown; null for a spare sheet. */
  sample: z.string().nullable(),
  pages: z.array(previewPage),
});
export type SheetPreview = z.infer<typeof sheetPreview>;

export const getSheetPreview = defineRoute({
  method: 'get',
  path: '/sittings/:id/sheet-preview',
  summary: 'One candidate’s answer sheets as they would be printed on a paper size, and for whom; nothing is made.',
  access: overseers,
  params: idParams,
  query: z.object({ paperSize: z.enum(paperSizeNames).default('a4') }),
  response: sheetPreview,
});

export const makePrinting = defineRoute({
  method: 'post',
  path: '/sittings/:id/printings',
  summary: 'Print answer sheets for the class list of a locked paper: a new layout, scripts where none are, and one PDF made as a job.',
  access: leads,
  params: idParams,
  body: z.strictObject({ paperSize: z.enum(paperSizeNames).default('a4'), spares: z.int().min(0).max(mostSpares, `At most ${mostSpares} spare sheets at once.`).default(0), for: z.enum(printedFor).default('all') }),
  response: printingView,
  status: 202,
});

export const listPrintings = defineRoute({
  method: 'get',
  path: '/sittings/:id/printings',
  summary: 'The printings of a sitting, newest first, with how far each is.',
  access: overseers,
  params: idParams,
  response: z.object({ printings: z.array(printingView) }),
});

export const getPrintingFile = defineRoute({
  method: 'get',
  path: '/printings/:id/file',
  summary: 'The answer sheets of a printing as a PDF.',
  access: leads,
  params: idParams,
  bytes: 'application/pdf',
});

export const printingRoutes = { getSheetPreview, makePrinting, listPrintings, getPrintingFile };
