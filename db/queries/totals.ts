import { and, asc, eq, isNull } from 'drizzle-orm';
import type { Database } from '../client';
import { answer, candidate, exportFile, item, reading, readingEnd, ruling, rulingEnd, score, script, total } from '../schema';

/** Every live script with its candidate and stored total, by candidate number. */
export function scriptTotals(db: Database, sittingId: string) {
  return db
    .select({
      script: script.id,
      candidateId: candidate.id,
      candidateNumber: candidate.number,
      attendance: candidate.attendance,
      grains: total.roundedGrains,
      missing: total.missing,
    })
    .from(script)
    .innerJoin(candidate, eq(candidate.id, script.candidate))
    .leftJoin(total, eq(total.script, script.id))
    .where(and(eq(script.sitting, sittingId), isNull(script.voidReason), isNull(script.mergedInto)))
    .orderBy(asc(candidate.number))
    .all();
}

export function marksOfSitting(db: Database, sittingId: string) {
  return db
    .select({ answerId: answer.id, script: answer.script, itemNumber: item.number, state: answer.state, grains: score.grains })
    .from(answer)
    .innerJoin(item, eq(item.id, answer.item))
    .leftJoin(score, eq(score.id, answer.score))
    .where(eq(answer.sitting, sittingId))
    .orderBy(asc(item.number))
    .all();
}

/** What stands as read for every answer that has a settled form: the ruling's text, else the first live reading's. */
export function standingTexts(db: Database, sittingId: string): Map<string, { text: string | null; code: string | null }> {
  const found = new Map<string, { text: string | null; code: string | null }>();
  const readings = db
    .select({ answer: reading.answer, text: reading.text, code: reading.code })
    .from(reading)
    .innerJoin(answer, eq(answer.id, reading.answer))
    .leftJoin(readingEnd, eq(readingEnd.reading, reading.id))
    .where(and(eq(answer.sitting, sittingId), eq(reading.purpose, 'live'), isNull(readingEnd.reading), eq(answer.settledFrom, 'reading')))
    .orderBy(asc(reading.recordedAt), asc(reading.id))
    .all();
  for (const row of readings) if (!found.has(row.answer)) found.set(row.answer, row);
  const rulings = db
    .select({ answer: ruling.answer, text: ruling.text, code: ruling.code, kind: ruling.kind })
    .from(ruling)
    .innerJoin(answer, eq(answer.id, ruling.answer))
    .leftJoin(rulingEnd, eq(rulingEnd.ruling, ruling.id))
    .where(and(eq(answer.sitting, sittingId), isNull(rulingEnd.ruling)))
    .all();
  for (const row of rulings) if (row.kind !== 'mark') found.set(row.answer, row);
  return found;
}

export const insertExport = (db: Database, row: typeof exportFile.$inferInsert): void => void db.insert(exportFile).values(row).run();

export const findExport = (db: Database, id: string) => db.select().from(exportFile).where(eq(exportFile.id, id)).get();
