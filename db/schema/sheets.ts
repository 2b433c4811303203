import { sql } from 'drizzle-orm';
import { index, integer, primaryKey, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { bindingActs, boxUses, paperSizeNames, printingStates, scriptOrigins } from '../../shared/contracts/enums';
import { id, instant, rev } from './columns';
import { item } from './papers';
import { person } from './people';
import { candidate, sitting } from './sittings';

/** Where on the pages the answers stand. A layout that pages arrived for is never changed: a new one gets the next ordinal. */
export const layout = sqliteTable(
  'layout',
  {
    id: id(),
    sitting: text().notNull().references(() => sitting.id),
    ordinal: integer().notNull(),
    origin: text({ enum: ['printed', 'drawn'] }).notNull(),
    rev: rev(),
  },
  (table) => [uniqueIndex('layout_ordinal').on(table.sitting, table.ordinal)],
);

/** One page of the paper: its size in millimetres, and the sample image regions are drawn on. */
export const layoutPage = sqliteTable(
  'layout_page',
  {
    layout: text().notNull().references(() => layout.id),
    pageNo: integer().notNull(),
    widthMm: real().notNull(),
    heightMm: real().notNull(),
    sample: text(),
  },
  (table) => [primaryKey({ columns: [table.layout, table.pageNo] })],
);

/** x, y, w, h in millimetres from the top left of the page. */
export const box = sqliteTable(
  'box',
  {
    id: id(),
    layout: text().notNull().references(() => layout.id),
    pageNo: integer().notNull(),
    item: text().references(() => item.id),
    use: text({ enum: boxUses }).notNull(),
    x: real().notNull(),
    y: real().notNull(),
    w: real().notNull(),
    h: real().notNull(),
  },
  (table) => [index('box_by_layout').on(table.layout, table.pageNo)],
);

export const script = sqliteTable(
  'script',
  {
    id: id(),
    sitting: text().notNull().references(() => sitting.id),
    number: integer().notNull(),
    layout: text().references(() => layout.id),
    candidate: text().references(() => candidate.id),
    origin: text({ enum: scriptOrigins }).notNull(),
    voidReason: text(),
    mergedInto: text(),
  },
  (table) => [
    uniqueIndex('script_number').on(table.sitting, table.number),
    uniqueIndex('script_one_live_per_candidate').on(table.candidate).where(sql`"void_reason" is null and "merged_into" is null`),
  ],
);

/** Append-only: who a script belonged to before and after, and why; a script is bound, swapped, voided for another or made by hand. */
export const scriptBinding = sqliteTable(
  'script_binding',
  {
    id: id(),
    script: text().notNull().references(() => script.id),
    was: text().references(() => candidate.id),
    candidate: text().references(() => candidate.id),
    act: text({ enum: bindingActs }).notNull(),
    reason: text().notNull(),
    by: text().notNull().references(() => person.id),
    at: instant().notNull(),
  },
  (table) => [index('script_binding_by_script').on(table.script)],
);

/** The cut-out of the box in which a candidate writes the own number, on page 1. */
export const numberStrip = sqliteTable('number_strip', {
  script: text().primaryKey().references(() => script.id),
  pageImage: text().notNull(),
  blob: text().notNull(),
  widthPx: integer().notNull(),
  heightPx: integer().notNull(),
});

/** Append-only: what one person read on a strip, without the printed number in sight; null where nothing is written. */
export const numberReading = sqliteTable(
  'number_reading',
  {
    id: id(),
    script: text().notNull().references(() => script.id),
    /** The image it was read from: another image asks again. */
    pageImage: text().notNull(),
    reader: text().notNull().references(() => person.id),
    text: text(),
    at: instant().notNull(),
  },
  (table) => [index('number_reading_by_script').on(table.script)],
);

/** Append-only: a lead looked at a number that differs and says that the sheet stays with its candidate. */
export const numberSettled = sqliteTable(
  'number_settled',
  {
    id: id(),
    script: text().notNull().references(() => script.id),
    pageImage: text().notNull(),
    candidate: text().references(() => candidate.id),
    reason: text().notNull(),
    by: text().notNull().references(() => person.id),
    at: instant().notNull(),
  },
  (table) => [index('number_settled_by_script').on(table.script)],
);

/** The place of a page, there before any image: due, in or excused, never guessed. */
export const page = sqliteTable(
  'page',
  {
    id: id(),
    script: text().notNull().references(() => script.id),
    pageNo: integer().notNull(),
    /** The page image that is placed here. */
    image: text(),
    excusedReason: text(),
    excusedAt: instant(),
  },
  (table) => [uniqueIndex('page_place').on(table.script, table.pageNo)],
);

/** Answer sheets printed in one file, on a layout of their own. Their scripts are those that point to the layout. */
export const printing = sqliteTable(
  'printing',
  {
    id: id(),
    sitting: text().notNull().references(() => sitting.id),
    layout: text().notNull().references(() => layout.id),
    paperSize: text({ enum: paperSizeNames }).notNull(),
    spares: integer().notNull(),
    state: text({ enum: printingStates }).notNull().default('making'),
    madeBy: text().notNull().references(() => person.id),
    madeAt: instant().notNull(),
    /** Scripts in the file so far, of all of them. */
    done: integer().notNull().default(0),
    of: integer().notNull(),
    blob: text(),
  },
  (table) => [index('printing_by_sitting').on(table.sitting), uniqueIndex('printing_of_layout').on(table.layout)],
);

/** Append-only: whose script is in the file of a printing, as printed. */
export const printedScript = sqliteTable(
  'printed_script',
  {
    printing: text().notNull().references(() => printing.id),
    script: text().notNull().references(() => script.id),
    candidate: text().references(() => candidate.id),
  },
  (table) => [primaryKey({ columns: [table.printing, table.script] })],
);
