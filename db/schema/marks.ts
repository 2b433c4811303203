import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { rulingKinds, scoreCauses } from '../../shared/contracts/enums';
import { codes, rules } from '../../shared/marking/scheme';
import { answer, reading } from './answers';
import { id, instant, rev } from './columns';
import { itemScheme, schemeVersion } from './papers';
import { person } from './people';
import { script } from './sheets';

/** Append-only: the stored result of one pure function. Equal inputs share the row, so equal answers have equal marks. */
export const verdict = sqliteTable(
  'verdict',
  {
    id: id(),
    itemScheme: text().notNull().references(() => itemScheme.hash),
    canonical: text().notNull(),
    context: text().notNull(),
    grains: integer(),
    rule: text({ enum: rules }).notNull(),
    numbers: text({ mode: 'json' }).$type<Record<string, string>>().notNull(),
  },
  (table) => [uniqueIndex('verdict_of_input').on(table.itemScheme, table.canonical, table.context)],
);

/** Append-only. answer.score names the one that stands. */
export const score = sqliteTable(
  'score',
  {
    id: id(),
    answer: text().notNull().references(() => answer.id),
    schemeVersion: text().notNull().references(() => schemeVersion.id),
    reading: text().references(() => reading.id),
    ruling: text(),
    verdict: text().references(() => verdict.id),
    grains: integer().notNull(),
    cause: text({ enum: scoreCauses }).notNull(),
    at: instant().notNull(),
  },
  (table) => [index('score_by_answer').on(table.answer)],
);

/** Append-only: a value and a code are scored by the scheme in force; only kind mark is an override and needs a reason. */
export const ruling = sqliteTable(
  'ruling',
  {
    id: id(),
    answer: text().notNull().references(() => answer.id),
    kind: text({ enum: rulingKinds }).notNull(),
    thirdReading: text().references(() => reading.id),
    text: text(),
    code: text({ enum: codes }),
    canonical: text(),
    value: text(),
    grains: integer(),
    method: text().notNull().default(''),
    reason: text(),
    /** The ruling this one took the place of; taking this one back puts that one in force again. */
    replaces: text(),
    by: text().notNull().references(() => person.id),
    at: instant().notNull(),
  },
  (table) => [index('ruling_by_answer').on(table.answer)],
);

/** Append-only: a ruling ends by being taken back or by a later ruling. */
export const rulingEnd = sqliteTable('ruling_end', {
  ruling: text().primaryKey().references(() => ruling.id),
  why: text({ enum: ['taken-back', 'replaced'] }).notNull(),
  by: text().notNull().references(() => person.id),
  at: instant().notNull(),
});

/** Derived in the same transaction as the scores it adds up. */
export const total = sqliteTable('total', {
  script: text().primaryKey().references(() => script.id),
  grains: integer().notNull(),
  /** Answers without a standing score. */
  missing: integer().notNull(),
  roundedGrains: integer().notNull(),
  rev: rev(),
});
