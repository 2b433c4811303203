import { desc, sql } from 'drizzle-orm';
import { preparedOnce, type Database } from '../client';
import { auditEntry } from '../schema';

export type AuditRow = typeof auditEntry.$inferInsert;

const statements = preparedOnce((db) => ({
  head: db.select({ n: auditEntry.n, hash: auditEntry.hash }).from(auditEntry).orderBy(desc(auditEntry.n)).limit(1).prepare(),
  insert: db
    .insert(auditEntry)
    .values({
      n: sql.placeholder('n'),
      at: sql.placeholder('at'),
      actor: sql.placeholder('actor'),
      act: sql.placeholder('act'),
      sitting: sql.placeholder('sitting'),
      subject: sql.placeholder('subject'),
      before: sql.placeholder('before'),
      after: sql.placeholder('after'),
      reason: sql.placeholder('reason'),
      prevHash: sql.placeholder('prevHash'),
      hash: sql.placeholder('hash'),
    })
    .prepare(),
}));

export const auditHead = (db: Database) => statements(db).head.get();

export const insertAuditEntry = (db: Database, row: AuditRow): void => void statements(db).insert.run(row as Record<string, unknown>);
