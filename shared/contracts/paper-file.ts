import { z } from 'zod';
import { boxUses } from './enums';
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
  summary: 'Replace the items and regions of an open paper by those of a file. Names the rev of the sitting it saw; nothing changes when anything is wrong.',
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
  summary: 'The numeric items as a QTI 3.0 package: a manifest and one text entry item a file, with keys and tolerances.',
  access: { who: 'course', roles: ['lead'] },
  params: idParams,
  bytes: 'application/zip',
});

export const paperFileRoutes = { getPaperFile, putPaperFile, getPaperSchema, getPaperPdf, getPaperQti };
