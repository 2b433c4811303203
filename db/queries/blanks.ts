import { and, asc, count, eq, exists, isNotNull, isNull, ne, notExists, or, sql, type SQL } from 'drizzle-orm';
import type { Database } from '../client';
import { answer, box, crop, lease, reading, readingEnd, script } from '../schema';

const cropsOf = (db: Database, which: SQL | undefined) =>
  db
    .select({ one: sql`1` })
    .from(crop)
    .innerJoin(box, eq(box.id, crop.box))
    .where(and(eq(crop.answer, answer.id), which));

/** A crop that keeps its answer off the sheet. Most workings have no frame to judge ink by: those are shown, and people look. */
const speaksAgainst = () =>
  or(
    ne(crop.evidence, 'in'),
    and(eq(box.use, 'answer'), or(isNull(crop.ink), ne(crop.ink, 'blank'))),
    and(eq(box.use, 'working'), isNotNull(crop.ink), ne(crop.ink, 'blank')),
  );

/** Empty by its ink, its frame seen whole, and no working that is known to hold something: a value may stand there. */
const looksEmpty = (db: Database) =>
  and(
    exists(cropsOf(db, eq(box.use, 'answer'))),
    notExists(cropsOf(db, and(ne(box.use, 'number'), speaksAgainst()))),
  );

/** Still due, not read by this reader, and typed from a picture. */
const toReadBy = (db: Database, person: string) =>
  and(
    sql`${answer.readingsDue} > 0`,
    notExists(
      db
        .select({ one: sql`1` })
        .from(reading)
        .leftJoin(readingEnd, eq(readingEnd.reading, reading.id))
        .where(and(eq(reading.answer, answer.id), eq(reading.reader, person), isNull(readingEnd.reading))),
    ),
    exists(db.select({ one: sql`1` }).from(script).where(and(eq(script.id, answer.script), ne(script.origin, 'by-hand')))),
  );

const heldByAnother = (db: Database, person: string) =>
  db
    .select({ one: sql`1` })
    .from(lease)
    .where(and(eq(lease.answer, answer.id), eq(lease.purpose, 'live'), isNull(lease.endedAt), ne(lease.reader, person)));

export interface WantedSheet {
  readonly reader: string;
  readonly item: string;
  readonly limit: number;
  /** The last answer of the sheet before. */
  readonly after: string | undefined;
}

/** Answers of an item whose boxes look empty, in the random order of the item, with the lease this reader holds already. */
export function emptyAnswers(db: Database, { reader: person, item, limit, after }: WantedSheet): { id: string; lease: string | null }[] {
  const beyond = after === undefined ? undefined : sql`(${answer.shuffle}, ${answer.id}) > (select "later"."shuffle", "later"."id" from ${answer} as "later" where "later"."id" = ${after})`;
  return db
    .select({ id: answer.id, lease: lease.id })
    .from(answer)
    .leftJoin(lease, and(eq(lease.answer, answer.id), eq(lease.purpose, 'live'), isNull(lease.endedAt)))
    .where(and(eq(answer.item, item), toReadBy(db, person), notExists(heldByAnother(db, person)), looksEmpty(db), beyond))
    .orderBy(asc(answer.shuffle), asc(answer.id))
    .limit(limit)
    .all();
}

/** By item: boxes that look empty, are to be read by this reader and are not with another. */
export function emptyCounts(db: Database, person: string, sittingId: string): Map<string, number> {
  const rows = db
    .select({ item: answer.item, n: count() })
    .from(answer)
    .where(and(eq(answer.sitting, sittingId), toReadBy(db, person), notExists(heldByAnother(db, person)), looksEmpty(db)))
    .groupBy(answer.item)
    .all();
  return new Map(rows.map(({ item, n }) => [item, n]));
}

/** Whether the boxes of one answer look empty, whoever is to read it. */
export const isEmptyAnswer = (db: Database, answerId: string): boolean =>
  db.select({ id: answer.id }).from(answer).where(and(eq(answer.id, answerId), looksEmpty(db))).get() !== undefined;
