import { draftedItems } from '../../db/queries/papers';
import { findCourse } from '../../db/queries/courses';
import type { SittingRow } from '../../db/queries/sittings';
import type { Database } from '../../db/client';
import { marksText } from '../../shared/marking/grains';
import type { PaperSize } from '../../shared/sheets/geometry';
import { planSheets, type Planned } from '../../shared/sheets/sheet-plan';
import { measuringDocument, setItems, type PrintedItem } from '../print/sheet-setting';

/** What stands at the head of every page. */
export interface Heading {
  readonly title: string;
  readonly held: string;
}

const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric', timeZone: 'UTC' });

export const headingOf = (db: Database, sitting: SittingRow): Heading => ({ title: `${findCourse(db, sitting.course)?.code ?? ''}, ${sitting.title}`, held: day.format(new Date(`${sitting.heldOn}T00:00:00Z`)) });

export const printedItems = (db: Database, sittingId: string): PrintedItem[] =>
  draftedItems(db, sittingId).map(({ item }) => ({ number: item.number, prompt: item.prompt, marks: marksText(item.maxGrains) }));

export const planOf = (items: readonly PrintedItem[], paper: PaperSize): Planned => planSheets(setItems(measuringDocument(), items, paper), paper);

/** Why sheets cannot be planned, in a sentence. */
export function planProblem(planned: Extract<Planned, { ok: false }>): string {
  if (planned.reason === 'no-items') return 'The paper has no item yet.';
  if (planned.reason === 'too-many-pages') return 'The paper needs more than 98 pages for each candidate. Split it into two papers.';
  return `The text of item ${planned.item} leaves no room for its answer on one page. Shorten it.`;
}
