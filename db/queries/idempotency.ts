import { and, eq, lt } from 'drizzle-orm';
import type { Database } from '../client';
import { idempotency } from '../schema';

export const findStoredResponse = (db: Database, person: string, key: string) =>
  db.select().from(idempotency).where(and(eq(idempotency.person, person), eq(idempotency.key, key))).get();

export const storeResponse = (db: Database, row: typeof idempotency.$inferInsert): void => void db.insert(idempotency).values(row).run();

export const forgetResponsesBefore = (db: Database, at: number): void => void db.delete(idempotency).where(lt(idempotency.at, at)).run();
