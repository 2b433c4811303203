import { and, asc, count, desc, eq, inArray, ne, notInArray, sql } from 'drizzle-orm';
import { pageImageStates, uploadStates } from '../../shared/contracts/enums';
import type { Database } from '../client';
import { batch, candidate, page, pageImage, script, upload, uploadPart } from '../schema';

export type BatchRow = typeof batch.$inferSelect;
export type UploadRow = typeof upload.$inferSelect;
type UploadState = UploadRow['state'];

export const insertBatch = (db: Database, row: typeof batch.$inferInsert): void => void db.insert(batch).values(row).run();
export const findBatch = (db: Database, id: string): BatchRow | undefined => db.select().from(batch).where(eq(batch.id, id)).get();
export const setBatchState = (db: Database, id: string, state: BatchRow['state']): void => void db.update(batch).set({ state }).where(eq(batch.id, id)).run();

export const batchesOf = (db: Database, sittingId: string): BatchRow[] =>
  db.select().from(batch).where(eq(batch.sitting, sittingId)).orderBy(desc(batch.madeAt), desc(batch.id)).all();

const zeros = <State extends string>(states: readonly State[]): Record<State, number> => Object.fromEntries(states.map((state) => [state, 0])) as Record<State, number>;

/** Files of a batch by state. */
export function fileCounts(db: Database, batchId: string): Record<UploadState, number> {
  const rows = db.select({ state: upload.state, n: count() }).from(upload).where(eq(upload.batch, batchId)).groupBy(upload.state).all();
  return { ...zeros(uploadStates), ...Object.fromEntries(rows.map((row) => [row.state, row.n])) };
}

/** Page images of a batch by state. */
export function pageStateCounts(db: Database, batchId: string): Record<(typeof pageImageStates)[number], number> {
  const rows = db
    .select({ state: pageImage.state, n: count() })
    .from(pageImage)
    .innerJoin(upload, eq(upload.id, pageImage.upload))
    .where(eq(upload.batch, batchId))
    .groupBy(pageImage.state)
    .all();
  return { ...zeros(pageImageStates), ...Object.fromEntries(rows.map((row) => [row.state, row.n])) };
}

/** Files of a batch: refused, repeated and loose ones first, then those on their way, then the rest, newest first. */
export const filesOfBatch = (db: Database, batchId: string, limit: number): UploadRow[] =>
  db
    .select()
    .from(upload)
    .where(eq(upload.batch, batchId))
    .orderBy(
      sql`case when ${upload.state} = 'refused' then 0
        when exists (select 1 from ${pageImage} where ${pageImage.upload} = ${upload.id} and ${pageImage.state} = 'loose') then 1
        when ${upload.state} = 'duplicate' then 2
        when ${upload.state} in ('sending', 'received') then 3 else 4 end`,
      desc(upload.id),
    )
    .limit(limit)
    .all();

export const fileCount = (db: Database, batchId: string): number => db.select({ n: count() }).from(upload).where(eq(upload.batch, batchId)).get()?.n ?? 0;

export const insertUpload = (db: Database, row: typeof upload.$inferInsert): void => void db.insert(upload).values(row).run();
export const findUpload = (db: Database, id: string): UploadRow | undefined => db.select().from(upload).where(eq(upload.id, id)).get();

export const updateUpload = (db: Database, id: string, changes: Partial<Pick<UploadRow, 'state' | 'problem' | 'sha256' | 'pages'>>): void =>
  void db.update(upload).set(changes).where(eq(upload.id, id)).run();

/** Gives up what is still on its way in a batch, or waits for its pages. */
export const cancelUploads = (db: Database, batchId: string): string[] =>
  db
    .update(upload)
    .set({ state: 'cancelled' })
    .where(and(eq(upload.batch, batchId), inArray(upload.state, ['sending', 'received'])))
    .returning({ id: upload.id })
    .all()
    .map(({ id }) => id);

/** Files of a batch that wait for their pages. */
export const receivedUploads = (db: Database, batchId: string): string[] =>
  db.select({ id: upload.id }).from(upload).where(and(eq(upload.batch, batchId), eq(upload.state, 'received'))).all().map(({ id }) => id);

/** Pages of a batch that wait to be made, as far as files told how many they hold, and those of these files that are made. */
export function pagesUnderWay(db: Database, batchId: string): { done: number; of: number } {
  const inMaking = and(eq(upload.batch, batchId), eq(upload.state, 'received'));
  const of = db.select({ n: sql<number>`coalesce(sum(${upload.pages}), 0)` }).from(upload).where(inMaking).get()?.n ?? 0;
  const done = db.select({ n: count() }).from(pageImage).innerJoin(upload, eq(upload.id, pageImage.upload)).where(inMaking).get()?.n ?? 0;
  return { done, of };
}

export const savePart = (db: Database, row: typeof uploadPart.$inferInsert): void =>
  void db.insert(uploadPart).values(row).onConflictDoUpdate({ target: [uploadPart.upload, uploadPart.part], set: { size: row.size } }).run();

export const partsOf = (db: Database, uploadId: string) =>
  db.select({ part: uploadPart.part, size: uploadPart.size }).from(uploadPart).where(eq(uploadPart.upload, uploadId)).orderBy(asc(uploadPart.part)).all();

/** A file of the same bytes that stands in the sitting already. */
export const sameFile = (db: Database, sittingId: string, sha256: string, except: string) =>
  db
    .select({ fileName: upload.fileName, bundle: batch.bundle })
    .from(upload)
    .innerJoin(batch, eq(batch.id, upload.batch))
    .where(and(eq(batch.sitting, sittingId), eq(upload.sha256, sha256), ne(upload.id, except), notInArray(upload.state, ['refused', 'duplicate', 'cancelled'])))
    .limit(1)
    .get();

export const pageIndexesOf = (db: Database, uploadId: string): number[] => db.select({ index: pageImage.index }).from(pageImage).where(eq(pageImage.upload, uploadId)).all().map((row) => row.index);

/** The pages made of files, with the place each has. */
export const pagesOfUploads = (db: Database, uploadIds: readonly string[]) =>
  db
    .select({ id: pageImage.id, upload: pageImage.upload, index: pageImage.index, state: pageImage.state, why: pageImage.why, name: pageImage.name, note: pageImage.note, candidateNumber: candidate.number, pageNo: page.pageNo })
    .from(pageImage)
    .leftJoin(page, eq(page.id, pageImage.page))
    .leftJoin(script, eq(script.id, page.script))
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .where(inArray(pageImage.upload, [...uploadIds]))
    .orderBy(asc(pageImage.index))
    .all();
