import { answerCounts, candidatesByAttendance, itemCount, layoutCounts, pageCounts, readingsTaken } from '../../db/queries/progress';
import { printedScriptCount } from '../../db/queries/printings';
import { isPaperLocked } from '../../db/queries/sittings';
import { heldStates } from '../../shared/contracts/enums';
import type { ProgressView } from '../../shared/contracts/progress';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { requireSitting } from './sitting-access';

/** How far a sitting is, in counts. Those who only read get none that changes with the outcome of a pair. */
export function progressOf(context: Context, actor: Actor, sittingId: string): ProgressView {
  const { db } = context;
  const { sitting, access } = requireSitting(context, actor, sittingId, ['lead', 'reader', 'external', 'officer']);
  const answers = answerCounts(db, sittingId, heldStates) ?? { all: 0, readable: 0, held: 0, scored: 0, due: 0 };
  const { due, ...counts } = answers;
  const seesOutcomes = (['lead', 'external', 'officer'] as const).some((role) => access.roles.has(role));
  return {
    sittingId,
    seq: sitting.seq,
    status: sitting.status,
    isLocked: isPaperLocked(db, sittingId),
    items: itemCount(db, sittingId),
    ...layoutCounts(db, sittingId),
    sheetsPrinted: printedScriptCount(db, sittingId),
    candidates: candidatesByAttendance(db, sittingId),
    pages: pageCounts(db, sittingId),
    readings: { taken: readingsTaken(db, sittingId), due },
    answers: seesOutcomes ? counts : { ...counts, held: null, scored: null },
  };
}
