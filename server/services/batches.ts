import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../db/client';
import { batchesOf, cancelUploads, fileCounts, filesOfBatch, findBatch, insertBatch, pagesOfUploads, pagesUnderWay, pageStateCounts, partsOf, receivedUploads, setBatchState, type BatchRow, type UploadRow } from '../../db/queries/uploads';
import { cancelJobs, deadJobs } from '../../db/queries/jobs';
import { filesShown } from '../../shared/contracts/enums';
import type { BatchSummary, BatchView, UploadView } from '../../shared/contracts/scans';
import type { GuardRole } from '../../shared/contracts/route';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { notAllowed, notFound } from '../errors';
import { recordAct } from './audit';
import { requireRoom } from './room';
import { bumpSitting, requireLockedPaper, requireSitting, type SittingAccess } from './sitting-access';

export const scanners = ['lead', 'reader'] as const;
export const scanViewers = ['lead', 'reader', 'external'] as const;

export function requireBatch(context: Context, actor: Actor, batchId: string, roles: readonly GuardRole[]): SittingAccess & { readonly batch: BatchRow } {
  const batch = findBatch(context.db, batchId);
  if (!batch) throw notFound();
  return { batch, ...requireSitting(context, actor, batch.sitting, roles) };
}

function summary({ db }: Context, actor: Actor, batch: BatchRow): BatchSummary {
  const { id, sitting, bundle, madeAt, state } = batch;
  return { id, sittingId: sitting, bundle, madeAt, state, isOwn: batch.madeBy === actor.personId, files: fileCounts(db, id), pages: pageStateCounts(db, id), making: pagesUnderWay(db, id), stuck: deadJobs(db, receivedUploads(db, id)).size };
}

/** What a person is told of a job that was given up; the whole of it is in the log. */
function stuckWords(error: string): string {
  if (/ENOSPC|EDQUOT|no space/i.test(error)) return 'The disk of the server is full. Its pages could not be kept.';
  if (/ECONN|ENOTFOUND|ETIMEDOUT|socket|timeout/i.test(error)) return 'The store of pictures does not answer.';
  if (/^The server stopped/.test(error)) return error;
  return 'Something went wrong on the server while its pages were made.';
}

/** Files with their parts and pages, as the tray shows them. */
export function uploadViews({ db }: Context, rows: readonly UploadRow[]): UploadView[] {
  const ids = rows.map(({ id }) => id);
  const pages = pagesOfUploads(db, ids);
  const dead = deadJobs(db, ids);
  return rows.map(({ id, fileName, size, partSize, state, problem, pages: of }) => ({
    id,
    fileName,
    size,
    partSize,
    state,
    problem,
    stuck: state === 'received' && dead.has(id) ? stuckWords(dead.get(id) ?? '') : null,
    of,
    parts: state === 'sending' ? partsOf(db, id).map(({ part }) => part) : [],
    pages: pages
      .filter(({ upload }) => upload === id)
      .map((page) => ({
        id: page.id,
        index: page.index,
        state: page.state,
        name: page.name,
        why: page.why,
        note: page.note,
        place: page.candidateNumber === null || page.pageNo === null ? null : `${page.candidateNumber}, page ${page.pageNo}`,
      })),
  }));
}

export function batchesFor(context: Context, actor: Actor, sittingId: string): BatchSummary[] {
  requireSitting(context, actor, sittingId, scanViewers);
  return batchesOf(context.db, sittingId).map((batch) => summary(context, actor, batch));
}

export function batchFor(context: Context, actor: Actor, batchId: string): BatchView {
  const { batch } = requireBatch(context, actor, batchId, scanViewers);
  return { ...summary(context, actor, batch), uploads: uploadViews(context, filesOfBatch(context.db, batchId, filesShown)) };
}

export function createBatch(context: Context, actor: Actor, sittingId: string, bundle: string): BatchSummary {
  const { db, clock } = context;
  const { sitting } = requireSitting(context, actor, sittingId, scanners);
  requireLockedPaper(context, sitting);
  requireRoom(context, 0);
  const id = uuidv7();
  inTransaction(db, () => {
    insertBatch(db, { id, sitting: sittingId, bundle, madeBy: actor.personId, madeAt: clock.now() });
    bumpSitting(db, sittingId);
    recordAct(context, { actor: actor.personId, act: 'batch-made', sitting: sittingId, subject: id, after: { bundle } });
  });
  return summary(context, actor, requireBatch(context, actor, id, scanners).batch);
}

/** Gives up files on their way or in the making; what came in stays. */
export async function cancelBatch(context: Context, actor: Actor, batchId: string): Promise<BatchSummary> {
  const { db, parts } = context;
  requireBatch(context, actor, batchId, scanners);
  const cancelled = inTransaction(db, () => {
    const { batch, access } = requireBatch(context, actor, batchId, scanners);
    if (batch.madeBy !== actor.personId && !access.roles.has('lead')) throw notAllowed('Only who began a batch, or a lead, can cancel it.');
    if (batch.state === 'cancelled') return [];
    setBatchState(db, batchId, 'cancelled');
    bumpSitting(db, batch.sitting);
    recordAct(context, { actor: actor.personId, act: 'batch-cancelled', sitting: batch.sitting, subject: batchId });
    const given = cancelUploads(db, batchId);
    cancelJobs(db, given);
    return given;
  });
  await Promise.all(cancelled.map((id) => parts.drop(id)));
  return summary(context, actor, requireBatch(context, actor, batchId, scanners).batch);
}
