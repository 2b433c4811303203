import { index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { itemKinds, vettingOutcomes } from '../../shared/contracts/enums';
import type { ItemScheme } from '../../shared/marking/scheme';
import { id, instant, rev } from './columns';
import { person } from './people';
import { sitting } from './sittings';

/** Identity of an item and what is printed; all that decides its mark is in a scheme. */
export const item = sqliteTable(
  'item',
  {
    id: id(),
    sitting: text().notNull().references(() => sitting.id),
    number: integer().notNull(),
    prompt: text().notNull(),
    kind: text({ enum: itemKinds }).notNull().default('numeric'),
    maxGrains: integer().notNull(),
    rev: rev(),
  },
  (table) => [index('item_by_sitting').on(table.sitting, table.number)],
);

/** What the editor changes before the lock. */
export const itemDraft = sqliteTable('item_draft', {
  item: text().primaryKey().references(() => item.id),
  body: text({ mode: 'json' }).$type<ItemScheme>().notNull(),
  rev: rev(),
});

/** Append-only. Named by the hash of its content: amended and amended back is the same row. */
export const itemScheme = sqliteTable('item_scheme', {
  hash: text().primaryKey(),
  body: text({ mode: 'json' }).$type<ItemScheme>().notNull(),
});

/** Append-only. */
export const schemeVersion = sqliteTable(
  'scheme_version',
  {
    id: id(),
    sitting: text().notNull().references(() => sitting.id),
    ordinal: integer().notNull(),
    madeBy: text().notNull().references(() => person.id),
    madeAt: instant().notNull(),
    reason: text(),
  },
  (table) => [uniqueIndex('scheme_version_ordinal').on(table.sitting, table.ordinal)],
);

/** Append-only. */
export const schemeVersionItem = sqliteTable(
  'scheme_version_item',
  {
    version: text().notNull().references(() => schemeVersion.id),
    item: text().notNull().references(() => item.id),
    itemScheme: text().notNull().references(() => itemScheme.hash),
  },
  (table) => [primaryKey({ columns: [table.version, table.item] })],
);

/** Append-only: what a second person worked out for an item, before its key was uncovered to them. */
export const vettingCheck = sqliteTable(
  'vetting_check',
  {
    id: id(),
    item: text().notNull().references(() => item.id),
    itemScheme: text().notNull().references(() => itemScheme.hash),
    person: text().notNull().references(() => person.id),
    text: text().notNull(),
    agrees: integer({ mode: 'boolean' }).notNull(),
    at: instant().notNull(),
  },
  (table) => [index('vetting_check_by_item').on(table.item, table.itemScheme)],
);

/** Append-only: a scheme signed or sent back. It holds for that scheme only: a changed one has another hash. */
export const vetting = sqliteTable(
  'vetting',
  {
    id: id(),
    item: text().notNull().references(() => item.id),
    itemScheme: text().notNull().references(() => itemScheme.hash),
    person: text().notNull().references(() => person.id),
    outcome: text({ enum: vettingOutcomes }).notNull(),
    comment: text(),
    at: instant().notNull(),
  },
  (table) => [index('vetting_by_item').on(table.item, table.itemScheme)],
);
