import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import { preparedOnce, type Database } from '../client';
import {
  answer,
  candidate,
  item,
  itemScheme,
  reading,
  readingEnd,
  ruling,
  rulingEnd,
  schemeVersionItem,
  score,
  script,
  sitting,
  total,
  verdict,
} from '../schema';

const statements = preparedOnce((db) => ({
  facts: db
    .select({
      id: answer.id,
      item: answer.item,
      script: answer.script,
      sitting: answer.sitting,
      evidence: answer.evidence,
      state: answer.state,
      readingsDue: answer.readingsDue,
      settledCanonical: answer.settledCanonical,
      settledFrom: answer.settledFrom,
      score: answer.score,
      waitsFor: answer.waitsFor,
      sortValue: answer.sortValue,
      attendance: candidate.attendance,
      origin: script.origin,
      secondPolicy: sitting.secondPolicy,
      schemeVersion: sitting.schemeVersion,
    })
    .from(answer)
    .innerJoin(sitting, eq(sitting.id, answer.sitting))
    .innerJoin(script, eq(script.id, answer.script))
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .where(eq(answer.id, sql.placeholder('answer')))
    .prepare(),
  readings: db
    .select({ id: reading.id, canonical: reading.canonical, code: reading.code, text: reading.text, value: reading.value, method: reading.method })
    .from(reading)
    .leftJoin(readingEnd, eq(readingEnd.reading, reading.id))
    .where(and(eq(reading.answer, sql.placeholder('answer')), eq(reading.purpose, 'live'), isNull(readingEnd.reading)))
    .orderBy(asc(reading.recordedAt), asc(reading.id))
    .prepare(),
  ruling: db
    .select({ ruling })
    .from(ruling)
    .leftJoin(rulingEnd, eq(rulingEnd.ruling, ruling.id))
    .where(and(eq(ruling.answer, sql.placeholder('answer')), isNull(rulingEnd.ruling)))
    .prepare(),
  verdict: db
    .select({ id: verdict.id, grains: verdict.grains, rule: verdict.rule, numbers: verdict.numbers })
    .from(verdict)
    .where(
      and(
        eq(verdict.itemScheme, sql.placeholder('itemScheme')),
        eq(verdict.canonical, sql.placeholder('canonical')),
        eq(verdict.context, sql.placeholder('context')),
      ),
    )
    .prepare(),
  score: db.select().from(score).where(eq(score.id, sql.placeholder('id'))).prepare(),
  insertScore: db
    .insert(score)
    .values({
      id: sql.placeholder('id'),
      answer: sql.placeholder('answer'),
      schemeVersion: sql.placeholder('schemeVersion'),
      reading: sql.placeholder('reading'),
      ruling: sql.placeholder('ruling'),
      verdict: sql.placeholder('verdict'),
      grains: sql.placeholder('grains'),
      cause: sql.placeholder('cause'),
      at: sql.placeholder('at'),
    })
    .prepare(),
  derived: db
    .update(answer)
    .set({
      state: sql`${sql.placeholder('state')}`,
      readingsDue: sql`${sql.placeholder('readingsDue')}`,
      settledCanonical: sql`${sql.placeholder('settledCanonical')}`,
      settledFrom: sql`${sql.placeholder('settledFrom')}`,
      score: sql`${sql.placeholder('score')}`,
      waitsFor: sql`${sql.placeholder('waitsFor')}`,
      sortValue: sql`${sql.placeholder('sortValue')}`,
      seq: sql`${sql.placeholder('seq')}`,
      rev: sql`${answer.rev} + 1`,
    })
    .where(eq(answer.id, sql.placeholder('answer')))
    .prepare(),
  ofScript: db
    .select({
      id: answer.id,
      item: answer.item,
      state: answer.state,
      settledCanonical: answer.settledCanonical,
      numbers: verdict.numbers,
    })
    .from(answer)
    .leftJoin(score, eq(score.id, answer.score))
    .leftJoin(verdict, eq(verdict.id, score.verdict))
    .where(eq(answer.script, sql.placeholder('script')))
    .prepare(),
  sum: db
    .select({
      grains: sql<number>`coalesce(sum(${score.grains}), 0)`,
      missing: sql<number>`sum(${answer.score} is null)`,
    })
    .from(answer)
    .leftJoin(score, eq(score.id, answer.score))
    .where(eq(answer.script, sql.placeholder('script')))
    .prepare(),
  saveTotal: db
    .insert(total)
    .values({
      script: sql.placeholder('script'),
      grains: sql.placeholder('grains'),
      missing: sql.placeholder('missing'),
      roundedGrains: sql.placeholder('roundedGrains'),
      rev: 1,
    })
    .onConflictDoUpdate({
      target: total.script,
      set: {
        grains: sql`excluded.grains`,
        missing: sql`excluded.missing`,
        roundedGrains: sql`excluded.rounded_grains`,
        rev: sql`${total.rev} + 1`,
      },
    })
    .prepare(),
}));

