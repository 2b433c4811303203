import { mkdirSync, readFileSync, renameSync, writeFileSync, writeSync } from 'node:fs';
import { setPriority } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { drawPage, drawSamplePage } from './draw-page';
import { pageFile } from './page-job';
import type { PageDrawn, PageJob } from './page-job';
import { pageCount } from './sheet-layout';

/** The drawing process: a job in, pages on disk, a line for each. It ends when the job is done or nobody listens any more. */
async function run(): Promise<void> {
  sharp.concurrency(1);
  sharp.cache(false);
  // People at the desk come before pages that are still to be drawn.
  setPriority(10);
  const { outDir, seed, sheet, candidates, withSamples } = JSON.parse(readFileSync(0, 'utf8')) as PageJob;
  mkdirSync(outDir, { recursive: true });
  const pageNos = Array.from({ length: pageCount(sheet.items.length) }, (_, index) => index + 1);
  const keep = (picture: Buffer, candidate: string | null, pageNo: number): void => {
    const file = pageFile(candidate, pageNo);
    // Whoever watches the folder never sees half a page.
    writeFileSync(join(outDir, `.${file}.part`), picture);
    renameSync(join(outDir, `.${file}.part`), join(outDir, file));
    const drawn: PageDrawn = { file, candidate, pageNo, bytes: picture.length };
    writeSync(1, `${JSON.stringify(drawn)}\n`);
  };
  if (withSamples) for (const pageNo of pageNos) keep(await drawSamplePage(sheet, pageNo), null, pageNo);
  for (const { candidate, hand, answers, isAbsent } of candidates) {
    if (isAbsent) continue;
    for (const pageNo of pageNos) {
      keep(await drawPage({ seed, sheet, pageNo, candidate, hand, answers }), candidate, pageNo);
    }
  }
}

await run();
