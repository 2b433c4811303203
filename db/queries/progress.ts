import { and, count, eq, inArray, isNotNull, isNull, sql } from 'drizzle-orm';
import { attendances, type Attendance } from '../../shared/contracts/enums';
import type { Database } from '../client';
import { answer, box, candidate, item, layout, layoutPage, page, pageImage, reading, readingEnd, script } from '../schema';

export function candidatesByAttendance(db: Database, sittingId: string): Record<Attendance, number> {
  const none = Object.fromEntries(attendances.map((name) => [name, 0])) as Record<Attendance, number>;
  const rows = db
    .select({ attendance: candidate.attendance, n: count() })
    .from(candidate)
    .where(eq(candidate.sitting, sittingId))
    .groupBy(candidate.attendance)
    .all();
  return { ...none, ...Object.fromEntries(rows.map((row) => [row.attendance, row.n])) };
}

export const itemCount = (db: Database, sittingId: string): number =>
  db.select({ n: count() }).from(item).where(eq(item.sitting, sittingId)).get()?.n ?? 0;

/** Items with an answer box on some layout, and the pages of the longest. */
export function layoutCounts(db: Database, sittingId: string): { itemsPlaced: number; layoutPages: number } {
  const placed = db
    .select({ n: sql<number>`count(distinct ${box.item})` })
    .from(box)
    .innerJoin(layout, eq(layout.id, box.layout))
    .where(and(eq(layout.sitting, sittingId), eq(box.use, 'answer')))
    .get();
  const pages = db
    .select({ n: sql<number>`coalesce(max(${layoutPage.pageNo}), 0)` })
    .from(layoutPage)
    .innerJoin(layout, eq(layout.id, layoutPage.layout))
    .where(eq(layout.sitting, sittingId))
    .get();
  return { itemsPlaced: placed?.n ?? 0, layoutPages: pages?.n ?? 0 };
}

const toBeMarked: readonly Attendance[] = ['expected', 'present', 'late'];

/** Places of live scripts: filled, excused, or still due from someone who is to be marked. Nothing is due of a spare sheet. */
export function pageCounts(db: Database, sittingId: string): { due: number; in: number; excused: number; loose: number } {
  const placed = db
    .select({
      in: sql<number>`coalesce(sum(${page.image} is not null), 0)`,
      excused: sql<number>`coalesce(sum(${page.image} is null and ${page.excusedAt} is not null), 0)`,
      due: sql<number>`coalesce(sum(${page.excusedAt} is null and ${inArray(candidate.attendance, [...toBeMarked])}), 0)`,
    })
    .from(page)
    .innerJoin(script, eq(script.id, page.script))
    .leftJoin(candidate, eq(candidate.id, script.candidate))
    .where(and(eq(script.sitting, sittingId), isNull(script.voidReason), isNull(script.mergedInto)))
    .get();
  const loose = db
    .select({ n: count() })
    .from(pageImage)
    .where(and(eq(pageImage.sitting, sittingId), eq(pageImage.state, 'loose')))
    .get();
  return { due: placed?.due ?? 0, in: placed?.in ?? 0, excused: placed?.excused ?? 0, loose: loose?.n ?? 0 };
}

export const readingsTaken = (db: Database, sittingId: string): number =>
  db
    .select({ n: count() })
    .from(reading)
    .innerJoin(answer, eq(answer.id, reading.answer))
    .leftJoin(readingEnd, eq(readingEnd.reading, reading.id))
    .where(and(eq(answer.sitting, sittingId), eq(reading.purpose, 'live'), isNull(readingEnd.reading)))
    .get()?.n ?? 0;

/** Answers of candidates; those of a spare sheet count once it is bound to one. */
export function answerCounts(db: Database, sittingId: string, held: readonly (typeof answer.$inferSelect)['state'][]) {
  return db
    .select({
      all: count(),
      readable: sql<number>`coalesce(sum(${answer.evidence} <> 'none'), 0)`,
      held: sql<number>`coalesce(sum(${inArray(answer.state, [...held])}), 0)`,
      scored: sql<number>`count(${answer.score})`,
      due: sql<number>`coalesce(sum(${answer.readingsDue}), 0)`,
    })
    .from(answer)
    .innerJoin(script, eq(script.id, answer.script))
    .where(and(eq(answer.sitting, sittingId), isNotNull(script.candidate), isNull(script.voidReason)))
    .get();
}