export type ScoreRow = typeof score.$inferSelect;
export type RulingRow = typeof ruling.$inferSelect;

/** What settling needs of an answer besides its readings and rulings. */
export const settlingFacts = (db: Database, answerId: string) => statements(db).facts.get({ answer: answerId });

/** Live readings of an answer, oldest first. */
export const liveReadings = (db: Database, answerId: string) => statements(db).readings.all({ answer: answerId });

export const standingRuling = (db: Database, answerId: string): RulingRow | undefined =>
  statements(db).ruling.get({ answer: answerId })?.ruling;

/** The items of a scheme version in paper order, each with its scheme. */
export const schemesOfVersion = (db: Database, version: string) =>
  db
    .select({ id: item.id, number: item.number, hash: itemScheme.hash, body: itemScheme.body })
    .from(schemeVersionItem)
    .innerJoin(item, eq(item.id, schemeVersionItem.item))
    .innerJoin(itemScheme, eq(itemScheme.hash, schemeVersionItem.itemScheme))
    .where(eq(schemeVersionItem.version, version))
    .orderBy(asc(item.number), asc(item.id))
    .all();

/** The answers of one script with what is settled, and the numbers of the verdict that stands. */
export const answersOfScript = (db: Database, scriptId: string) => statements(db).ofScript.all({ script: scriptId });

export const findVerdict = (db: Database, itemSchemeHash: string, canonical: string, context: string) =>
  statements(db).verdict.get({ itemScheme: itemSchemeHash, canonical, context });

export const insertVerdict = (db: Database, row: typeof verdict.$inferInsert): void => void db.insert(verdict).values(row).run();

export const findScore = (db: Database, id: string): ScoreRow | undefined => statements(db).score.get({ id });

export type ScoreSource = Pick<ScoreRow, 'answer' | 'schemeVersion' | 'reading' | 'ruling' | 'verdict' | 'grains'>;

/** Same source, same version, same mark: then one row serves. */
export const isSameScore = (one: ScoreSource, other: ScoreSource): boolean =>
  one.answer === other.answer &&
  one.schemeVersion === other.schemeVersion &&
  one.reading === other.reading &&
  one.ruling === other.ruling &&
  one.verdict === other.verdict &&
  one.grains === other.grains;

/** The oldest score of the answer that is the same. */
export const findEqualScore = (db: Database, like: ScoreSource): ScoreRow | undefined =>
  db.select().from(score).where(eq(score.answer, like.answer)).orderBy(asc(score.at), asc(score.id)).all().find((row) => isSameScore(row, like));

export const insertScore = (db: Database, row: ScoreRow): void => void statements(db).insertScore.run({ ...row });

export interface DerivedState {
  readonly answer: string;
  readonly state: string;
  readonly readingsDue: number;
  readonly settledCanonical: string | null;
  readonly settledFrom: string | null;
  readonly score: string | null;
  readonly waitsFor: string | null;
  readonly sortValue: number | null;
  readonly seq: number;
}

/** Only settling writes this. */
export const saveDerivedState = (db: Database, row: DerivedState): void => void statements(db).derived.run({ ...row });

/** The sum of the standing scores of a script, and how many answers have none. */
export const sumOfScript = (db: Database, scriptId: string): { grains: number; missing: number } =>
  statements(db).sum.get({ script: scriptId }) ?? { grains: 0, missing: 0 };

export const saveTotal = (db: Database, row: { script: string; grains: number; missing: number; roundedGrains: number }): void =>
  void statements(db).saveTotal.run(row);

export const answersOfSitting = (db: Database, sittingId: string): string[] =>
  db.select({ id: answer.id }).from(answer).innerJoin(item, eq(item.id, answer.item)).where(eq(answer.sitting, sittingId)).all().map((row) => row.id);
