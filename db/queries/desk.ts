import { and, asc, count, desc, eq, inArray, isNull, lte, ne, notExists, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/sqlite-core';
import { preparedOnce, type Database } from '../client';
import { answer, box, candidate, course, crop, item, itemScheme, lease, page, pageImage, reading, readingEnd, schemeVersionItem, script, sitting } from '../schema';

export type LeaseRow = typeof lease.$inferSelect;

const mine = alias(reading, 'mine');
const mineEnd = alias(readingEnd, 'mine_end');

const readByMe = (db: Database) =>
  db
    .select({ one: sql`1` })
    .from(mine)
    .leftJoin(mineEnd, eq(mineEnd.reading, mine.id))
    .where(and(eq(mine.answer, answer.id), eq(mine.reader, sql.placeholder('reader')), isNull(mineEnd.reading)));

const openLease = (db: Database) =>
  db.select({ one: sql`1` }).from(lease).where(and(eq(lease.answer, answer.id), eq(lease.purpose, 'live'), isNull(lease.endedAt)));

/** Answers that are typed from the paper come to nobody's desk. */
const notByHand = sql`(select ${script.origin} from ${script} where ${script.id} = ${answer.script}) <> 'by-hand'`;

const statements = preparedOnce((db) => ({
  own: db
    .select({ id: lease.id, answer: lease.answer })
    .from(lease)
    .innerJoin(answer, eq(answer.id, lease.answer))
    .where(and(eq(lease.reader, sql.placeholder('reader')), isNull(lease.endedAt), eq(answer.item, sql.placeholder('item'))))
    .orderBy(asc(answer.shuffle))
    .prepare(),
  next: db
    .select({ id: answer.id })
    .from(answer)
    .where(
      and(
        eq(answer.item, sql.placeholder('item')),
        sql`${answer.readingsDue} > 0`,
        notExists(readByMe(db)),
        notExists(openLease(db)),
        notByHand,
      ),
    )
    .orderBy(asc(answer.shuffle))
    .limit(sql.placeholder('limit'))
    .prepare(),
  insertLease: db
    .insert(lease)
    .values({
      id: sql.placeholder('id'),
      answer: sql.placeholder('answer'),
      reader: sql.placeholder('reader'),
      purpose: 'live',
      takenAt: sql.placeholder('takenAt'),
      expiresAt: sql.placeholder('expiresAt'),
    })
    .prepare(),
  lease: db.select().from(lease).where(eq(lease.id, sql.placeholder('id'))).prepare(),
  endLease: db
    .update(lease)
    .set({ endedAt: sql`${sql.placeholder('at')}` })
    .where(and(eq(lease.id, sql.placeholder('id')), isNull(lease.endedAt)))
    .prepare(),
  target: db
    .select({
      answer: answer.id,
      item: answer.item,
      sitting: answer.sitting,
      course: sitting.course,
      schemeVersion: sitting.schemeVersion,
      secondPolicy: sitting.secondPolicy,
    })
    .from(answer)
    .innerJoin(sitting, eq(sitting.id, answer.sitting))
    .where(eq(answer.id, sql.placeholder('answer')))
    .prepare(),
  reading: db.select().from(reading).where(eq(reading.id, sql.placeholder('id'))).prepare(),
  ownLive: db
    .select({ id: reading.id })
    .from(reading)
    .leftJoin(readingEnd, eq(readingEnd.reading, reading.id))
    .where(and(eq(reading.answer, sql.placeholder('answer')), eq(reading.reader, sql.placeholder('reader')), isNull(readingEnd.reading)))
    .prepare(),
  insertReading: db
    .insert(reading)
    .values({
      id: sql.placeholder('id'),
      answer: sql.placeholder('answer'),
      reader: sql.placeholder('reader'),
      purpose: sql.placeholder('purpose'),
      text: sql.placeholder('text'),
      code: sql.placeholder('code'),
      canonical: sql.placeholder('canonical'),
      value: sql.placeholder('value'),
      method: sql.placeholder('method'),
      note: sql.placeholder('note'),
      knewKey: sql.placeholder('knewKey'),
      lease: sql.placeholder('lease'),
      openedAt: sql.placeholder('openedAt'),
      recordedAt: sql.placeholder('recordedAt'),
      grammar: sql.placeholder('grammar'),
    })
    .prepare(),
}));

export const openLeasesOf = (db: Database, reader: string, itemId: string) => statements(db).own.all({ reader, item: itemId });

/** Answers of an item still due that this reader has not read and nobody holds, in the random order of the item. */
export const nextAnswers = (db: Database, reader: string, itemId: string, limit: number): string[] =>
  statements(db).next.all({ reader, item: itemId, limit }).map((row) => row.id);

export const insertLease = (db: Database, row: { id: string; answer: string; reader: string; takenAt: number; expiresAt: number }): void =>
  void statements(db).insertLease.run(row);

export const hasOpenLease = (db: Database, answerId: string): boolean =>
  db.select({ id: lease.id }).from(lease).where(and(eq(lease.answer, answerId), eq(lease.purpose, 'live'), isNull(lease.endedAt))).get() !== undefined;

export const findLease = (db: Database, id: string): LeaseRow | undefined => statements(db).lease.get({ id });

export const endLeaseAt = (db: Database, id: string, at: number): void => void statements(db).endLease.run({ id, at });

/** Takes the picture from under every lease of an answer, open or run out: a reading that still comes by one is of another page. */
export const withdrawLeases = (db: Database, answerId: string, at: number): void =>
  void db
    .update(lease)
    .set({ endedAt: sql`coalesce(${lease.endedAt}, ${at})`, withdrawnAt: at })
    .where(and(eq(lease.answer, answerId), isNull(lease.withdrawnAt)))
    .run();

/** Leases that ran out free their answers for others. */
export const endExpiredLeases = (db: Database, now: number): void =>
  void db.update(lease).set({ endedAt: now }).where(and(isNull(lease.endedAt), lte(lease.expiresAt, now))).run();

export const renewLeases = (db: Database, ids: readonly string[], expiresAt: number): void =>
  void db.update(lease).set({ expiresAt }).where(inArray(lease.id, [...ids])).run();

/** What recording needs to know of an answer. */
export const readingTarget = (db: Database, answerId: string) => statements(db).target.get({ answer: answerId });

export const findReading = (db: Database, id: string) => statements(db).reading.get({ id });

export const ownLiveReading = (db: Database, answerId: string, reader: string) => statements(db).ownLive.get({ answer: answerId, reader });

export const insertReading = (db: Database, row: typeof reading.$inferSelect): void => void statements(db).insertReading.run({ ...row });

export const endReading = (db: Database, row: typeof readingEnd.$inferInsert): void => void db.insert(readingEnd).values(row).run();

/** What the desk shows of leased answers: candidate number, page and cut-outs, nothing else. */
export function leasedAnswers(db: Database, leaseIds: readonly string[]) {
  return db
    .select({
      id: lease.id,
      answerId: answer.id,
      candidateNumber: candidate.number,
      scriptId: script.id,
      box: box.id,
      use: box.use,
      pageNo: box.pageNo,
      pageImageId: crop.pageImage,
      pageImageRev: pageImage.rev,
      blob: crop.blob,
      evidence: crop.evidence,
      widthPx: crop.widthPx,
      heightPx: crop.heightPx,
      pageCount: sql<number>`(select count(*) from ${page} where ${page.script} = ${script.id})`,
    })
    .from(lease)
    .innerJoin(answer, eq(answer.id, lease.answer))
    .innerJoin(script, eq(script.id, answer.script))
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .innerJoin(crop, eq(crop.answer, answer.id))
    .innerJoin(pageImage, eq(pageImage.id, crop.pageImage))
    .innerJoin(box, and(eq(box.id, crop.box), ne(box.use, 'number')))
    .where(inArray(lease.id, [...leaseIds]))
    .orderBy(asc(answer.shuffle), asc(box.use), asc(box.pageNo), asc(box.y))
    .all();
}

export function recentReadings(db: Database, reader: string, sittingId: string, itemId: string | undefined, limit: number) {
  return db
    .select({
      id: reading.id,
      answerId: reading.answer,
      itemId: answer.item,
      candidateNumber: candidate.number,
      text: reading.text,
      code: reading.code,
      method: reading.method,
      note: reading.note,
      recordedAt: reading.recordedAt,
    })
    .from(reading)
    .innerJoin(answer, eq(answer.id, reading.answer))
    .innerJoin(script, eq(script.id, answer.script))
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .leftJoin(readingEnd, eq(readingEnd.reading, reading.id))
    .where(
      and(
        eq(reading.reader, reader),
        eq(reading.purpose, 'live'),
        eq(answer.sitting, sittingId),
        itemId === undefined ? undefined : eq(answer.item, itemId),
        isNull(readingEnd.reading),
      ),
    )
    .orderBy(desc(reading.recordedAt), desc(reading.id))
    .limit(limit)
    .all();
}

/** Items of the scheme in force, without anything that decides a mark but the closed list of units. */
export function deskItems(db: Database, schemeVersion: string) {
  return db
    .select({ id: item.id, number: item.number, prompt: item.prompt, body: itemScheme.body })
    .from(schemeVersionItem)
    .innerJoin(item, eq(item.id, schemeVersionItem.item))
    .innerJoin(itemScheme, eq(itemScheme.hash, schemeVersionItem.itemScheme))
    .where(eq(schemeVersionItem.version, schemeVersion))
    .orderBy(asc(item.number))
    .all();
}

/** By item: answers this reader has read, and those still to be read by this reader. */
export function readingCounts(db: Database, reader: string, sittingId: string): Map<string, { read: number; toRead: number }> {
  const counts = new Map<string, { read: number; toRead: number }>();
  const read = db
    .select({ item: answer.item, n: count() })
    .from(reading)
    .innerJoin(answer, eq(answer.id, reading.answer))
    .leftJoin(readingEnd, eq(readingEnd.reading, reading.id))
    .where(and(eq(reading.reader, reader), eq(reading.purpose, 'live'), eq(answer.sitting, sittingId), isNull(readingEnd.reading)))
    .groupBy(answer.item)
    .all();
  for (const row of read) counts.set(row.item, { read: row.n, toRead: 0 });
  const toRead = db
    .select({ item: answer.item, n: count() })
    .from(answer)
    .where(and(eq(answer.sitting, sittingId), sql`${answer.readingsDue} > 0`, notExists(readByMe(db)), notByHand))
    .groupBy(answer.item)
    .prepare()
    .all({ reader });
  for (const row of toRead) counts.set(row.item, { read: counts.get(row.item)?.read ?? 0, toRead: row.n });
  return counts;
}

export const courseCodeOf = (db: Database, courseId: string): string =>
  db.select({ code: course.code }).from(course).where(eq(course.id, courseId)).get()?.code ?? '';

export const itemSitting = (db: Database, itemId: string): string | undefined =>
  db.select({ sitting: item.sitting }).from(item).where(eq(item.id, itemId)).get()?.sitting;
