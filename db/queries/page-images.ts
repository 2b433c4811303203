import { and, asc, eq, inArray, isNull, ne, or, sql } from 'drizzle-orm';
import type { Attendance } from '../../shared/contracts/enums';
import type { Database } from '../client';
import { answer, batch, box, candidate, crop, layoutPage, page, pageImage, reading, readingEnd, ruling, rulingEnd, script, upload } from '../schema';

export type PageImageRow = typeof pageImage.$inferSelect;

export const insertPageImage = (db: Database, row: typeof pageImage.$inferInsert): void => void db.insert(pageImage).values(row).run();

export const updatePageImage = (db: Database, id: string, changes: Partial<Omit<PageImageRow, 'id' | 'rev'>>): void =>
  void db
    .update(pageImage)
    .set({ ...changes, rev: sql`${pageImage.rev} + 1` })
    .where(eq(pageImage.id, id))
    .run();

/** A page goes by the name of its file in an archive, where there is one. */
const nameShown = sql<string>`coalesce(${pageImage.name}, ${upload.fileName})`;

export const findPageImage = (db: Database, id: string) =>
  db
    .select({ image: pageImage, fileName: nameShown, candidateNumber: candidate.number, pageNo: page.pageNo })
    .from(pageImage)
    .innerJoin(upload, eq(upload.id, pageImage.upload))
    .leftJoin(page, eq(page.id, pageImage.page))
    .leftJoin(script, eq(script.id, page.script))
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .where(eq(pageImage.id, id))
    .get();

/** The row of one page of a file, if an earlier run wrote it. */
export const pageImageAt = (db: Database, uploadId: string, index: number) =>
  db.select({ id: pageImage.id }).from(pageImage).where(and(eq(pageImage.upload, uploadId), eq(pageImage.index, index))).get();

/** A page of the sitting made of the same bytes, or that looks the same to the last pixel. */
export const samePicture = (db: Database, sittingId: string, { original, frame }: { readonly original: string; readonly frame: number }, display: string | null) =>
  db
    .select({ upload: pageImage.upload, index: pageImage.index, name: pageImage.name, pages: upload.pages, fileName: upload.fileName, bundle: batch.bundle })
    .from(pageImage)
    .innerJoin(upload, eq(upload.id, pageImage.upload))
    .innerJoin(batch, eq(batch.id, upload.batch))
    .where(and(eq(pageImage.sitting, sittingId), ne(pageImage.state, 'refused'), or(and(eq(pageImage.original, original), eq(pageImage.frame, frame)), display === null ? undefined : eq(pageImage.display, display))))
    .limit(1)
    .get();

export const loosePages = (db: Database, sittingId: string) =>
  db
    .select({ id: pageImage.id, fileName: nameShown, bundle: batch.bundle, why: pageImage.why, rev: pageImage.rev })
    .from(pageImage)
    .innerJoin(upload, eq(upload.id, pageImage.upload))
    .innerJoin(batch, eq(batch.id, upload.batch))
    .where(and(eq(pageImage.sitting, sittingId), eq(pageImage.state, 'loose')))
    .orderBy(asc(upload.id), asc(pageImage.index))
    .all();

export interface PagePlace {
  readonly page: string;
  readonly sitting: string;
  readonly pageNo: number;
  readonly image: string | null;
  readonly script: string;
  readonly layout: string | null;
  readonly candidate: string;
  readonly candidateNumber: string;
  readonly attendance: Attendance;
}

const places = (db: Database) =>
  db
    .select({
      page: page.id,
      sitting: script.sitting,
      pageNo: page.pageNo,
      image: page.image,
      script: script.id,
      layout: script.layout,
      candidate: candidate.id,
      candidateNumber: candidate.number,
      attendance: candidate.attendance,
    })
    .from(page)
    .innerJoin(script, and(eq(script.id, page.script), isNull(script.voidReason), isNull(script.mergedInto)))
    .innerJoin(candidate, eq(candidate.id, script.candidate));

/** The places of one candidate, by number without regard to case. */
export const placesOfNumber = (db: Database, sittingId: string, number: string): PagePlace[] =>
  places(db)
    .where(and(eq(candidate.sitting, sittingId), sql`lower(${candidate.number}) = lower(${number})`))
    .orderBy(asc(page.pageNo))
    .all();

export const placeOf = (db: Database, candidateId: string, pageNo: number): PagePlace | undefined =>
  places(db).where(and(eq(candidate.id, candidateId), eq(page.pageNo, pageNo))).get();

export const placeById = (db: Database, pageId: string): PagePlace | undefined => places(db).where(eq(page.id, pageId)).get();

