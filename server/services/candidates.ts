import { inTransaction } from '../../db/client';
import { candidateStandings, findCandidate, updateAttendance } from '../../db/queries/candidates';
import type { CandidateView } from '../../shared/contracts/class-list';
import type { Attendance } from '../../shared/contracts/enums';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, notFound } from '../errors';
import { recordAct } from './audit';
import { settleCandidate } from './scripts';
import { bumpSitting, requireSitting } from './sitting-access';

const notMarked: readonly Attendance[] = ['absent', 'withdrawn', 'deferred'];

const viewOf = ({ pages, pagesExcused, ...standing }: ReturnType<typeof candidateStandings>[number]): CandidateView => ({
  ...standing,
  pagesDue: notMarked.includes(standing.attendance) ? 0 : pages - pagesExcused,
});

/** The class list by number; names are another resource. */
export function candidatesOf(context: Context, actor: Actor, sittingId: string): CandidateView[] {
  requireSitting(context, actor, sittingId, ['lead', 'reader', 'external']);
  return candidateStandings(context.db, sittingId).map(viewOf);
}

function viewOfOne({ db }: Context, sittingId: string, candidateId: string): CandidateView {
  const [standing] = candidateStandings(db, sittingId, candidateId);
  if (!standing) throw notFound();
  return viewOf(standing);
}

/** Changes who is to be marked: the answers of someone absent are due nothing. */
export function changeAttendance(context: Context, actor: Actor, candidateId: string, rev: number, attendance: Attendance): CandidateView {
  const { db } = context;
  const found = findCandidate(db, candidateId);
  const { sitting } = requireSitting(context, actor, found?.sitting, ['lead']);
  return inTransaction(db, () => {
    const candidate = findCandidate(db, candidateId);
    if (!candidate) throw notFound();
    if (candidate.rev !== rev) throw conflict('Someone changed this candidate meanwhile. Yours was not stored.', viewOfOne(context, sitting.id, candidateId));
    updateAttendance(db, candidateId, attendance);
    bumpSitting(db, sitting.id);
    settleCandidate(context, candidateId);
    recordAct(context, {
      actor: actor.personId,
      act: 'attendance-changed',
      sitting: sitting.id,
      subject: candidateId,
      before: { attendance: candidate.attendance },
      after: { attendance },
    });
    return viewOfOne(context, sitting.id, candidateId);
  });
}
