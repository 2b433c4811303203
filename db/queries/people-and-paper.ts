import { and, asc, desc, eq, inArray, isNull, ne, notExists, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/sqlite-core';
import type { Database } from '../client';
import { answer, candidate, item, numberReading, numberSettled, numberStrip, page, reading, readingEnd, script, scriptBinding } from '../schema';

export type ScriptRow = typeof script.$inferSelect;

const isLive = and(isNull(script.voidReason), isNull(script.mergedInto));

export const findScript = (db: Database, id: string): ScriptRow | undefined => db.select().from(script).where(and(eq(script.id, id), isLive)).get();

export const scriptOfCandidate = (db: Database, candidateId: string): ScriptRow | undefined => db.select().from(script).where(and(eq(script.candidate, candidateId), isLive)).get();

export const answerIdsOf = (db: Database, scriptId: string): string[] => db.select({ id: answer.id }).from(answer).where(eq(answer.script, scriptId)).all().map(({ id }) => id);

export const answerOfItem = (db: Database, scriptId: string): Map<string, string> =>
  new Map(db.select({ id: answer.id, item: answer.item }).from(answer).where(eq(answer.script, scriptId)).all().map((row) => [row.item, row.id]));

/** Live scripts with their candidate, the strip of the own number, the last reading of it from that image, and whether a lead settled it so. */
export function scriptSheets(db: Database, sittingId: string) {
  const ofStrip = and(eq(numberReading.script, script.id), eq(numberReading.pageImage, numberStrip.pageImage));
  const lastReading = sql<string | null>`(select ${numberReading.id} from ${numberReading} where ${ofStrip} order by ${numberReading.at} desc, ${numberReading.id} desc limit 1)`;
  return db
    .select({
      scriptId: script.id,
      scriptNumber: script.number,
      origin: script.origin,
      candidateId: candidate.id,
      candidateNumber: candidate.number,
      attendance: candidate.attendance,
      pages: sql<number>`(select count(*) from ${page} where ${page.script} = ${script.id})`,
      pagesIn: sql<number>`(select count(${page.image}) from ${page} where ${page.script} = ${script.id})`,
      stripBlob: numberStrip.blob,
      stripImage: numberStrip.pageImage,
      readingId: numberReading.id,
      read: numberReading.text,
      isSettled: sql<number>`exists (select 1 from ${numberSettled} where ${numberSettled.script} = ${script.id} and ${numberSettled.pageImage} = ${numberStrip.pageImage} and ${numberSettled.candidate} is ${script.candidate})`,
    })
    .from(script)
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .leftJoin(numberStrip, eq(numberStrip.script, script.id))
    .leftJoin(numberReading, sql`${numberReading.id} = ${lastReading}`)
    .where(and(eq(script.sitting, sittingId), isLive))
    .orderBy(asc(script.number))
    .all();
}

/** Pages of live scripts that are due, not in and not excused, by script. */
export const missingPages = (db: Database, sittingId: string): { script: string; pageNo: number }[] =>
  db
    .select({ script: page.script, pageNo: page.pageNo })
    .from(page)
    .innerJoin(script, eq(script.id, page.script))
    .where(and(eq(script.sitting, sittingId), isLive, isNull(page.image), isNull(page.excusedAt), ne(script.origin, 'by-hand')))
    .orderBy(asc(page.pageNo))
    .all();

const unreadStrips = (db: Database, sittingId: string) =>
  and(
    eq(script.sitting, sittingId),
    isLive,
    notExists(db.select({ one: sql`1` }).from(numberReading).where(and(eq(numberReading.script, numberStrip.script), eq(numberReading.pageImage, numberStrip.pageImage)))),
  );

/** Strips nobody has read yet, in an order that says nothing of the class list. */
export const stripsToRead = (db: Database, sittingId: string, limit: number) =>
  db
    .select({ scriptId: numberStrip.script, blob: numberStrip.blob, widthPx: numberStrip.widthPx, heightPx: numberStrip.heightPx })
    .from(numberStrip)
    .innerJoin(script, eq(script.id, numberStrip.script))
    .where(unreadStrips(db, sittingId))
    .orderBy(asc(numberStrip.blob))
    .limit(limit)
    .all();

export const countStripsToRead = (db: Database, sittingId: string): number =>
  db.select({ n: sql<number>`count(*)` }).from(numberStrip).innerJoin(script, eq(script.id, numberStrip.script)).where(unreadStrips(db, sittingId)).get()?.n ?? 0;

export const findStrip = (db: Database, scriptId: string) =>
  db.select({ strip: numberStrip, sitting: script.sitting }).from(numberStrip).innerJoin(script, eq(script.id, numberStrip.script)).where(eq(numberStrip.script, scriptId)).get();

export const saveStrip = (db: Database, row: typeof numberStrip.$inferInsert): void =>
  void db.insert(numberStrip).values(row).onConflictDoUpdate({ target: numberStrip.script, set: { pageImage: row.pageImage, blob: row.blob, widthPx: row.widthPx, heightPx: row.heightPx } }).run();

export const dropStrip = (db: Database, imageId: string): void => void db.delete(numberStrip).where(eq(numberStrip.pageImage, imageId)).run();

export const findNumberReading = (db: Database, id: string) => db.select().from(numberReading).where(eq(numberReading.id, id)).get();

export const insertNumberReading = (db: Database, row: typeof numberReading.$inferInsert): void => void db.insert(numberReading).values(row).run();

export const insertNumberSettled = (db: Database, row: typeof numberSettled.$inferInsert): void => void db.insert(numberSettled).values(row).run();

export const setScriptCandidate = (db: Database, id: string, candidateId: string | null): void => void db.update(script).set({ candidate: candidateId }).where(eq(script.id, id)).run();

export const voidScript = (db: Database, id: string, voidReason: string): void => void db.update(script).set({ voidReason }).where(eq(script.id, id)).run();

export const setScriptOrigin = (db: Database, id: string, origin: ScriptRow['origin']): void => void db.update(script).set({ origin }).where(eq(script.id, id)).run();

export const insertBinding = (db: Database, row: typeof scriptBinding.$inferInsert): void => void db.insert(scriptBinding).values(row).run();

const before = alias(candidate, 'before');

export const bindingsOf = (db: Database, sittingId: string) =>
  db
    .select({ at: scriptBinding.at, scriptNumber: script.number, act: scriptBinding.act, was: before.number, candidateNumber: candidate.number, reason: scriptBinding.reason })
    .from(scriptBinding)
    .innerJoin(script, eq(script.id, scriptBinding.script))
    .leftJoin(before, eq(before.id, scriptBinding.was))
    .leftJoin(candidate, eq(candidate.id, scriptBinding.candidate))
    .where(eq(script.sitting, sittingId))
    .orderBy(desc(scriptBinding.at), desc(scriptBinding.id))
    .limit(100)
    .all();

/** People who typed a script from the paper: those with a live reading of any of its answers. */
export const typistsOf = (db: Database, scriptIds: readonly string[]) =>
  db
    .selectDistinct({ script: answer.script, reader: reading.reader })
    .from(reading)
    .innerJoin(answer, eq(answer.id, reading.answer))
    .leftJoin(readingEnd, eq(readingEnd.reading, reading.id))
    .where(and(inArray(answer.script, [...scriptIds]), eq(reading.purpose, 'live'), isNull(readingEnd.reading)))
    .all();

export const itemsOfScript = (db: Database, scriptId: string) =>
  db.select({ id: item.id, number: item.number, prompt: item.prompt, answer: answer.id }).from(answer).innerJoin(item, eq(item.id, answer.item)).where(eq(answer.script, scriptId)).orderBy(asc(item.number)).all();
