import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { demoFacts } from '../../db/seed/truth/demo-facts';
import { candidateNumbers, inventTruth } from '../../db/seed/truth/truth';
import { createBatch } from '../../server/services/batches';
import { receiveFile } from '../../server/services/uploads';
import { buildDemoSitting, drawDemoPages } from '../support/demo-sitting';
import { actorOf } from '../support/paper';
import { startTestServer } from '../support/test-server';
import type { BenchLine } from './figures';

const candidates = 20;

async function secondsOf(work: () => Promise<void>): Promise<number> {
  const begun = process.hrtime.bigint();
  await work();
  return Number(process.hrtime.bigint() - begun) / 1e9;
}

/** Pages a second brought in whole (kept, hashed, decoded, cut, placed, settled) to those of sharp alone, one at a time: decode, resize, encode display and thumbnail. */
export async function benchIngest(): Promise<BenchLine[]> {
  const outDir = mkdtempSync(join(tmpdir(), 'meniscus-bench-'));
  const server = await startTestServer();
  try {
    const truth = inventTruth({ seed: 'bench', items: demoFacts(), candidates: candidateNumbers(candidates + 2), absentShare: 0 });
    const files = (await drawDemoPages(outDir, truth)).map(({ file }) => join(outDir, file));
    const { sittingId } = buildDemoSitting(server, truth.map(({ candidate }) => candidate));
    const reader = actorOf(server, 'readerOne');
    const { id } = createBatch(server.context, reader, sittingId, 'A');
    const bring = async (some: readonly string[]): Promise<void> => {
      for (const file of some) await receiveFile(server.context, reader, id, file);
      await server.context.jobs.settle();
    };
    // The two pictures that every page must have; cutting out, keeping, hashing and placing come on top.
    const fitted = (file: string, side: number) => sharp(file).autoOrient().resize({ width: side, height: side, fit: 'inside', withoutEnlargement: true }).jpeg({ quality: 80 }).toBuffer();
    const alone = async (some: readonly string[]): Promise<void> => {
      for (const file of some) {
        await fitted(file, 2400);
        await fitted(file, 320);
      }
    };
    sharp.concurrency(1);
    sharp.cache(false);
    // The first four pages start the worker and warm both up.
    await bring(files.slice(0, 4));
    await alone(files.slice(0, 4));
    const rest = files.slice(4);
    const floor = await secondsOf(() => alone(rest));
    const ours = await secondsOf(() => bring(rest));
    return [{ name: 'pages brought in a second / sharp alone', ratio: floor / ours, budget: { least: 0.6 }, detail: `${rest.length} pages, ${(rest.length / ours).toFixed(1)} to ${(rest.length / floor).toFixed(1)} a second` }];
  } finally {
    await server.close();
    rmSync(outDir, { recursive: true, force: true });
  }
}
