import { sql } from 'drizzle-orm';
import { index, integer, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { answerStates, evidenceKinds, leasePurposes, readingEndings, readingPurposes } from '../../shared/contracts/enums';
import { codes } from '../../shared/marking/scheme';
import { id, instant, rev } from './columns';
import { item } from './papers';
import { person } from './people';
import { script } from './sheets';
import { sitting } from './sittings';

/** Derived state of one answer, written by settle() alone; the append-only rows below say why. */
export const answer = sqliteTable(
  'answer',
  {
    id: id(),
    script: text().notNull().references(() => script.id),
    item: text().notNull().references(() => item.id),
    sitting: text().notNull().references(() => sitting.id),
    evidence: text({ enum: evidenceKinds }).notNull().default('none'),
    state: text({ enum: answerStates }).notNull().default('not-read'),
    /** How many more readings are due now; 0 while there is nothing to read from. */
    readingsDue: integer().notNull().default(0),
    settledCanonical: text(),
    settledFrom: text({ enum: ['reading', 'ruling'] }),
    /** The score that stands; null while held, due or waiting. */
    score: text(),
    /** The answer whose settling could still raise this mark; null where nothing is waited for. */
    waitsFor: text(),
    /** Orders rows by value; it never decides. */
    sortValue: real(),
    /** The random order in which this answer comes to the desk. */
    shuffle: integer().notNull(),
    seq: integer().notNull().default(0),
    rev: rev(),
  },
  (table) => [
    uniqueIndex('answer_of_script').on(table.script, table.item),
    index('answer_by_sitting').on(table.sitting, table.state),
    index('answer_for_desk').on(table.item, table.readingsDue, table.shuffle),
    index('answer_by_seq').on(table.sitting, table.seq),
  ],
);

/** One open lease an answer and purpose. */
export const lease = sqliteTable(
  'lease',
  {
    id: id(),
    answer: text().notNull().references(() => answer.id),
    reader: text().notNull().references(() => person.id),
    purpose: text({ enum: leasePurposes }).notNull(),
    takenAt: instant().notNull(),
    expiresAt: instant().notNull(),
    endedAt: instant(),
    /** The page it was taken on was taken out: what is typed from it does not count. */
    withdrawnAt: instant(),
  },
  (table) => [
    uniqueIndex('lease_one_open').on(table.answer, table.purpose).where(sql`"ended_at" is null`),
    index('lease_open_by_reader').on(table.reader).where(sql`"ended_at" is null`),
    index('lease_open_by_expiry').on(table.expiresAt).where(sql`"ended_at" is null`),
  ],
);

/** Append-only: what one person typed for one answer, verbatim. Either text or code. */
export const reading = sqliteTable(
  'reading',
  {
    id: id(),
    answer: text().notNull().references(() => answer.id),
    reader: text().notNull().references(() => person.id),
    purpose: text({ enum: readingPurposes }).notNull(),
    text: text(),
    code: text({ enum: codes }),
    canonical: text().notNull(),
    /** The parsed value as a fraction; null for a code. */
    value: text(),
    note: text(),
    /** Ids of the method marks struck, in the order of the scheme, with commas. */
    method: text().notNull().default(''),
    /** Read by someone who could know the key: such readings count in no error figure. */
    knewKey: integer({ mode: 'boolean' }).notNull(),
    lease: text(),
    openedAt: instant().notNull(),
    recordedAt: instant().notNull(),
    /** The version of the grammar that understood the text. */
    grammar: integer().notNull(),
  },
  // NOTE with the answer alone, "has this reader read it" would walk all readings of the reader.
  (table) => [index('reading_by_answer').on(table.answer, table.reader), index('reading_by_reader').on(table.reader, table.recordedAt)],
);

/** Append-only: a reading ends by a later row. */
export const readingEnd = sqliteTable('reading_end', {
  reading: text().primaryKey().references(() => reading.id),
  why: text({ enum: readingEndings }).notNull(),
  by: text().notNull().references(() => person.id),
  at: instant().notNull(),
});

/** Append-only: who has seen the readings of a held answer, always after typing a third one. */
export const uncovered = sqliteTable(
  'uncovered',
  {
    answer: text().notNull().references(() => answer.id),
    person: text().notNull().references(() => person.id),
    thirdReading: text().notNull().references(() => reading.id),
    at: instant().notNull(),
  },
  (table) => [uniqueIndex('uncovered_once').on(table.answer, table.person)],
);
