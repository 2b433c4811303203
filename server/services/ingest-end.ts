import { stat } from 'node:fs/promises';
import { inTransaction } from '../../db/client';
import { insertBlob } from '../../db/queries/blobs';
import { findUpload, pagesOfUploads, updateUpload } from '../../db/queries/uploads';
import type { Context } from '../context';
import { kindOfFile, mediaTypes } from '../ingest/file-kinds';
import { recordAct } from './audit';
import type { IngestOf } from './ingest-page';
import { bumpSitting } from './sitting-access';

interface End {
  readonly state: 'done' | 'refused' | 'duplicate';
  readonly problem: string | null;
}

/** What became of a file with all its pages looked at. */
function endOf(context: Context, uploadId: string): End {
  const pages = pagesOfUploads(context.db, [uploadId]);
  const [first] = pages;
  if (!first || pages.some(({ state }) => state !== 'refused')) return { state: 'done', problem: null };
  const isTwin = pages.every(({ why }) => why?.startsWith('The same picture') ?? false);
  if (isTwin) return { state: 'duplicate', problem: `All ${pages.length} pages are here already. They were not kept twice.` };
  return { state: 'refused', problem: `None of its ${pages.length} pages can be taken. The first: ${first.why ?? 'it cannot be read.'}` };
}

/** Ends a file whose pages all have their rows. Its own bytes are kept where a page of it was taken. */
export async function finishUpload(context: Context, { upload, batch, path }: IngestOf): Promise<void> {
  const { db, storage } = context;
  if (findUpload(db, upload.id)?.state !== 'received' || upload.sha256 === null) return;
  const { sha256 } = upload;
  const end = endOf(context, upload.id);
  const size = (await stat(path)).size;
  const mediaType = mediaTypes[await kindOfFile(path)] ?? 'application/octet-stream';
  if (end.state === 'done') await storage.putFile(path, sha256);
  inTransaction(db, () => {
    if (findUpload(db, upload.id)?.state !== 'received') return;
    if (end.state === 'done') insertBlob(db, { sha256, size, mediaType });
    else recordAct(context, { actor: batch.madeBy, act: 'file-refused', sitting: batch.sitting, subject: upload.id, after: { fileName: upload.fileName }, reason: end.problem ?? '' });
    updateUpload(db, upload.id, end);
    bumpSitting(db, batch.sitting);
  });
}