/** Places of those who are to be marked, in the order of the class list, with the rev of the image each holds. */
export const placesOfSitting = (db: Database, sittingId: string) =>
  db
    .select({ candidateId: candidate.id, candidateNumber: candidate.number, pageNo: page.pageNo, image: page.image, imageRev: pageImage.rev })
    .from(page)
    .innerJoin(script, and(eq(script.id, page.script), isNull(script.voidReason), isNull(script.mergedInto)))
    .innerJoin(candidate, eq(candidate.id, script.candidate))
    .leftJoin(pageImage, eq(pageImage.id, page.image))
    .where(and(eq(candidate.sitting, sittingId), isNull(page.excusedAt), inArray(candidate.attendance, ['expected', 'present', 'late'])))
    .orderBy(asc(candidate.id), asc(page.pageNo))
    .all();

export const setPlaceImage = (db: Database, pageId: string, image: string | null): void => void db.update(page).set({ image }).where(eq(page.id, pageId)).run();

/** The boxes of one page of a layout, that of the candidate's number among them, and its size in millimetres. */
export function pageLayout(db: Database, layoutId: string, pageNo: number) {
  const size = db
    .select({ widthMm: layoutPage.widthMm, heightMm: layoutPage.heightMm })
    .from(layoutPage)
    .where(and(eq(layoutPage.layout, layoutId), eq(layoutPage.pageNo, pageNo)))
    .get();
  const boxes = db
    .select({ id: box.id, item: box.item, use: box.use, x: box.x, y: box.y, w: box.w, h: box.h })
    .from(box)
    .where(and(eq(box.layout, layoutId), eq(box.pageNo, pageNo)))
    .orderBy(asc(box.id))
    .all();
  return size ? { ...size, boxes } : undefined;
}

/** Answers of a script by item. */
export const answersOfScript = (db: Database, scriptId: string): Map<string, string> =>
  new Map(db.select({ id: answer.id, item: answer.item }).from(answer).where(eq(answer.script, scriptId)).all().map((row) => [row.item, row.id]));

export const saveCrop = (db: Database, row: typeof crop.$inferInsert): void => {
  const { pageImage: image, blob, widthPx, heightPx, evidence = 'in', sidesConfirmed = null, ink = null } = row;
  db.insert(crop)
    .values(row)
    .onConflictDoUpdate({ target: [crop.answer, crop.box], set: { pageImage: image, blob, widthPx, heightPx, evidence, sidesConfirmed, ink, rev: sql`${crop.rev} + 1` } })
    .run();
};

export const setEvidence = (db: Database, answerId: string, evidence: 'none' | 'in'): void => void db.update(answer).set({ evidence }).where(eq(answer.id, answerId)).run();

/** Removes the cut-outs of an image and tells which answers they were of. */
export const dropCrops = (db: Database, imageId: string): string[] => [
  ...new Set(db.delete(crop).where(eq(crop.pageImage, imageId)).returning({ answer: crop.answer }).all().map((row) => row.answer)),
];

/** Whether an answer box of an answer still has its cut-out. */
export const hasAnswerCrop = (db: Database, answerId: string): boolean =>
  db
    .select({ id: crop.id })
    .from(crop)
    .innerJoin(box, eq(box.id, crop.box))
    .where(and(eq(crop.answer, answerId), eq(box.use, 'answer')))
    .get() !== undefined;

/** Readings that stand and were taken from an image, and answers of it with a ruling that stands. */
export function actsFromImage(db: Database, imageId: string) {
  const answers = db.select({ id: crop.answer }).from(crop).where(eq(crop.pageImage, imageId));
  const readings = db
    .select({ id: reading.id })
    .from(reading)
    .leftJoin(readingEnd, eq(readingEnd.reading, reading.id))
    .where(and(inArray(reading.answer, answers), isNull(readingEnd.reading)))
    .all();
  const rulings = db
    .select({ id: ruling.id })
    .from(ruling)
    .leftJoin(rulingEnd, eq(rulingEnd.ruling, ruling.id))
    .where(and(inArray(ruling.answer, answers), isNull(rulingEnd.ruling)))
    .all();
  return { readings: readings.map(({ id }) => id), rulings: rulings.length };
}

export const cropOfBox = (db: Database, answerId: string, boxId: string) =>
  db
    .select({ blob: crop.blob, sitting: answer.sitting })
    .from(crop)
    .innerJoin(answer, eq(answer.id, crop.answer))
    .where(and(eq(crop.answer, answerId), eq(crop.box, boxId)))
    .get();
