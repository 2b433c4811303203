import { candidateStandings } from '../../../db/queries/candidates';
import { printingsOfSitting } from '../../../db/queries/printings';
import { findSitting } from '../../../db/queries/sittings';
import type { CodedJob } from '../../../db/seed/pages/page-job';
import type { Context } from '../../context';
import { measuringDocument, setHead } from '../../print/sheet-setting';
import { headingOf, planOf, printedItems } from '../../services/sheet-order';

/** What the press put on the sheets of the first printing of a sitting, and whose each is; `ownNumbers` where the candidate wrote another number, or none. */
export function codedJob({ db, config }: Context, sittingId: string, ownNumbers: CodedJob['ownNumbers'] = {}): CodedJob {
  const sitting = findSitting(db, sittingId);
  const printed = printingsOfSitting(db, sittingId).at(-1);
  if (!sitting || !printed) throw new Error('No sheets are printed.');
  const { paperSize } = printed.printing;
  const planned = planOf(printedItems(db, sittingId), paperSize);
  if (!planned.ok) throw new Error('The sheets cannot be planned.');
  const { title, held } = headingOf(db, sitting);
  const scripts = Object.fromEntries(candidateStandings(db, sittingId).map(({ number, scriptNumber }) => [number, scriptNumber ?? 0]));
  return { sheet: { plan: planned.plan, head: setHead(measuringDocument(), title, held, printed.layout) }, sitting: sitting.printNumber, layout: printed.layout, secret: config.sheetSecret, scripts, ownNumbers };
}
