import { eq, sql } from 'drizzle-orm';
import { preparedOnce, type Database } from '../client';
import { paperLock, sitting } from '../schema';

export type SittingRow = typeof sitting.$inferSelect;

const statements = preparedOnce((db) => ({
  byId: db.select().from(sitting).where(eq(sitting.id, sql.placeholder('id'))).prepare(),
  bump: db
    .update(sitting)
    .set({ seq: sql`${sitting.seq} + 1` })
    .where(eq(sitting.id, sql.placeholder('id')))
    .returning({ seq: sitting.seq })
    .prepare(),
  lock: db.select({ at: paperLock.lockedAt }).from(paperLock).where(eq(paperLock.sitting, sql.placeholder('sitting'))).prepare(),
}));

export const findSitting = (db: Database, id: string): SittingRow | undefined => statements(db).byId.get({ id });

/** Adds one to the sitting's number of changes and gives the new one. */
export function bumpSittingSeq(db: Database, id: string): number {
  const row = statements(db).bump.get({ id });
  if (!row) throw new Error(`No sitting ${id} to count a change in.`);
  return row.seq;
}

export const isPaperLocked = (db: Database, sittingId: string): boolean => statements(db).lock.get({ sitting: sittingId }) !== undefined;
