import { and, asc, eq } from 'drizzle-orm';
import type { Database } from '../client';
import { box, candidate, layout, layoutPage, page, script, sitting } from '../schema';

/** Every page printed for a sitting, with its boxes, whatever layout it was printed from. */
export function printedPages(db: Database, sittingId: string) {
  const pages = db
    .select({ layout: layout.ordinal, layoutId: layout.id, page: layoutPage.pageNo, widthMm: layoutPage.widthMm, heightMm: layoutPage.heightMm })
    .from(layoutPage)
    .innerJoin(layout, eq(layout.id, layoutPage.layout))
    .where(and(eq(layout.sitting, sittingId), eq(layout.origin, 'printed')))
    .all();
  if (pages.length === 0) return [];
  const boxes = db
    .select({ id: box.id, layout: box.layout, pageNo: box.pageNo, use: box.use, x: box.x, y: box.y, w: box.w, h: box.h })
    .from(box)
    .innerJoin(layout, eq(layout.id, box.layout))
    .where(and(eq(layout.sitting, sittingId), eq(layout.origin, 'printed')))
    .orderBy(asc(box.id))
    .all();
  return pages.map((one) => ({ ...one, boxes: boxes.filter(({ layout: of, pageNo }) => of === one.layoutId && pageNo === one.page) }));
}

export const sittingByPrintNumber = (db: Database, printNumber: number) => db.select({ id: sitting.id, course: sitting.course, title: sitting.title }).from(sitting).where(eq(sitting.printNumber, printNumber)).get();

/** A script by the number printed on it, dead ones too, with the layout it is read by and the place of one page. */
export const scriptPage = (db: Database, sittingId: string, number: number, pageNo: number) =>
  db
    .select({ script: script.id, voidReason: script.voidReason, mergedInto: script.mergedInto, candidateNumber: candidate.number, layout: layout.ordinal, page: page.id })
    .from(script)
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .leftJoin(layout, eq(layout.id, script.layout))
    .leftJoin(page, and(eq(page.script, script.id), eq(page.pageNo, pageNo)))
    .where(and(eq(script.sitting, sittingId), eq(script.number, number)))
    .get();
