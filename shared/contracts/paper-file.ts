import { z } from 'zod';
import { boxUses, itemKinds } from './enums';
import { itemDraft } from './items';
import { idParams } from './parts';
import { defineRoute } from './route';

const mm = z.number().min(-5000).max(5000);
const side = z.number().min(50).max(1000);

const place = z.int().min(1).max(200);

/** An item as the editor has it; the items it follows from are named by their place in the file, from 1. */
const fileItem = itemDraft.extend({ followThrough: z.strictObject({ from: place, second: place.nullable(), isTrivial: z.boolean() }).nullable().default(null) });
export type FileItem = z.infer<typeof fileItem>;

/** A paper as one file: everything the lead decides, nothing that is computed. Keys are worked anew where it is read. */
export const paperFile = z.strictObject({
  $schema: z.string().optional(),
  format: z.literal('meniscus-paper'),
  version: z.literal(1),
  title: z.string().max(120),
  items: z.array(fileItem).max(200),
  pages: z.array(z.strictObject({ widthMm: side, heightMm: side })).max(40),
  /** `item` is the place in `items`, from 1; null for the box of the candidate number. */
  boxes: z.array(z.strictObject({ item: z.int().min(1).nullable(), pageNo: z.int().min(1).max(40), use: z.enum(boxUses), x: mm, y: mm, w: mm, h: mm })).max(800),
});
export type PaperFile = z.infer<typeof paperFile>;

export const paperSchemaPath = '/schemas/paper-1.json';

export const getPaperFile = defineRoute({
  method: 'get',
  path: '/sittings/:id/paper.json',
  summary: 'The paper as one file, with its regions; keys are not in it, they are worked where it is read.',
  access: { who: 'course', roles: ['lead', 'external'] },
  params: idParams,
  response: paperFile,
});

export const putPaperFile = defineRoute({
  method: 'put',
  path: '/sittings/:id/paper.json',
  summary: 'Replace the items and regions of an open paper by those of a file. Names the ETag that paper.json came with, in If-Match; nothing changes when anything is wrong.',
  access: { who: 'course', roles: ['lead'] },
  params: idParams,
  body: paperFile,
  response: paperFile,
});

export const getPaperSchema = defineRoute({
  method: 'get',
  path: paperSchemaPath,
  summary: 'The JSON Schema of a paper file.',
  access: { who: 'anyone' },
  response: z.record(z.string(), z.unknown()),
});

export const getPaperPdf = defineRoute({
  method: 'get',
  path: '/sittings/:id/paper.pdf',
  summary: 'The paper and its mark scheme as a PDF, for printing.',
  access: { who: 'course', roles: ['lead', 'external'] },
  params: idParams,
  bytes: 'application/pdf',
});

export const getPaperQti = defineRoute({
  method: 'get',
  path: '/sittings/:id/paper.qti.zip',
  summary: 'The items as a QTI 3.0 package: a manifest and one file an item, text entry, choice or order, with keys and what scores by them.',
  access: { who: 'course', roles: ['lead'] },
  params: idParams,
  bytes: 'application/zip',
});

/** What a QTI package would bring, and what of it is refused, by file and item. */
export const qtiReading = z.object({
  items: z.array(z.object({ file: z.string(), identifier: z.string(), label: z.string(), kind: z.enum(itemKinds), marks: z.string(), prompt: z.string(), isOwn: z.boolean() })),
  refused: z.array(z.object({ file: z.string(), identifier: z.string(), message: z.string() })),
});
export type QtiReading = z.infer<typeof qtiReading>;

export const previewPaperQti = defineRoute({
  method: 'post',
  path: '/sittings/:id/paper.qti.zip/preview',
  summary: 'What a QTI 3.0 package would bring, and the mark of the paper that would give way. Stores nothing.',
  access: { who: 'course', roles: ['lead'] },
  params: idParams,
  accepts: 'application/zip',
  response: qtiReading.extend({ mark: z.string() }),
});

export const putPaperQti = defineRoute({
  method: 'put',
  path: '/sittings/:id/paper.qti.zip',
  summary: 'Replace the items of an open paper by those of a QTI 3.0 package; their boxes go. Names the mark of the paper in If-Match. Nothing changes when any item is refused, unless `rest` asks to take the others.',
  access: { who: 'course', roles: ['lead'] },
  params: idParams,
  query: z.object({ rest: z.enum(['none', 'take']).default('none') }),
  accepts: 'application/zip',
  response: qtiReading,
});

export const paperFileRoutes = { getPaperFile, putPaperFile, getPaperSchema, getPaperPdf, getPaperQti, previewPaperQti, putPaperQti };
