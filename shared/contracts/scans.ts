import { z } from 'zod';
import { batchStates, pageImageStates, uploadStates } from './enums';
import { idParams, instant, rev, uuid } from './parts';
import { defineRoute } from './route';

/** Scans are key-blind as the desk is: nothing here comes from a key. */
const scanners = { who: 'course', roles: ['lead', 'reader'] } as const;
const staff = { who: 'course', roles: ['lead', 'reader', 'external'] } as const;

/** Bytes of one part; every part but the last has exactly as many. */
export const partBytes = 8 * 1024 * 1024;
export const mostFileBytes = 2 * 1024 * 1024 * 1024;
export const mostFilesOfBatch = 5000;

const many = z.int().min(0);

export const uploadPage = z.object({
  id: uuid,
  index: many,
  /** Name of its file in an archive. */
  name: z.string().nullable(),
  state: z.enum(pageImageStates),
  place: z.string().nullable(),
  /** Why it has no place, or was refused. */
  why: z.string().nullable(),
  /** Advice for the next scan. */
  note: z.string().nullable(),
});
export type UploadPage = z.infer<typeof uploadPage>;

export const uploadView = z.object({
  id: uuid,
  fileName: z.string(),
  size: many,
  partSize: many,
  /** Numbers of the parts that are on disk, from 0. */
  parts: z.array(many),
  state: z.enum(uploadStates),
  /** Why a file was refused, or which one it repeats. */
  problem: z.string().nullable(),
  /** Why its pages could not be made though nothing is wrong with the file; it can be tried again. */
  stuck: z.string().nullable(),
  /** How many pages the file holds; null until it was opened. */
  of: many.nullable(),
  pages: z.array(uploadPage),
});
export type UploadView = z.infer<typeof uploadView>;

export const batchSummary = z.object({
  id: uuid,
  sittingId: uuid,
  bundle: z.string(),
  madeAt: instant,
  state: z.enum(batchStates),
  isOwn: z.boolean(),
  files: z.record(z.enum(uploadStates), many),
  pages: z.record(z.enum(pageImageStates), many),
  /** Pages made of those the files in the making hold. */
  making: z.object({ done: many, of: many }),
  /** Files whose pages could not be made: they wait for someone to try again. */
  stuck: many,
});
export type BatchSummary = z.infer<typeof batchSummary>;

export const batchView = batchSummary.extend({ uploads: z.array(uploadView) });
export type BatchView = z.infer<typeof batchView>;

export const listBatches = defineRoute({
  method: 'get',
  path: '/sittings/:id/batches',
  summary: 'The batches of a sitting, newest first.',
  access: staff,
  params: idParams,
  response: z.object({ batches: z.array(batchSummary) }),
});

export const makeBatch = defineRoute({
  method: 'post',
  path: '/sittings/:id/batches',
  summary: 'Begin a batch, named after its bundle of paper.',
  access: scanners,
  params: idParams,
  body: z.strictObject({ bundle: z.string().trim().min(1, 'Name the bundle.').max(60) }),
  response: batchSummary,
  status: 201,
});

export const getBatch = defineRoute({
  method: 'get',
  path: '/batches/:id',
  summary: 'One batch with its counts and its files, those that need someone first.',
  access: staff,
  params: idParams,
  response: batchView,
});

export const changeBatch = defineRoute({
  method: 'patch',
  path: '/batches/:id',
  summary: 'Cancel a batch: files on their way or in the making are given up; pages that came in stay.',
  access: scanners,
  params: idParams,
  body: z.strictObject({ state: z.literal('cancelled') }),
  response: batchSummary,
});

export const beginUpload = defineRoute({
  method: 'post',
  path: '/batches/:id/uploads',
  summary: 'Announce one file: its name and size.',
  access: scanners,
  params: idParams,
  body: z.strictObject({
    fileName: z.string().trim().min(1, 'Name the file.').max(255),
    size: z.int().min(1, 'The file is empty.').max(mostFileBytes, 'The file is larger than 2 GB. Split it into several.'),
  }),
  response: uploadView,
  status: 201,
});

export const putPart = defineRoute({
  method: 'put',
  path: '/uploads/:id/parts/:part',
  summary: 'One part of a file, 8 MiB at most, in the field `file`; sent again it is the same part.',
  access: scanners,
  params: z.object({ id: uuid, part: z.coerce.number().int().min(0).max(1000) }),
  accepts: 'multipart/form-data',
  body: z.object({ file: z.string().meta({ format: 'binary' }) }),
  response: uploadView,
});

