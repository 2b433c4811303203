import { index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { auditActs } from '../../shared/contracts/enums';
import { instant } from './columns';

/** Append-only. Written in the transaction of the act; ids, never names; each entry hashed with the one before. */
export const auditEntry = sqliteTable(
  'audit_entry',
  {
    n: integer().primaryKey(),
    at: instant().notNull(),
    actor: text(),
    act: text({ enum: auditActs }).notNull(),
    sitting: text(),
    subject: text(),
    /** JSON text, hashed as it stands. */
    before: text(),
    after: text(),
    reason: text(),
    prevHash: text().notNull(),
    hash: text().notNull(),
  },
  (table) => [index('audit_by_subject').on(table.subject), index('audit_by_sitting').on(table.sitting, table.at)],
);

/** The stored answer to a write that is no reading, so that a repeated request changes nothing. */
export const idempotency = sqliteTable(
  'idempotency',
  {
    key: text().notNull(),
    person: text().notNull(),
    requestHash: text().notNull(),
    status: integer().notNull(),
    response: text().notNull(),
    at: instant().notNull(),
  },
  (table) => [primaryKey({ columns: [table.person, table.key] }), index('idempotency_by_age').on(table.at)],
);
