import { deadJobs } from '../../db/queries/jobs';
import { pageCounts } from '../../db/queries/progress';
import { batchesOf, fileCounts, pagesUnderWay, receivedUploads } from '../../db/queries/uploads';
import type { SittingEvent } from '../../shared/contracts/events';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { scanViewers } from './batches';
import { requireSitting } from './sitting-access';

/** Where the scans of a sitting are now. */
export function eventFor(context: Pick<Context, 'db'>, actor: Actor, sittingId: string): SittingEvent {
  const { db } = context;
  const { sitting } = requireSitting(context, actor, sittingId, scanViewers);
  const batches = batchesOf(db, sittingId).map(({ id }) => ({ files: fileCounts(db, id), making: pagesUnderWay(db, id) }));
  const sum = (of: (batch: (typeof batches)[number]) => number): number => batches.reduce((total, batch) => total + of(batch), 0);
  return {
    seq: sitting.seq,
    pages: pageCounts(db, sittingId),
    files: { sending: sum(({ files }) => files.sending), received: sum(({ files }) => files.received) },
    making: { done: sum(({ making }) => making.done), of: sum(({ making }) => making.of) },
    stuck: stuckFiles(db, sittingId),
  };
}

const stuckFiles = (db: Context['db'], sittingId: string): number => deadJobs(db, batchesOf(db, sittingId).flatMap(({ id }) => receivedUploads(db, id))).size;

/** Tells, each time it is asked, what changed since the last time; null when nothing did. Throws once the actor may no longer see it. */
export function eventsFor(context: Pick<Context, 'db'>, actor: Actor, sittingId: string): () => SittingEvent | null {
  let seen = '';
  return () => {
    const { sitting } = requireSitting(context, actor, sittingId, scanViewers);
    const now = `${sitting.seq}/${stuckFiles(context.db, sittingId)}`;
    if (now === seen) return null;
    seen = now;
    return eventFor(context, actor, sittingId);
  };
}
