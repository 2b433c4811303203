import { sql } from 'drizzle-orm';
import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { membershipRoles } from '../../shared/contracts/enums';
import { id, instant } from './columns';

export const person = sqliteTable('person', {
  id: id(),
  name: text(),
  email: text().unique(),
  passwordHash: text(),
  isOfficer: integer({ mode: 'boolean' }).notNull().default(false),
  erasedAt: instant(),
});

export const course = sqliteTable('course', {
  id: id(),
  code: text().notNull(),
  title: text().notNull(),
  timeZone: text().notNull(),
  archivedAt: instant(),
});

/** One person may hold several roles in a course; a role ends, it is not deleted. */
export const membership = sqliteTable(
  'membership',
  {
    id: id(),
    person: text().notNull().references(() => person.id),
    course: text().notNull().references(() => course.id),
    role: text({ enum: membershipRoles }).notNull(),
    settlesReadings: integer({ mode: 'boolean' }).notNull().default(false),
    from: instant().notNull(),
    until: instant(),
  },
  (table) => [
    uniqueIndex('membership_one_open_role').on(table.person, table.course, table.role).where(sql`"until" is null`),
    index('membership_by_course').on(table.course),
  ],
);

/** The session store of express-session: the cookie's id is kept hashed. */
export const session = sqliteTable(
  'session',
  {
    idHash: text().primaryKey(),
    person: text().references(() => person.id),
    data: text().notNull(),
    createdAt: instant().notNull(),
    seenAt: instant().notNull(),
    endsAt: instant().notNull(),
  },
  (table) => [index('session_by_person').on(table.person), index('session_by_end').on(table.endsAt)],
);
