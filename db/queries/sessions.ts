import { and, eq, gt, lte, sql } from 'drizzle-orm';
import { preparedOnce, type Database } from '../client';
import { session } from '../schema';

const statements = preparedOnce((db) => ({
  live: db
    .select({ data: session.data, seenAt: session.seenAt })
    .from(session)
    .where(and(eq(session.idHash, sql.placeholder('idHash')), gt(session.endsAt, sql.placeholder('now'))))
    .prepare(),
}));

export function findSession(db: Database, idHash: string, now: number): { data: string; seenAt: number } | undefined {
  return statements(db).live.get({ idHash, now });
}

export function saveSession(db: Database, row: typeof session.$inferInsert): void {
  const { idHash: _idHash, createdAt: _createdAt, ...changing } = row;
  db.insert(session).values(row).onConflictDoUpdate({ target: session.idHash, set: changing }).run();
}

export function touchSession(db: Database, idHash: string, seenAt: number, endsAt: number): void {
  db.update(session).set({ seenAt, endsAt }).where(eq(session.idHash, idHash)).run();
}

export function deleteSession(db: Database, idHash: string): void {
  db.delete(session).where(eq(session.idHash, idHash)).run();
}

export function deleteSessionsOf(db: Database, personId: string): void {
  db.delete(session).where(eq(session.person, personId)).run();
}

export function deleteEndedSessions(db: Database, now: number): void {
  db.delete(session).where(lte(session.endsAt, now)).run();
}
