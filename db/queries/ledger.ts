import { and, asc, count, desc, eq, inArray, isNotNull, isNull, or, sql, type SQL } from 'drizzle-orm';
import { heldStates } from '../../shared/contracts/enums';
import type { LedgerChip, LedgerSort } from '../../shared/contracts/enums';
import type { Database } from '../client';
import {
  answer,
  candidate,
  item,
  reading,
  readingEnd,
  score,
  script,
  uncovered,
  verdict,
} from '../schema';
import { waitsForItem } from './answers';

export interface LedgerQuestion {
  readonly sitting: string;
  readonly show: LedgerChip;
  readonly item: string | undefined;
  readonly find: string | undefined;
  readonly sort: LedgerSort;
  readonly direction: 'up' | 'down';
}

const chipFilter = (chip: LedgerChip): SQL | undefined => {
  if (chip === 'all') return undefined;
  return chip === 'to-rule' ? inArray(answer.state, [...heldStates]) : eq(answer.state, chip);
};

/** A candidate number or a settled value; `*` stands for anything. What is held has no settled value to be found by. */
function findFilter(find: string | undefined): SQL | undefined {
  if (!find) return undefined;
  const pattern = find.replace(/[\\%_]/g, '\\$&').replaceAll('*', '%');
  return or(sql`${candidate.number} like ${`%${pattern}%`} escape '\\'`, sql`${answer.settledCanonical} like ${pattern} escape '\\'`);
}

const scopeOf = (question: LedgerQuestion): SQL | undefined =>
  and(eq(answer.sitting, question.sitting), isNotNull(script.candidate), isNull(script.voidReason), question.item === undefined ? undefined : eq(answer.item, question.item), findFilter(question.find));

function orderOf({ sort, direction }: LedgerQuestion): SQL[] {
  const turn = direction === 'up' ? asc : desc;
  const first = { candidate: candidate.number, item: item.number, state: answer.state, value: answer.sortValue, mark: score.grains }[sort];
  const emptyLast = sort === 'value' || sort === 'mark' ? [sql`${first} is null`] : [];
  return [...emptyLast, turn(first), asc(candidate.number), asc(item.number)];
}

/** One window of the ledger. */
export function ledgerRows(db: Database, question: LedgerQuestion, offset: number, limit: number) {
  return db
    .select({
      answerId: answer.id,
      candidateNumber: candidate.number,
      itemId: item.id,
      itemNumber: item.number,
      state: answer.state,
      readingsDue: answer.readingsDue,
      sortValue: answer.sortValue,
      grains: score.grains,
      maxGrains: item.maxGrains,
      rule: verdict.rule,
      numbers: verdict.numbers,
      waitsFor: waitsForItem,
      rev: answer.rev,
    })
    .from(answer)
    .innerJoin(item, eq(item.id, answer.item))
    .innerJoin(script, eq(script.id, answer.script))
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .leftJoin(score, eq(score.id, answer.score))
    .leftJoin(verdict, eq(verdict.id, score.verdict))
    .where(and(scopeOf(question), chipFilter(question.show)))
    .orderBy(...orderOf(question))
    .limit(limit)
    .offset(offset)
    .all();
}

/** How many answers stand in each state, within the item and the search but not the chip. */
export function ledgerCounts(db: Database, question: LedgerQuestion) {
  return db
    .select({ state: answer.state, n: count() })
    .from(answer)
    .innerJoin(script, eq(script.id, answer.script))
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .where(scopeOf(question))
    .groupBy(answer.state)
    .all();
}

/** Where in the whole list, in its order, the held rows are. */
export function heldOffsets(db: Database, question: LedgerQuestion): number[] {
  const numbered = db
    .select({ at: sql<number>`row_number() over (order by ${sql.join(orderOf(question), sql`, `)}) - 1`.as('at'), state: answer.state })
    .from(answer)
    .innerJoin(item, eq(item.id, answer.item))
    .innerJoin(script, eq(script.id, answer.script))
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .leftJoin(score, eq(score.id, answer.score))
    .where(and(scopeOf(question), chipFilter(question.show)))
    .as('numbered');
  return db.select({ at: numbered.at }).from(numbered).where(inArray(numbered.state, [...heldStates])).orderBy(sql`1`).all().map((row) => row.at);
}

/** Live readings of several answers, oldest first. */
export function readingsOfAnswers(db: Database, answerIds: readonly string[]) {
  return db
    .select({
      id: reading.id,
      answer: reading.answer,
      reader: reading.reader,
      text: reading.text,
      code: reading.code,
      canonical: reading.canonical,
      value: reading.value,
      method: reading.method,
      note: reading.note,
      recordedAt: reading.recordedAt,
    })
    .from(reading)
    .leftJoin(readingEnd, eq(readingEnd.reading, reading.id))
    .where(and(inArray(reading.answer, [...answerIds]), eq(reading.purpose, 'live'), isNull(readingEnd.reading)))
    .orderBy(asc(reading.recordedAt), asc(reading.id))
    .all();
}

/** Which of the answers a person has uncovered. */
export function uncoveredBy(db: Database, personId: string, answerIds: readonly string[]): Set<string> {
  const rows = db
    .select({ answer: uncovered.answer })
    .from(uncovered)
    .where(and(eq(uncovered.person, personId), inArray(uncovered.answer, [...answerIds])))
    .all();
  return new Set(rows.map((row) => row.answer));
}
