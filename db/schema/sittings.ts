import { integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { attendances, deskModes, secondPolicies, sittingStatuses, totalRoundings } from '../../shared/contracts/enums';
import { id, instant, rev } from './columns';
import { course, person } from './people';

export const sitting = sqliteTable('sitting', {
  id: id(),
  course: text().notNull().references(() => course.id),
  /** 1 to 999999, the number that stands on printed sheets. */
  printNumber: integer().notNull().unique(),
  title: text().notNull(),
  heldOn: text().notNull(),
  status: text({ enum: sittingStatuses }).notNull().default('draft'),
  /** The scheme version in force; null until the paper is locked. */
  schemeVersion: text(),
  desk: text({ enum: deskModes }).notNull().default('covered'),
  secondPolicy: text({ enum: secondPolicies }).notNull().default('none'),
  totalRounding: text({ enum: totalRoundings }).notNull().default('none'),
  boardDate: text(),
  /** Grows with each change of anything in the sitting. */
  seq: integer().notNull().default(0),
  rev: rev(),
});

export const candidate = sqliteTable(
  'candidate',
  {
    id: id(),
    sitting: text().notNull().references(() => sitting.id),
    number: text().notNull(),
    attendance: text({ enum: attendances }).notNull().default('expected'),
    /** The person who may see the result, once there is one to see. */
    person: text().references(() => person.id),
    rev: rev(),
  },
  (table) => [uniqueIndex('candidate_number').on(table.sitting, table.number)],
);

/** Names stand apart: one query module reads them, for the lead and the exams officer only. */
export const candidateName = sqliteTable('candidate_name', {
  candidate: text().primaryKey().references(() => candidate.id),
  name: text(),
  email: text(),
  erasedAt: instant(),
});

/** A row here means the paper and its layout are frozen. */
export const paperLock = sqliteTable('paper_lock', {
  sitting: text().primaryKey().references(() => sitting.id),
  lockedAt: instant().notNull(),
  lockedBy: text().notNull().references(() => person.id),
});
