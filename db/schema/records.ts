import { index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { auditActs, exportKinds } from '../../shared/contracts/enums';
import { id, instant } from './columns';
import { person } from './people';
import { blob } from './scans';
import { sitting } from './sittings';

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

/** A file made of the marks as they stood; its bytes are a blob. */
export const exportFile = sqliteTable(
  'export_file',
  {
    id: id(),
    sitting: text().notNull().references(() => sitting.id),
    kind: text({ enum: exportKinds }).notNull(),
    fileName: text().notNull(),
    blob: text().notNull().references(() => blob.sha256),
    /** The number of change of the sitting that the file shows. */
    asOf: integer().notNull(),
    by: text().notNull().references(() => person.id),
    at: instant().notNull(),
  },
  (table) => [index('export_by_sitting').on(table.sitting)],
);
