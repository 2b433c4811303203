import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import type { MessagePort } from 'node:worker_threads';
import { writeSheets, type SheetOrder } from './sheets-pdf';

export interface PrintTask extends SheetOrder {
  readonly port: MessagePort;
}

/** Told often enough to be watched, and not once for each sheet. */
const tellEveryMs = 250;

/** Writes the file of a printing and answers with the hash of its bytes. */
export default async function print({ port, ...order }: PrintTask): Promise<string> {
  let told = 0;
  await writeSheets(order, (done) => {
    const now = performance.now();
    if (now - told < tellEveryMs) return;
    told = now;
    port.postMessage(done);
  });
  port.close();
  const hash = createHash('sha256');
  await pipeline(createReadStream(order.path), hash);
  return hash.digest('hex');
}
