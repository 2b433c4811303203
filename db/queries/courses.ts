import { desc, eq, max, sql } from 'drizzle-orm';
import type { Database } from '../client';
import { course, sitting } from '../schema';
import type { SittingRow } from './sittings';

export const findCourse = (db: Database, id: string) => db.select().from(course).where(eq(course.id, id)).get();

export const sittingsOfCourse = (db: Database, courseId: string): SittingRow[] =>
  db.select().from(sitting).where(eq(sitting.course, courseId)).orderBy(desc(sitting.heldOn), desc(sitting.printNumber)).all();

/** The next number for printed sheets, over all courses. */
export const nextPrintNumber = (db: Database): number => (db.select({ last: max(sitting.printNumber) }).from(sitting).get()?.last ?? 0) + 1;

export const insertSitting = (db: Database, row: typeof sitting.$inferInsert): void => void db.insert(sitting).values(row).run();

type Changes = Partial<Pick<SittingRow, 'title' | 'heldOn' | 'secondPolicy' | 'totalRounding' | 'boardDate' | 'schemeVersion'>>;

export const updateSitting = (db: Database, id: string, changes: Changes): void =>
  void db
    .update(sitting)
    .set({ ...changes, rev: sql`${sitting.rev} + 1` })
    .where(eq(sitting.id, id))
    .run();
