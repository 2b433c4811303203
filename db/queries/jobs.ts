import { and, asc, count, eq, gte, inArray, lte, sql } from 'drizzle-orm';
import type { Database } from '../client';
import { job } from '../schema';

export type JobRow = typeof job.$inferSelect;

/** Adds a job unless an open one has the same key. */
export function insertJob(db: Database, row: { id: string; kind: string; dedupeKey: string; payload: Record<string, unknown>; runAt: number }): void {
  db.insert(job).values(row).onConflictDoNothing().run();
}

/** Takes the next job that is due, counting the try. */
export function claimJob(db: Database, now: number, leasedUntil: number): JobRow | undefined {
  const next = db
    .select({ id: job.id })
    .from(job)
    .where(and(eq(job.state, 'waiting'), lte(job.runAt, now)))
    .orderBy(asc(job.runAt), asc(job.id))
    .limit(1)
    .get();
  if (!next) return undefined;
  return db
    .update(job)
    .set({ state: 'running', leasedUntil, tries: sql`${job.tries} + 1` })
    .where(eq(job.id, next.id))
    .returning()
    .get();
}

/** Some of a job's work is on disk: it is held longer, and what went wrong before counts no more. */
export function beatJob(db: Database, id: string, leasedUntil: number): void {
  db.update(job).set({ leasedUntil, tries: 1, crashes: 0 }).where(eq(job.id, id)).run();
}

export function finishJob(db: Database, id: string): void {
  db.update(job).set({ state: 'done', leasedUntil: null, error: null }).where(eq(job.id, id)).run();
}

/** Puts a failed job back for a later try, or ends it when its tries are used up. */
export function failJob(db: Database, id: string, error: string, again: { runAt: number } | null): void {
  db.update(job)
    .set({ state: again ? 'waiting' : 'dead', error, leasedUntil: null, ...(again ? { runAt: again.runAt } : {}) })
    .where(eq(job.id, id))
    .run();
}

/** What an earlier process left running waits again, unless it ended too many of them: only one process works on a database. */
export function reviveJobs(db: Database, mostCrashes: number): void {
  db.update(job)
    .set({ state: 'waiting', leasedUntil: null, tries: sql`${job.tries} - 1`, crashes: sql`${job.crashes} + 1` })
    .where(eq(job.state, 'running'))
    .run();
  db.update(job)
    .set({ state: 'dead', error: 'The server stopped each time it was tried.' })
    .where(and(eq(job.state, 'waiting'), gte(job.crashes, mostCrashes)))
    .run();
}

/** Jobs that were given up, by the key they were added with. */
export const deadJobs = (db: Database, keys: readonly string[]): Map<string, string> =>
  new Map(
    db
      .select({ key: job.dedupeKey, error: job.error })
      .from(job)
      .where(and(eq(job.state, 'dead'), inArray(job.dedupeKey, [...keys])))
      .orderBy(asc(job.id))
      .all()
      .map(({ key, error }) => [key, error ?? '']),
  );

/** Ends what is not under way: a waiting job, and the record of a dead one. */
export const cancelJobs = (db: Database, keys: readonly string[]): void =>
  void db.update(job).set({ state: 'cancelled' }).where(and(inArray(job.state, ['waiting', 'dead']), inArray(job.dedupeKey, [...keys]))).run();

export function openJobs(db: Database): number {
  return db.select({ n: count() }).from(job).where(inArray(job.state, ['waiting', 'running'])).get()?.n ?? 0;
}

export function nextRunAt(db: Database): number | null {
  return db.select({ at: job.runAt }).from(job).where(eq(job.state, 'waiting')).orderBy(asc(job.runAt)).limit(1).get()?.at ?? null;
}
