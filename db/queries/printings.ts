import { and, asc, count, desc, eq, inArray, isNotNull, isNull, max, notInArray, sql } from 'drizzle-orm';
import type { Attendance } from '../../shared/contracts/enums';
import type { Database } from '../client';
import { blob, candidate, layout, layoutPage, page, pageImage, person, printedScript, printing, script } from '../schema';

export type PrintingRow = typeof printing.$inferSelect;

export const insertPrinting = (db: Database, row: typeof printing.$inferInsert): void => void db.insert(printing).values(row).run();

export const insertPrintedScript = (db: Database, row: typeof printedScript.$inferInsert): void => void db.insert(printedScript).values(row).run();

export const findPrinting = (db: Database, id: string): PrintingRow | undefined => db.select().from(printing).where(eq(printing.id, id)).get();

export const updatePrinting = (db: Database, id: string, changes: Partial<Pick<PrintingRow, 'state' | 'done' | 'blob'>>): void =>
  void db.update(printing).set(changes).where(eq(printing.id, id)).run();

/** Newest first, with who made it, the ordinal and pages of the layout and the weight of the file. */
export const printingsOfSitting = (db: Database, sittingId: string) =>
  db
    .select({ printing, madeBy: person.name, layout: layout.ordinal, size: blob.size, pagesEach: sql<number>`(select count(*) from ${layoutPage} where ${layoutPage.layout} = ${printing.layout})` })
    .from(printing)
    .innerJoin(layout, eq(layout.id, printing.layout))
    .innerJoin(person, eq(person.id, printing.madeBy))
    .leftJoin(blob, eq(blob.sha256, printing.blob))
    .where(eq(printing.sitting, sittingId))
    .orderBy(desc(layout.ordinal))
    .all();

export const isPrintingUnderWay = (db: Database, sittingId: string): boolean =>
  db.select({ id: printing.id }).from(printing).where(and(eq(printing.sitting, sittingId), eq(printing.state, 'making'))).get() !== undefined;

export const lastLayoutOrdinal = (db: Database, sittingId: string): number =>
  db.select({ last: max(layout.ordinal) }).from(layout).where(eq(layout.sitting, sittingId)).get()?.last ?? 0;

export const layoutOrdinal = (db: Database, layoutId: string): number => db.select({ ordinal: layout.ordinal }).from(layout).where(eq(layout.id, layoutId)).get()?.ordinal ?? 0;

/** Whose sheets are in the file of a printing: candidates in the order of their scripts, spares last. */
export const printedOwners = (db: Database, printingId: string) =>
  db
    .select({ script: script.number, candidateNumber: candidate.number })
    .from(printedScript)
    .innerJoin(script, eq(script.id, printedScript.script))
    .leftJoin(candidate, eq(candidate.id, printedScript.candidate))
    .where(eq(printedScript.printing, printingId))
    .orderBy(sql`${printedScript.candidate} is null`, asc(script.number))
    .all();

const sitting: readonly Attendance[] = ['expected', 'present', 'late'];
const isLive = and(isNull(script.voidReason), isNull(script.mergedInto));

/** Scripts that hold a page image, or held one that is still filed under one of their pages. */
const withImages = (db: Database, sittingId: string) =>
  db
    .select({ script: page.script })
    .from(page)
    .innerJoin(script, eq(script.id, page.script))
    .leftJoin(pageImage, eq(pageImage.page, page.id))
    .where(and(eq(script.sitting, sittingId), sql`(${page.image} is not null or ${pageImage.id} is not null)`));

/** Live scripts of those who may sit, without any page in: what a printing may point to its layout. */
export const printableScripts = (db: Database, sittingId: string) =>
  db
    .select({ id: script.id, number: script.number, candidate: candidate.id, origin: script.origin })
    .from(script)
    .innerJoin(candidate, eq(candidate.id, script.candidate))
    .where(and(eq(script.sitting, sittingId), isLive, inArray(candidate.attendance, [...sitting]), notInArray(script.id, withImages(db, sittingId))))
    .orderBy(asc(script.number))
    .all();

/** Candidates who may sit, in the order of the class list, with their live script if there is one. */
export function candidatesToPrint(db: Database, sittingId: string) {
  const held = new Set(withImages(db, sittingId).all().map((row) => row.script));
  return db
    .select({ number: candidate.number, attendance: candidate.attendance, script: script.id, scriptNumber: script.number, origin: script.origin })
    .from(candidate)
    .leftJoin(script, and(eq(script.candidate, candidate.id), isLive))
    .where(eq(candidate.sitting, sittingId))
    .orderBy(asc(candidate.id))
    .all()
    .map((row) => ({ ...row, isAway: !sitting.includes(row.attendance), hasPagesIn: row.script !== null && held.has(row.script) }));
}

export const pointScript = (db: Database, scriptId: string, layoutId: string): void => void db.update(script).set({ layout: layoutId, origin: 'printed' }).where(eq(script.id, scriptId)).run();

export const pageNumbersOf = (db: Database, scriptId: string): number[] => db.select({ pageNo: page.pageNo }).from(page).where(eq(page.script, scriptId)).all().map((row) => row.pageNo);

/** Places beyond the last page; only of a script without images. */
export const dropPagesBeyond = (db: Database, scriptId: string, pages: number): void => void db.delete(page).where(and(eq(page.script, scriptId), sql`${page.pageNo} > ${pages}`)).run();

export const printedScriptCount = (db: Database, sittingId: string): number =>
  db.select({ n: count() }).from(script).where(and(eq(script.sitting, sittingId), isLive, eq(script.origin, 'printed'), isNotNull(script.candidate))).get()?.n ?? 0;
