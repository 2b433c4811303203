import { z } from 'zod';
import { boxUses } from './enums';
import { uuid } from './parts';
import { defineRoute } from './route';

const leads = { who: 'course', roles: ['lead'] } as const;
const overseers = { who: 'course', roles: ['lead', 'external'] } as const;

/** A drawn layout has one ordinal: 1. */
const layoutParams = z.object({ id: uuid, ordinal: z.literal('1') });

/** A4 portrait, in millimetres. */
export const defaultPageMm = { widthMm: 210, heightMm: 297 } as const;
export const smallestBoxMm = 5;

const mm = z.number().min(-5000).max(5000);

export const sentBox = z.strictObject({
  id: uuid.optional(),
  pageNo: z.int().min(1).max(40),
  item: uuid.nullable(),
  use: z.enum(boxUses),
  x: mm,
  y: mm,
  w: mm,
  h: mm,
});
export type SentBox = z.infer<typeof sentBox>;

export const layoutView = z.object({
  ordinal: z.int(),
  isLocked: z.boolean(),
  pages: z.array(z.object({ pageNo: z.int(), widthMm: z.number(), heightMm: z.number(), sample: z.string().nullable() })),
  boxes: z.array(sentBox.extend({ id: uuid })),
  /** Items that still lack an answer box. */
  itemsWithoutBox: z.array(z.object({ id: uuid, number: z.int(), label: z.string() })),
  /** 0 while nothing is stored yet. */
  rev: z.int().min(0),
});
export type LayoutView = z.infer<typeof layoutView>;

export const getBoxes = defineRoute({
  method: 'get',
  path: '/sittings/:id/layouts/:ordinal/boxes',
  summary: 'Pages and boxes of the paper, in millimetres from the top left of each page.',
  access: overseers,
  params: layoutParams,
  response: layoutView,
});

const side = z.number().min(50, 'A page side is 50 to 1,000 mm.').max(1000, 'A page side is 50 to 1,000 mm.');

export const saveBoxes = defineRoute({
  method: 'put',
  path: '/sittings/:id/layouts/:ordinal/boxes',
  summary: 'Store all pages and boxes of the paper. Names the rev it saw, 0 for the first time.',
  access: leads,
  params: layoutParams,
  body: z.strictObject({
    pages: z.array(z.strictObject({ widthMm: side, heightMm: side })).min(1, 'A paper has a page.').max(40, 'At most 40 pages.'),
    boxes: z.array(sentBox).max(800),
  }),
  response: layoutView,
});
export type SentLayout = z.infer<NonNullable<(typeof saveBoxes)['body']>>;

const sampleParams = layoutParams.extend({ page: z.coerce.number().int().min(1).max(40) });

export const putSample = defineRoute({
  method: 'post',
  path: '/sittings/:id/layouts/:ordinal/pages/:page/sample',
  summary: 'A picture of one page to draw boxes on: JPEG, PNG, WebP or TIFF up to 20 MB, in the field `file`. The next page number adds a page.',
  access: leads,
  params: sampleParams,
  accepts: 'multipart/form-data',
  body: z.object({ file: z.string().meta({ format: 'binary' }) }),
  response: layoutView,
});

export const getSample = defineRoute({
  method: 'get',
  path: '/sittings/:id/layouts/:ordinal/pages/:page/sample',
  summary: 'The picture of a page that boxes are drawn on.',
  access: overseers,
  params: sampleParams,
  bytes: 'image/jpeg',
});

export const layoutRoutes = { getBoxes, saveBoxes, putSample, getSample };
