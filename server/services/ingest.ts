import { rm } from 'node:fs/promises';
import { inTransaction } from '../../db/client';
import { findBatch, findUpload, pageIndexesOf, updateUpload, type BatchRow, type UploadRow } from '../../db/queries/uploads';
import type { Context } from '../context';
import type { OpenedPage } from '../ingest/inputs/opener';
import type { PlannedPage } from '../ingest/inputs/plan';
import { InputRefusal } from '../ingest/inputs/refusal';
import { recordAct } from './audit';
import { finishUpload } from './ingest-end';
import { keepPage, makeTaken, noteRefusedPage, type IngestOf, type Taken } from './ingest-page';
import { bumpSitting } from './sitting-access';

export const ingestJob = 'ingest-upload';

/** Pages of one file decoded and stored side by side. */
const pagesSideBySide = 2;

function refuse(context: Context, { id, fileName }: UploadRow, batch: BatchRow, { problem, state }: { readonly problem: string; readonly state: 'refused' | 'duplicate' }): void {
  const { db } = context;
  inTransaction(db, () => {
    if (findUpload(db, id)?.state !== 'received') return;
    updateUpload(db, id, { state, problem });
    bumpSitting(db, batch.sitting);
    recordAct(context, { actor: batch.madeBy, act: 'file-refused', sitting: batch.sitting, subject: id, after: { fileName }, reason: problem });
  });
}

const isStill = ({ db }: Context, uploadId: string): boolean => findUpload(db, uploadId)?.state === 'received';

/** One page from picture to row; a page of several that cannot be taken is noted as refused. */
async function bringIn(context: Context, of: IngestOf, page: PlannedPage, opened: OpenedPage | { readonly refusal: string }): Promise<void> {
  try {
    const taken: Taken = 'refusal' in opened ? { ok: false, refusal: opened.refusal } : await makeTaken(context, of, page, opened);
    const notTaken = taken.ok ? keepPage(context, of, page, taken) : taken;
    if (notTaken === null) return;
    if (of.isOnePicture) refuse(context, of.upload, of.batch, { problem: notTaken.refusal, state: notTaken.isTwin ? 'duplicate' : 'refused' });
    else noteRefusedPage(context, of, page, notTaken.refusal);
  } finally {
    if ('isPassing' in opened && opened.isPassing) await rm(opened.path, { force: true });
  }
}

async function bringInAll(context: Context, of: IngestOf, todo: readonly PlannedPage[], beat: () => void): Promise<void> {
  const { opener, parts } = context;
  const underWay = new Set<Promise<void>>();
  const failures: unknown[] = [];
  for await (const { page, opened } of opener.open(todo, await parts.workDir(of.upload.id))) {
    if (failures.length > 0 || !isStill(context, of.upload.id)) break;
    const one = bringIn(context, of, page, opened)
      .then(beat, (error: unknown) => void failures.push(error))
      .finally(() => underWay.delete(one));
    underWay.add(one);
    if (underWay.size >= pagesSideBySide) await Promise.race(underWay);
  }
  await Promise.all(underWay);
  if (failures.length > 0) throw failures[0];
}

async function ingestFile(context: Context, upload: UploadRow, batch: BatchRow, path: string, beat: () => void): Promise<void> {
  const { db, opener, parts } = context;
  const planned = await opener.plan(path, await parts.workDir(upload.id));
  const done = new Set(pageIndexesOf(db, upload.id));
  inTransaction(db, () => {
    if (upload.pages === planned.length) return;
    updateUpload(db, upload.id, { pages: planned.length });
    bumpSitting(db, batch.sitting);
  });
  const [first] = planned;
  const of: IngestOf = { upload, batch, path, isOnePicture: planned.length === 1 && first?.name === null };
  await bringInAll(context, of, planned.filter(({ index }) => !done.has(index)), beat);
  await finishUpload(context, of);
}

/** Makes the pages of one received file and gives them their place, page by page. Running it again, after a crash too, goes on where it was. */
export async function ingestUpload(context: Context, uploadId: string, beat: () => void = () => undefined): Promise<void> {
  const { db, storage, parts } = context;
  const upload = findUpload(db, uploadId);
  const batch = upload ? findBatch(db, upload.batch) : undefined;
  if (!upload || !batch || upload.sha256 === null) return;
  if (upload.state === 'received') {
    try {
      const held = await parts.whole(uploadId);
      if (held !== null) await ingestFile(context, upload, batch, held, beat);
      else await storage.withLocalCopy(upload.sha256, (path) => ingestFile(context, upload, batch, path, beat));
    } catch (error) {
      if (error instanceof InputRefusal) refuse(context, upload, batch, { problem: error.message, state: 'refused' });
      else if (isStill(context, uploadId)) throw error;
    }
  }
  if (!isStill(context, uploadId)) await parts.drop(uploadId);
}
