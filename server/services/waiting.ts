import { countStripsToRead } from '../../db/queries/people-and-paper';
import { answerCounts, pageCounts } from '../../db/queries/progress';
import { findSitting, isPaperLocked } from '../../db/queries/sittings';
import { heldStates } from '../../shared/contracts/enums';
import { waitingKinds, type WaitingLine } from '../../shared/contracts/waiting';
import type { SittingView } from '../../shared/contracts/sittings';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { deskStanding } from './desk';
import { handScripts } from './people/by-hand';
import { viewOf } from './people/overview';
import { emptyItems } from './blanks';
import { coursesOf, sittingsIn } from './sittings';

function toRead(context: Context, actor: Actor, sitting: SittingView): Pick<WaitingLine, 'count' | 'item'> {
  const { items } = deskStanding(context, actor, sitting.id);
  const most = items.reduce<(typeof items)[number] | null>((found, item) => (item.toRead > (found?.toRead ?? 0) ? item : found), null);
  return { count: most?.toRead ?? 0, item: most ? { id: most.id, number: most.number, label: most.label } : null };
}

/** Sheets that carry another's number, and spare ones that are nobody's. */
function differing(context: Context, sittingId: string): number {
  const { differ, spares } = viewOf(context, sittingId);
  return differ.length + spares.length;
}

/** Boxes that look empty, for one glance at many. */
function emptyBoxes({ db }: Context, actor: Actor, sittingId: string): Pick<WaitingLine, 'count'> {
  const sitting = findSitting(db, sittingId);
  return { count: sitting ? emptyItems({ db }, actor.personId, sitting).reduce((sum, { count }) => sum + count, 0) : 0 };
}

function linesOf(context: Context, actor: Actor, sitting: SittingView): WaitingLine[] {
  const { db } = context;
  const { id } = sitting;
  const isLead = sitting.roles.includes('lead');
  const isReader = sitting.roles.includes('reader');
  if (!isLead && !isReader) return [];
  const line = (kind: WaitingLine['kind'], count: number, item: WaitingLine['item'] = null): WaitingLine => ({ kind, sittingId: id, sitting: `${sitting.courseCode}, ${sitting.title}`, count, item });
  if (!isPaperLocked(db, id)) return isLead ? [line('lock', 1)] : [];
  const lines = [line('sort', pageCounts(db, id).loose)];
  if (isReader) {
    const { count, item } = toRead(context, actor, sitting);
    lines.push(line('read', count, item), line('blanks', emptyBoxes(context, actor, id).count));
  }
  if (isLead) lines.push(line('rule', answerCounts(db, id, heldStates)?.held ?? 0), line('differ', differing(context, id)));
  lines.push(line('numbers', countStripsToRead(db, id)), line('by-hand', handScripts(context, actor, id).length));
  return lines.filter(({ count }) => count > 0);
}

/** What waits for a person over all sittings, most pressing first. */
export function waitingFor(context: Context, actor: Actor): WaitingLine[] {
  return coursesOf(context, actor)
    .filter(({ roles }) => roles.length > 0)
    .flatMap((course) => sittingsIn(context, actor, course.id))
    .flatMap((sitting) => linesOf(context, actor, sitting))
    .sort((one, other) => waitingKinds.indexOf(one.kind) - waitingKinds.indexOf(other.kind));
}
