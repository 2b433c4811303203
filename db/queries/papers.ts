import { and, asc, count, eq, max, sql } from 'drizzle-orm';
import type { ItemScheme } from '../../shared/marking/scheme';
import type { Database } from '../client';
import { box, item, itemDraft, itemScheme, layout, paperLock, schemeVersion, schemeVersionItem } from '../schema';

export type ItemRow = typeof item.$inferSelect;

export interface DraftedItem {
  readonly item: ItemRow;
  readonly scheme: ItemScheme;
}

const drafted = (db: Database) => db.select({ item, scheme: itemDraft.body }).from(item).innerJoin(itemDraft, eq(itemDraft.item, item.id));

export const findDraftedItem = (db: Database, id: string): DraftedItem | undefined => drafted(db).where(eq(item.id, id)).get();

/** The items of a paper in the order of their numbers. */
export const draftedItems = (db: Database, sittingId: string): DraftedItem[] =>
  drafted(db).where(eq(item.sitting, sittingId)).orderBy(asc(item.number), asc(item.id)).all();

/** Tells the number of an item of a paper; null for one that is not on it. */
export function numbersOf(db: Database, sittingId: string): (itemId: string) => number | null {
  const numbers = new Map(db.select({ id: item.id, number: item.number }).from(item).where(eq(item.sitting, sittingId)).all().map(({ id, number }) => [id, number]));
  return (itemId) => numbers.get(itemId) ?? null;
}

export const lastItemNumber = (db: Database, sittingId: string): number =>
  db.select({ last: max(item.number) }).from(item).where(eq(item.sitting, sittingId)).get()?.last ?? 0;

export function insertItem(db: Database, row: typeof item.$inferInsert, scheme: ItemScheme): void {
  db.insert(item).values(row).run();
  db.insert(itemDraft).values({ item: row.id, body: scheme }).run();
}

export function updateItem(db: Database, id: string, prompt: string, scheme: ItemScheme): void {
  db.update(item)
    .set({ prompt, kind: scheme.kind, maxGrains: scheme.maxGrains, rev: sql`${item.rev} + 1` })
    .where(eq(item.id, id))
    .run();
  db.update(itemDraft)
    .set({ body: scheme, rev: sql`${itemDraft.rev} + 1` })
    .where(eq(itemDraft.item, id))
    .run();
}

/** Removes an item with its draft and its boxes; only while nothing has been made for it. */
export function deleteItem(db: Database, id: string): void {
  db.delete(box).where(eq(box.item, id)).run();
  db.delete(itemDraft).where(eq(itemDraft.item, id)).run();
  db.delete(item).where(eq(item.id, id)).run();
}

export const numberItem = (db: Database, id: string, number: number): void => void db.update(item).set({ number }).where(eq(item.id, id)).run();

/** How many answer boxes each item has in a layout. */
export function answerBoxCounts(db: Database, sittingId: string, ordinal: number): Map<string, number> {
  const rows = db
    .select({ item: box.item, boxes: count() })
    .from(box)
    .innerJoin(layout, eq(layout.id, box.layout))
    .where(and(eq(layout.sitting, sittingId), eq(layout.ordinal, ordinal), eq(box.use, 'answer')))
    .groupBy(box.item)
    .all();
  return new Map(rows.flatMap((row) => (row.item === null ? [] : [[row.item, row.boxes]])));
}

export const insertItemScheme = (db: Database, hash: string, body: ItemScheme): void =>
  void db.insert(itemScheme).values({ hash, body }).onConflictDoNothing().run();

export const insertSchemeVersion = (db: Database, row: typeof schemeVersion.$inferInsert): void => void db.insert(schemeVersion).values(row).run();

export const insertSchemeVersionItem = (db: Database, row: typeof schemeVersionItem.$inferInsert): void =>
  void db.insert(schemeVersionItem).values(row).run();

export const insertPaperLock = (db: Database, row: typeof paperLock.$inferInsert): void => void db.insert(paperLock).values(row).run();

export const paperLockedAt = (db: Database, sittingId: string): number | null =>
  db.select({ at: paperLock.lockedAt }).from(paperLock).where(eq(paperLock.sitting, sittingId)).get()?.at ?? null;
