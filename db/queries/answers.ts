import { and, asc, eq, ne, sql } from 'drizzle-orm';
import type { Database } from '../client';
import {
  answer,
  box,
  candidate,
  crop,
  item,
  page,
  pageImage,
  reading,
  readingEnd,
  ruling,
  rulingEnd,
  schemeVersion,
  score,
  script,
  uncovered,
  verdict,
} from '../schema';

/** One answer with what identifies it. */
/** The number of the item whose answer is waited for. */
export const waitsForItem = sql<number | null>`(select i.number from answer a join item i on i.id = a.item where a.id = ${answer.waitsFor})`;

export function answerHead(db: Database, answerId: string) {
  return db
    .select({
      id: answer.id,
      sitting: answer.sitting,
      script: answer.script,
      item: answer.item,
      itemNumber: item.number,
      prompt: item.prompt,
      maxGrains: item.maxGrains,
      candidateNumber: candidate.number,
      state: answer.state,
      readingsDue: answer.readingsDue,
      settledCanonical: answer.settledCanonical,
      score: answer.score,
      waitsFor: waitsForItem,
      rev: answer.rev,
    })
    .from(answer)
    .innerJoin(item, eq(item.id, answer.item))
    .innerJoin(script, eq(script.id, answer.script))
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .where(eq(answer.id, answerId))
    .get();
}

export function cropsOfAnswer(db: Database, answerId: string) {
  return db
    .select({ box: box.id, use: box.use, widthPx: crop.widthPx, heightPx: crop.heightPx, blob: crop.blob, evidence: crop.evidence, pageImage: crop.pageImage, pageNo: box.pageNo })
    .from(crop)
    .innerJoin(box, and(eq(box.id, crop.box), ne(box.use, 'number')))
    .where(eq(crop.answer, answerId))
    .orderBy(asc(box.use), asc(box.y))
    .all();
}

/** The page image that holds an answer, where its page is in. */
export function pageOfAnswer(db: Database, scriptId: string, pageNo: number) {
  return db
    .select({ image: pageImage.id, rev: pageImage.rev })
    .from(page)
    .innerJoin(pageImage, eq(pageImage.id, page.image))
    .where(and(eq(page.script, scriptId), eq(page.pageNo, pageNo)))
    .get();
}

export const rulingById = (db: Database, id: string) => db.select().from(ruling).where(eq(ruling.id, id)).get();
export const insertRuling = (db: Database, row: typeof ruling.$inferInsert): void => void db.insert(ruling).values(row).run();
export const endRuling = (db: Database, row: typeof rulingEnd.$inferInsert): void => void db.insert(rulingEnd).values(row).run();
export const insertUncovered = (db: Database, row: typeof uncovered.$inferInsert): void =>
  void db.insert(uncovered).values(row).onConflictDoNothing().run();

/** The third reading this person typed last for an answer. */
export const thirdReadingOf = (db: Database, answerId: string, personId: string) =>
  db
    .select()
    .from(reading)
    .where(and(eq(reading.answer, answerId), eq(reading.reader, personId), eq(reading.purpose, 'third')))
    .orderBy(sql`${reading.recordedAt} desc`)
    .limit(1)
    .get();

/** The standing score with the verdict behind it. */
export function scoreWithVerdict(db: Database, scoreId: string) {
  return db
    .select({ grains: score.grains, rule: verdict.rule, numbers: verdict.numbers, ordinal: schemeVersion.ordinal })
    .from(score)
    .innerJoin(schemeVersion, eq(schemeVersion.id, score.schemeVersion))
    .leftJoin(verdict, eq(verdict.id, score.verdict))
    .where(eq(score.id, scoreId))
    .get();
}

export const readingsEver = (db: Database, answerId: string) =>
  db.select().from(reading).leftJoin(readingEnd, eq(readingEnd.reading, reading.id)).where(eq(reading.answer, answerId)).all();

export const rulingsEver = (db: Database, answerId: string) =>
  db.select().from(ruling).leftJoin(rulingEnd, eq(rulingEnd.ruling, ruling.id)).where(eq(ruling.answer, answerId)).all();

export const scoresEver = (db: Database, answerId: string) =>
  db
    .select({ id: score.id, grains: score.grains, at: score.at, ordinal: schemeVersion.ordinal })
    .from(score)
    .innerJoin(schemeVersion, eq(schemeVersion.id, score.schemeVersion))
    .where(eq(score.answer, answerId))
    .all();

/** Everyone who has read in a sitting, by their first reading: the order of the pseudonyms. */
export function readersOfSitting(db: Database, sittingId: string): string[] {
  return db
    .select({ reader: reading.reader })
    .from(reading)
    .innerJoin(answer, eq(answer.id, reading.answer))
    .where(and(eq(answer.sitting, sittingId), eq(reading.purpose, 'live')))
    .groupBy(reading.reader)
    .orderBy(sql`min(${reading.recordedAt})`, reading.reader)
    .all()
    .map((row) => row.reader);
}