export const completeUpload = defineRoute({
  method: 'post',
  path: '/uploads/:id/complete',
  summary: 'All parts are there: the file is kept, and its pages are made.',
  access: scanners,
  params: idParams,
  response: uploadView,
  status: 202,
});

export const retryUpload = defineRoute({
  method: 'post',
  path: '/uploads/:id/retry',
  summary: 'Make the pages of a stuck file again, from where it stopped.',
  access: scanners,
  params: idParams,
  response: uploadView,
  status: 202,
});

export const getUpload = defineRoute({
  method: 'get',
  path: '/uploads/:id',
  summary: 'How far a file is: the parts on disk, then its pages.',
  access: scanners,
  params: idParams,
  response: uploadView,
});

export const loosePage = z.object({
  id: uuid,
  fileName: z.string(),
  bundle: z.string(),
  why: z.string(),
  /** The candidate and page a person is likely to choose; null where nothing speaks for one. */
  likely: z.object({ candidateId: uuid, pageNo: z.int() }).nullable(),
  rev,
});
export type LoosePage = z.infer<typeof loosePage>;

/** A place of a page of someone who is to be marked, and the image it holds, if any. */
export const pagePlace = z.object({
  candidateId: uuid,
  candidateNumber: z.string(),
  pageNo: z.int(),
  image: z.object({ id: uuid, rev }).nullable(),
});
export type PagePlaceView = z.infer<typeof pagePlace>;

export const listLoosePages = defineRoute({
  method: 'get',
  path: '/sittings/:id/loose-pages',
  summary: 'Pages that no script has claimed, oldest first, and, while there are any, the places they could have.',
  access: staff,
  params: idParams,
  response: z.object({ pages: z.array(loosePage), places: z.array(pagePlace) }),
});

export const pageImageView = z.object({
  id: uuid,
  fileName: z.string(),
  state: z.enum(pageImageStates),
  why: z.string().nullable(),
  candidateNumber: z.string().nullable(),
  pageNo: z.int().nullable(),
  turns: z.int(),
  widthPx: z.int().nullable(),
  heightPx: z.int().nullable(),
  rev,
});
export type PageImageView = z.infer<typeof pageImageView>;

export const getPageImage = defineRoute({
  method: 'get',
  path: '/page-images/:id',
  summary: 'One page image and its place.',
  access: staff,
  params: idParams,
  response: pageImageView,
});

export const placePage = defineRoute({
  method: 'post',
  path: '/page-images/:id/place',
  summary: 'Say whose page this is. Names the rev it saw; refused where that place is taken.',
  access: scanners,
  params: idParams,
  body: z.strictObject({ candidateId: uuid, pageNo: z.int().min(1).max(40) }),
  response: pageImageView,
});

export const turnPage = defineRoute({
  method: 'post',
  path: '/page-images/:id/turn',
  summary: 'Turn a page by quarter turns clockwise; cut-outs are made again.',
  access: scanners,
  params: idParams,
  body: z.strictObject({ by: z.int().min(1).max(3) }),
  response: pageImageView,
});

export const discardPage = defineRoute({
  method: 'post',
  path: '/page-images/:id/discard',
  summary: 'Not an answer page. The image stays kept, and can be placed after all.',
  access: scanners,
  params: idParams,
  response: pageImageView,
});

export const loosenPage = defineRoute({
  method: 'post',
  path: '/page-images/:id/loosen',
  summary: 'Take a page out of its place, or a discarded one back. Refused while readings stand that were taken from it, unless the lead reopens them.',
  access: scanners,
  params: idParams,
  body: z.strictObject({ reopen: z.boolean().default(false) }),
  response: pageImageView,
});

export const getPageImageFile = defineRoute({
  method: 'get',
  path: '/page-images/:id/file',
  summary: 'The picture of a page.',
  access: staff,
  params: idParams,
  query: z.object({ size: z.enum(['thumb', 'display', 'original']).default('display'), v: z.string().max(64).optional() }),
  bytes: 'image/jpeg',
});

export const getCrop = defineRoute({
  method: 'get',
  path: '/answers/:id/crop',
  summary: 'The cut-out of one box of an answer.',
  access: staff,
  params: idParams,
  query: z.object({ box: uuid, v: z.string().max(64).optional() }),
  bytes: 'image/jpeg',
});

export const scanRoutes = {
  listBatches,
  makeBatch,
  getBatch,
  changeBatch,
  beginUpload,
  putPart,
  completeUpload,
  retryUpload,
  getUpload,
  listLoosePages,
  getPageImage,
  placePage,
  turnPage,
  discardPage,
  loosenPage,
  getPageImageFile,
  getCrop,
};
