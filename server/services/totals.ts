import { deskItems } from '../../db/queries/desk';
import { marksOfSitting, scriptTotals } from '../../db/queries/totals';
import type { getTotals } from '../../shared/contracts/ledger';
import type { ResponseOf } from '../../shared/contracts/route';
import { itemLabel } from '../../shared/marking/item-label';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { requireLockedPaper, requireSitting } from './sitting-access';

type Totals = ResponseOf<typeof getTotals>;
type Mark = ReturnType<typeof marksOfSitting>[number];

/** The marks table: what is not yet marked blocks a total and is named. */
export function totals(context: Context, actor: Actor, sittingId: string): Totals {
  const { db } = context;
  const { sitting } = requireSitting(context, actor, sittingId, ['lead', 'external']);
  requireLockedPaper(context, sitting);
  const byScript = new Map<string, Mark[]>();
  for (const mark of marksOfSitting(db, sittingId)) byScript.set(mark.script, [...(byScript.get(mark.script) ?? []), mark]);
  return {
    asOf: sitting.seq,
    status: sitting.status,
    boardDate: sitting.boardDate,
    items: deskItems(db, sitting.schemeVersion ?? '').map(({ id, number, body }) => ({
      id,
      number,
      label: itemLabel(body),
      maxGrains: body.withdrawn === 'drop' ? 0 : body.maxGrains,
    })),
    rows: scriptTotals(db, sittingId).map((row) => {
      const marks = byScript.get(row.script) ?? [];
      const missing = marks.filter((mark) => mark.grains === null).map((mark) => mark.itemNumber);
      return {
        candidateId: row.candidateId,
        candidateNumber: row.candidateNumber,
        attendance: row.attendance,
        marks: marks.map(({ answerId, grains, state }) => ({ answerId, grains, state })),
        totalGrains: missing.length === 0 ? (row.grains ?? 0) : null,
        missing,
      };
    }),
  };
}
