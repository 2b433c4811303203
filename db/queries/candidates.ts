import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import type { Attendance, ScriptOrigin } from '../../shared/contracts/enums';
import { preparedOnce, type Database } from '../client';
import { answer, candidate, page, script } from '../schema';

export type CandidateRow = typeof candidate.$inferSelect;

/** In the order of the class list: ids are made in that order. */
export function candidateStandings(db: Database, sittingId: string, candidateId?: string) {
  return db
    .select({
      id: candidate.id,
      number: candidate.number,
      attendance: candidate.attendance,
      scriptNumber: script.number,
      pagesIn: sql<number>`count(${page.image})`,
      pages: sql<number>`count(${page.id})`,
      pagesExcused: sql<number>`coalesce(sum(${page.image} is null and ${page.excusedAt} is not null), 0)`,
      rev: candidate.rev,
    })
    .from(candidate)
    .leftJoin(script, and(eq(script.candidate, candidate.id), isNull(script.voidReason), isNull(script.mergedInto)))
    .leftJoin(page, eq(page.script, script.id))
    .where(candidateId === undefined ? eq(candidate.sitting, sittingId) : eq(candidate.id, candidateId))
    .groupBy(candidate.id)
    .orderBy(asc(candidate.id))
    .all();
}

export const findCandidate = (db: Database, id: string): CandidateRow | undefined =>
  db.select().from(candidate).where(eq(candidate.id, id)).get();

export const insertCandidate = (db: Database, row: typeof candidate.$inferInsert): void => void db.insert(candidate).values(row).run();

export const updateAttendance = (db: Database, id: string, attendance: Attendance): void =>
  void db
    .update(candidate)
    .set({ attendance, rev: sql`${candidate.rev} + 1` })
    .where(eq(candidate.id, id))
    .run();

/** Candidates of a sitting without a script of their own, in the order of the class list. */
export const candidatesWithoutScript = (db: Database, sittingId: string): string[] =>
  db
    .select({ id: candidate.id })
    .from(candidate)
    .leftJoin(script, and(eq(script.candidate, candidate.id), isNull(script.voidReason), isNull(script.mergedInto)))
    .where(and(eq(candidate.sitting, sittingId), isNull(script.id)))
    .orderBy(asc(candidate.id))
    .all()
    .map((row) => row.id);

export const answersOfCandidate = (db: Database, candidateId: string): string[] =>
  db
    .select({ id: answer.id })
    .from(answer)
    .innerJoin(script, eq(script.id, answer.script))
    .where(eq(script.candidate, candidateId))
    .all()
    .map((row) => row.id);

export const lastScriptNumber = (db: Database, sittingId: string): number =>
  db.select({ last: sql<number>`coalesce(max(${script.number}), 0)` }).from(script).where(eq(script.sitting, sittingId)).get()?.last ?? 0;

const statements = preparedOnce((db) => ({
  script: db
    .insert(script)
    .values({
      id: sql.placeholder('id'),
      sitting: sql.placeholder('sitting'),
      number: sql.placeholder('number'),
      layout: sql.placeholder('layout'),
      candidate: sql.placeholder('candidate'),
      origin: sql.placeholder('origin'),
    })
    .prepare(),
  page: db
    .insert(page)
    .values({ id: sql.placeholder('id'), script: sql.placeholder('script'), pageNo: sql.placeholder('pageNo') })
    .prepare(),
  answer: db
    .insert(answer)
    .values({
      id: sql.placeholder('id'),
      script: sql.placeholder('script'),
      item: sql.placeholder('item'),
      sitting: sql.placeholder('sitting'),
      shuffle: sql.placeholder('shuffle'),
      seq: sql.placeholder('seq'),
    })
    .prepare(),
}));

export const insertScript = (db: Database, row: { id: string; sitting: string; number: number; layout: string | null; candidate: string | null; origin: ScriptOrigin }): void =>
  void statements(db).script.run(row);

export const insertPage = (db: Database, row: { id: string; script: string; pageNo: number }): void => void statements(db).page.run(row);

export const insertAnswer = (
  db: Database,
  row: { id: string; script: string; item: string; sitting: string; shuffle: number; seq: number },
): void => void statements(db).answer.run(row);
