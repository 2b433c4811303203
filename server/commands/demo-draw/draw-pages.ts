import { spawn } from 'node:child_process';
import { createRequire } from 'node:module';
import { createInterface } from 'node:readline';
import { fileURLToPath, pathToFileURL } from 'node:url';
import type { CodedJob, PageDrawn, PageJob } from '../../../db/seed/pages/page-job';
import type { PrintedSheet } from '../../../db/seed/pages/printed';
import type { CandidateTruth } from '../../../db/seed/truth/written';

export interface DrawPagesOrder {
  readonly outDir: string;
  readonly seed: string;
  readonly sheet: PrintedSheet;
  /** Absent ones are passed over. */
  readonly candidates: readonly CandidateTruth[];
  readonly withSamples?: boolean;
  readonly coded?: CodedJob;
  readonly onPage?: (page: PageDrawn) => void;
  readonly signal?: AbortSignal;
}

/**
 * Draws the pages into `outDir` in a process of its own and resolves with them, in order, once all are on disk.
 * Rejects when that process fails, or with the signal's reason after stopping it; pages already whole stay.
 * NOTE: a server forbids its own process to read SVG, which drawing needs; hence the other process.
 */
export async function drawPages({ onPage, signal, ...order }: DrawPagesOrder): Promise<readonly PageDrawn[]> {
  signal?.throwIfAborted();
  const job: PageJob = { withSamples: false, ...order };
  const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
  const child = spawn(process.execPath, ['--import', loader, fileURLToPath(new URL('./child.ts', import.meta.url))]);
  const stop = (): void => void child.kill();
  signal?.addEventListener('abort', stop, { once: true });
  const pages: PageDrawn[] = [];
  let complaint = '';
  child.stderr.on('data', (text: Buffer) => {
    complaint = (complaint + text.toString()).slice(-2000);
  });
  const reports = createInterface({ input: child.stdout });
  reports.on('line', (line) => {
    const page = JSON.parse(line) as PageDrawn;
    pages.push(page);
    onPage?.(page);
  });
  const allReported = new Promise<void>((resolve) => void reports.once('close', resolve));
  try {
    const exitCode = await new Promise<number | null>((resolve, reject) => {
      child.once('error', reject);
      child.once('close', resolve);
      // A process that ends early does not take all of its job: its exit tells why.
      child.stdin.on('error', () => undefined);
      child.stdin.end(JSON.stringify(job));
    });
    await allReported;
    signal?.throwIfAborted();
    if (exitCode !== 0) throw new Error(`Drawing the pages ended with ${exitCode}: ${complaint}`);
    return pages;
  } finally {
    signal?.removeEventListener('abort', stop);
  }
}
