import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../db/client';
import { insertBlob } from '../../db/queries/blobs';
import { findExport, insertExport, standingTexts } from '../../db/queries/totals';
import { csvText } from '../../shared/marking/csv-cell';
import { marksText } from '../../shared/marking/grains';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { notFound } from '../errors';
import { recordAct } from './audit';
import { requireSitting } from './sitting-access';
import { totals } from './totals';

/** Marks as rows: candidate, attendance, what stands as read and its mark by item, total, items without a mark. */
export function marksTable(context: Context, actor: Actor, sittingId: string): string[][] {
  const table = totals(context, actor, sittingId);
  const texts = standingTexts(context.db, sittingId);
  const head = table.items.flatMap(({ number }) => [`item ${number} read`, `item ${number} mark`]);
  const rows = table.rows.map((row) => {
    const cells = row.marks.flatMap(({ answerId, grains }) => {
      const read = texts.get(answerId);
      return [read?.text ?? read?.code ?? '', grains === null ? '' : marksText(grains)];
    });
    const total = row.totalGrains === null ? '' : marksText(row.totalGrains);
    return [row.candidateNumber, row.attendance, ...cells, total, row.missing.join(' ')];
  });
  return [['candidate', 'attendance', ...head, 'total', 'items without a mark'], ...rows];
}

/** Makes the CSV file (UTF-8 with a byte order mark, which spreadsheets need) and stores it as it is sent. */
export async function makeMarksExport(context: Context, actor: Actor, sittingId: string): Promise<{ id: string; fileName: string }> {
  const { db, storage, clock } = context;
  const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
  const bytes = Buffer.from(`\uFEFF${csvText(marksTable(context, actor, sittingId))}`, 'utf8');
  const stored = await storage.put(bytes);
  const id = uuidv7();
  const at = clock.now();
  const fileName = `marks-${sitting.printNumber}-${new Date(at).toISOString().slice(0, 10)}.csv`;
  inTransaction(db, () => {
    insertBlob(db, { ...stored, mediaType: 'text/csv' });
    insertExport(db, { id, sitting: sittingId, kind: 'marks-csv', fileName, blob: stored.sha256, asOf: sitting.seq, by: actor.personId, at });
    recordAct(context, { actor: actor.personId, act: 'marks-exported', sitting: sittingId, subject: id, after: { sha256: stored.sha256 } });
  });
  return { id, fileName };
}

/** The stored file of an export, for a lead of its course. */
export async function exportFileOf(context: Context, actor: Actor, exportId: string): Promise<{ fileName: string; bytes: Buffer }> {
  const found = findExport(context.db, exportId);
  if (!found) throw notFound();
  requireSitting(context, actor, found.sitting, ['lead']);
  return { fileName: found.fileName, bytes: await context.storage.read(found.blob) };
}
