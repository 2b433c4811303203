import { copyFile, mkdir, rm, stat } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { randomUUID } from 'node:crypto';
import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../db/client';
import { cancelJobs, deadJobs } from '../../db/queries/jobs';
import { fileCount, findUpload, insertUpload, partsOf, sameFile, savePart, updateUpload, type BatchRow, type UploadRow } from '../../db/queries/uploads';
import { mostFilesOfBatch, partBytes, type UploadView } from '../../shared/contracts/scans';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { AppError, conflict, invalidRequest, notFound } from '../errors';
import { recordAct } from './audit';
import { requireBatch, scanners, uploadViews } from './batches';
import { ingestJob } from './ingest';
import { requireRoom } from './room';
import { bumpSitting } from './sitting-access';

const partCount = ({ size, partSize }: UploadRow): number => Math.ceil(size / partSize);

/** What part `n` of a file must weigh. */
const weightOfPart = (upload: UploadRow, n: number): number => Math.min(upload.partSize, upload.size - n * upload.partSize);

const viewOf = (context: Context, uploadId: string): UploadView => {
  const upload = findUpload(context.db, uploadId);
  const [view] = upload ? uploadViews(context, [upload]) : [];
  if (!view) throw notFound();
  return view;
};

function requireUpload(context: Context, actor: Actor, uploadId: string): { upload: UploadRow; batch: BatchRow } {
  const upload = findUpload(context.db, uploadId);
  if (!upload) throw notFound();
  return { upload, batch: requireBatch(context, actor, upload.batch, scanners).batch };
}

export function uploadFor(context: Context, actor: Actor, uploadId: string): UploadView {
  requireUpload(context, actor, uploadId);
  return viewOf(context, uploadId);
}

/** Announces a file; it exists from here on, so that sending can resume. */
export function beginUpload(context: Context, actor: Actor, batchId: string, file: { readonly fileName: string; readonly size: number }): UploadView {
  const { db, clock } = context;
  const { batch } = requireBatch(context, actor, batchId, scanners);
  if (batch.state !== 'open') throw conflict('This batch is cancelled. Begin another for these files.');
  requireRoom(context, file.size);
  if (fileCount(db, batchId) >= mostFilesOfBatch) throw conflict(`A batch holds ${mostFilesOfBatch} files at most. Begin another.`);
  const id = uuidv7();
  insertUpload(db, { id, batch: batchId, fileName: basename(file.fileName), size: file.size, partSize: partBytes, madeAt: clock.now() });
  return viewOf(context, id);
}

/** Throws unless this part of the file can still come: asked before its bytes are taken. */
export function requirePart(context: Context, actor: Actor, uploadId: string, part: number): UploadRow {
  const { upload } = requireUpload(context, actor, uploadId);
  if (upload.state !== 'sending') throw conflict(upload.state === 'cancelled' ? 'This batch was cancelled.' : 'This file is complete already.');
  if (part >= partCount(upload)) throw invalidRequest(`${upload.fileName} has ${partCount(upload)} parts, counted from 0.`);
  return upload;
}

/** Keeps one part; sent again, it takes the place of the earlier one. */
export async function keepPart(context: Context, actor: Actor, uploadId: string, part: number, file: { readonly path: string; readonly size: number }): Promise<UploadView> {
  const upload = requirePart(context, actor, uploadId, part);
  const due = weightOfPart(upload, part);
  if (file.size !== due) throw invalidRequest(`Part ${part} of ${upload.fileName} has ${file.size} bytes; ${due} were announced.`);
  await context.parts.keep(uploadId, part, file.path);
  inTransaction(context.db, () => {
    requirePart(context, actor, uploadId, part);
    savePart(context.db, { upload: uploadId, part, size: file.size });
  });
  return viewOf(context, uploadId);
}

/** All parts are there: the file waits, whole, for its pages to be made; one that is here already is named, not kept twice. */
export async function completeUpload(context: Context, actor: Actor, uploadId: string): Promise<UploadView> {
  const { db, parts, jobs } = context;
  const { upload, batch } = requireUpload(context, actor, uploadId);
  if (upload.state !== 'sending') return viewOf(context, uploadId);
  const here = partsOf(db, uploadId).length;
  if (here < partCount(upload)) throw conflict(`${upload.fileName}: ${here} of ${partCount(upload)} parts are here. Send the rest first.`);
  const whole = await parts.join(uploadId, partCount(upload)).catch((error: unknown) => {
    // Someone asked for the same twice at once, and the other was first.
    if (findUpload(db, uploadId)?.state !== 'sending') return null;
    throw error;
  });
  if (whole === null) return viewOf(context, uploadId);
  inTransaction(db, () => {
    if (findUpload(db, uploadId)?.state !== 'sending') return;
    const same = sameFile(db, batch.sitting, whole.sha256, uploadId);
    if (same) updateUpload(db, uploadId, { state: 'duplicate', sha256: whole.sha256, problem: `The same file as ${same.fileName} of bundle ${same.bundle}. It was not kept twice.` });
    else {
      updateUpload(db, uploadId, { state: 'received', sha256: whole.sha256 });
      jobs.add(ingestJob, uploadId, { uploadId });
    }
    bumpSitting(db, batch.sitting);
    recordAct(context, { actor: actor.personId, act: 'file-received', sitting: batch.sitting, subject: uploadId, after: { fileName: upload.fileName, sha256: whole.sha256, isTwin: same !== undefined } });
  });
  const isReceived = findUpload(db, uploadId)?.state === 'received';
  await (isReceived ? parts.dropParts(uploadId, partCount(upload)) : parts.drop(uploadId));
  return viewOf(context, uploadId);
}

/** Has the pages of a stuck file made again, from where it stopped. */
export function retryUpload(context: Context, actor: Actor, uploadId: string): UploadView {
  const { db, jobs } = context;
  inTransaction(db, () => {
    const { upload, batch } = requireUpload(context, actor, uploadId);
    if (upload.state !== 'received' || deadJobs(db, [uploadId]).size === 0) throw conflict('This file is not stuck.', viewOf(context, uploadId));
    cancelJobs(db, [uploadId]);
    jobs.add(ingestJob, uploadId, { uploadId });
    bumpSitting(db, batch.sitting);
    recordAct(context, { actor: actor.personId, act: 'file-retried', sitting: batch.sitting, subject: uploadId });
  });
  return viewOf(context, uploadId);
}

/** Brings in a file that lies on this machine, by the same steps as one that is sent. The file stays where it is. */
export async function receiveFile(context: Context, actor: Actor, batchId: string, path: string): Promise<UploadView> {
  const { parts } = context;
  const { size } = await stat(path);
  if (size > partBytes) throw new AppError('too_large', `${basename(path)} is larger than one part.`);
  const upload = beginUpload(context, actor, batchId, { fileName: basename(path), size });
  await mkdir(parts.incoming, { recursive: true });
  const passing = join(parts.incoming, randomUUID());
  try {
    await copyFile(path, passing);
    await keepPart(context, actor, upload.id, 0, { path: passing, size });
  } finally {
    await rm(passing, { force: true });
  }
  return completeUpload(context, actor, upload.id);
}
