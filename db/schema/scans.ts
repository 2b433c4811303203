import { sql } from 'drizzle-orm';
import { index, integer, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { batchStates, evidenceKinds, inkKinds, jobStates, pageImageStates, uploadStates } from '../../shared/contracts/enums';
import { answer } from './answers';
import { id, instant, rev } from './columns';
import { person } from './people';
import { box, page } from './sheets';
import { sitting } from './sittings';

/** Content-addressed bytes behind the storage interface. */
export const blob = sqliteTable('blob', {
  sha256: text().primaryKey(),
  size: integer().notNull(),
  mediaType: text().notNull(),
});

export const batch = sqliteTable(
  'batch',
  {
    id: id(),
    sitting: text().notNull().references(() => sitting.id),
    bundle: text().notNull(),
    madeBy: text().notNull().references(() => person.id),
    madeAt: instant().notNull(),
    state: text({ enum: batchStates }).notNull().default('open'),
  },
  (table) => [index('batch_by_sitting').on(table.sitting)],
);

/** One file on its way in. Its bytes arrive in numbered parts and resume; `receivedParts` counts those on disk. */
export const upload = sqliteTable(
  'upload',
  {
    id: id(),
    batch: text().notNull().references(() => batch.id),
    fileName: text().notNull(),
    size: integer().notNull(),
    partSize: integer().notNull(),
    sha256: text(),
    state: text({ enum: uploadStates }).notNull().default('sending'),
    problem: text(),
    /** Pages the file holds, once it was opened; each gets its page image, taken or refused. */
    pages: integer(),
    madeAt: instant().notNull(),
  },
  (table) => [index('upload_by_batch').on(table.batch)],
);

export const uploadPart = sqliteTable(
  'upload_part',
  {
    upload: text().notNull().references(() => upload.id),
    part: integer().notNull(),
    size: integer().notNull(),
  },
  (table) => [uniqueIndex('upload_part_once').on(table.upload, table.part)],
);

/** One page of an upload. `mmToPx` is the 3x3 map from page millimetres to pixels of the upright display image, row by row. */
export const pageImage = sqliteTable(
  'page_image',
  {
    id: id(),
    upload: text().notNull().references(() => upload.id),
    index: integer().notNull(),
    sitting: text().notNull().references(() => sitting.id),
    /** The picture as it came: the upload itself, a file of an archive, or a page taken out of a PDF. */
    original: text().references(() => blob.sha256),
    /** Which page of the original this is. */
    frame: integer().notNull().default(0),
    /** Name of its file in an archive. */
    name: text(),
    /** Advice for the next scan. */
    note: text(),
    display: text().references(() => blob.sha256),
    thumb: text().references(() => blob.sha256),
    widthPx: integer(),
    heightPx: integer(),
    /** Quarter turns a person added to the upright image, 0 to 3 clockwise. */
    turns: integer().notNull().default(0),
    mmToPx: text({ mode: 'json' }).$type<number[]>(),
    residualMm: real(),
    state: text({ enum: pageImageStates }).notNull().default('waiting'),
    page: text().references(() => page.id),
    why: text(),
    rev: rev(),
  },
  (table) => [
    uniqueIndex('page_image_of_upload').on(table.upload, table.index),
    uniqueIndex('page_image_one_placed').on(table.page).where(sql`"state" = 'placed'`),
    index('page_image_by_state').on(table.sitting, table.state),
    index('page_image_by_original').on(table.original),
  ],
);

/** The cut-out of one box of one answer. */
export const crop = sqliteTable(
  'crop',
  {
    id: id(),
    answer: text().notNull().references(() => answer.id),
    box: text().notNull().references(() => box.id),
    pageImage: text().notNull().references(() => pageImage.id),
    blob: text().notNull().references(() => blob.sha256),
    widthPx: integer().notNull(),
    heightPx: integer().notNull(),
    evidence: text({ enum: evidenceKinds }).notNull().default('in'),
    /** Sides of its printed frame that were seen where they belong; null for a box without one. */
    sidesConfirmed: integer(),
    /** Whether something is written in it; null where nothing was printed to judge by. */
    ink: text({ enum: inkKinds }),
    rev: rev(),
  },
  (table) => [uniqueIndex('crop_of_box').on(table.answer, table.box), index('crop_by_image').on(table.pageImage)],
);

/** Work done later, off the request; a job is resumable and idempotent. */
export const job = sqliteTable(
  'job',
  {
    id: id(),
    kind: text().notNull(),
    dedupeKey: text().notNull(),
    payload: text({ mode: 'json' }).$type<Record<string, unknown>>().notNull(),
    state: text({ enum: jobStates }).notNull().default('waiting'),
    tries: integer().notNull().default(0),
    /** How often the process ended under it. */
    crashes: integer().notNull().default(0),
    runAt: instant().notNull(),
    leasedUntil: instant(),
    error: text(),
  },
  (table) => [
    uniqueIndex('job_open_once').on(table.dedupeKey).where(sql`"state" in ('waiting', 'running')`),
    index('job_next').on(table.state, table.runAt),
  ],
);
