import { and, asc, desc, eq, gt, sql } from 'drizzle-orm';
import type { Database } from '../client';
import { box, layout, layoutPage } from '../schema';

export type LayoutRow = typeof layout.$inferSelect;
export type LayoutPageRow = typeof layoutPage.$inferSelect;
export type BoxRow = typeof box.$inferSelect;

export const findLayout = (db: Database, sittingId: string, ordinal: number): LayoutRow | undefined =>
  db.select().from(layout).where(and(eq(layout.sitting, sittingId), eq(layout.ordinal, ordinal))).get();

/** The layout that was made last. */
export const newestLayout = (db: Database, sittingId: string): LayoutRow | undefined =>
  db.select().from(layout).where(eq(layout.sitting, sittingId)).orderBy(desc(layout.ordinal)).limit(1).get();

export const insertLayout = (db: Database, row: typeof layout.$inferInsert): void => void db.insert(layout).values(row).run();

export const bumpLayout = (db: Database, layoutId: string): void =>
  void db
    .update(layout)
    .set({ rev: sql`${layout.rev} + 1` })
    .where(eq(layout.id, layoutId))
    .run();

export const layoutPages = (db: Database, layoutId: string): LayoutPageRow[] =>
  db.select().from(layoutPage).where(eq(layoutPage.layout, layoutId)).orderBy(asc(layoutPage.pageNo)).all();

export const saveLayoutPage = (db: Database, row: Omit<LayoutPageRow, 'sample'>): void =>
  void db
    .insert(layoutPage)
    .values(row)
    .onConflictDoUpdate({ target: [layoutPage.layout, layoutPage.pageNo], set: { widthMm: row.widthMm, heightMm: row.heightMm } })
    .run();

export const deletePagesAfter = (db: Database, layoutId: string, pageNo: number): void =>
  void db.delete(layoutPage).where(and(eq(layoutPage.layout, layoutId), gt(layoutPage.pageNo, pageNo))).run();

export const setPageSample = (db: Database, layoutId: string, pageNo: number, sample: string): void =>
  void db.update(layoutPage).set({ sample }).where(and(eq(layoutPage.layout, layoutId), eq(layoutPage.pageNo, pageNo))).run();

export const boxesOfLayout = (db: Database, layoutId: string): BoxRow[] =>
  db.select().from(box).where(eq(box.layout, layoutId)).orderBy(asc(box.pageNo), asc(box.y), asc(box.x), asc(box.id)).all();

export const insertBox = (db: Database, row: BoxRow): void => void db.insert(box).values(row).run();

export function replaceBoxes(db: Database, layoutId: string, rows: readonly BoxRow[]): void {
  db.delete(box).where(eq(box.layout, layoutId)).run();
  for (const row of rows) db.insert(box).values(row).run();
}

/** Ids among those given that belong to another layout already. */
export const boxIsElsewhere = (db: Database, layoutId: string, id: string): boolean => {
  const known = db.select({ layout: box.layout }).from(box).where(eq(box.id, id)).get();
  return known !== undefined && known.layout !== layoutId;
};
