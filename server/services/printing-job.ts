import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { inTransaction } from '../../db/client';
import { insertBlob } from '../../db/queries/blobs';
import { findPrinting, layoutOrdinal, printedOwners, updatePrinting, type PrintingRow } from '../../db/queries/printings';
import { findSitting } from '../../db/queries/sittings';
import type { Context } from '../context';
import { headingOf, printedItems } from './sheet-order';
import { bumpSitting } from './sitting-access';

export const printJob = 'print-sheets';

async function make(context: Context, printing: PrintingRow, path: string): Promise<void> {
  const { db, storage, printer, config } = context;
  const sitting = findSitting(db, printing.sitting);
  if (!sitting) return;
  const sha256 = await printer.print(
    {
      path,
      paper: printing.paperSize,
      sitting: sitting.printNumber,
      layout: layoutOrdinal(db, printing.layout),
      ...headingOf(db, sitting),
      items: printedItems(db, printing.sitting),
      owners: printedOwners(db, printing.id),
      secret: config.sheetSecret,
      madeAt: printing.madeAt,
    },
    (done) => updatePrinting(db, printing.id, { done }),
  );
  const { size } = await storage.putFile(path, sha256);
  inTransaction(db, () => {
    insertBlob(db, { sha256, size, mediaType: 'application/pdf' });
    updatePrinting(db, printing.id, { state: 'made', done: printing.of, blob: sha256 });
    bumpSitting(db, printing.sitting);
  });
}

/** Writes the file of a printing and keeps it under its hash. Running it again, after a crash too, begins the file anew. */
export async function printSheets(context: Context, printingId: string): Promise<void> {
  const { db, config } = context;
  const printing = findPrinting(db, printingId);
  if (!printing || printing.state === 'made') return;
  const folder = join(config.dataDir, 'printing');
  const path = join(folder, `${printingId}.pdf`);
  await mkdir(folder, { recursive: true });
  updatePrinting(db, printingId, { state: 'making', done: 0 });
  try {
    await make(context, printing, path);
  } catch (error) {
    updatePrinting(db, printingId, { state: 'failed' });
    throw error;
  } finally {
    await rm(path, { force: true });
  }
}
