import { mkdirSync, readFileSync, renameSync, writeFileSync, writeSync } from 'node:fs';
import { setPriority } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { drawCodedPage } from '../../../db/seed/pages/coded-page';
import { drawPage, drawSamplePage } from '../../../db/seed/pages/draw-page';
import { pageFile, type CodedJob, type PageDrawn, type PageJob } from '../../../db/seed/pages/page-job';
import { pageCount } from '../../../db/seed/pages/sheet-layout';
import type { CandidateTruth } from '../../../db/seed/truth/written';
import { codePlaces, paperSizes } from '../../../shared/sheets/geometry';
import { composeCode } from '../../../shared/sheets/identity';
import { darkRuns, rectOfRun } from '../../print/code-modules';
import { checkWith } from '../../print/sheet-check';

/** The dark modules of the six codes of a page as one path. */
function codesOf({ sitting, layout, secret, sheet }: CodedJob, script: number, page: number): string {
  const checkOf = checkWith(secret);
  return codePlaces(paperSizes[sheet.plan.paper])
    .flatMap((at) => darkRuns(composeCode({ sitting, layout, script, page, place: at.place }, checkOf)).map((run) => rectOfRun(run, at)))
    .map(({ x, y, w, h }) => `M${x.toFixed(3)} ${y.toFixed(3)}h${w.toFixed(3)}v${h.toFixed(3)}h${(-w).toFixed(3)}z`)
    .join('');
}

function drawCoded(seed: string, coded: CodedJob, { candidate, hand, answers }: Pick<CandidateTruth, 'candidate' | 'hand' | 'answers'>, pageNo: number): Promise<Buffer> {
  const script = coded.scripts[candidate];
  if (script === undefined) throw new Error(`No sheet was printed for ${candidate}.`);
  const written = coded.ownNumbers[candidate];
  const ownNumber = written === undefined ? candidate : written;
  return drawCodedPage({ seed, sheet: coded.sheet, pageNo, owner: { candidateNumber: candidate, script }, codes: codesOf(coded, script, pageNo), hand, answers, ownNumber });
}

/** The drawing process: a job in, pages on disk, a line for each. It ends when the job is done or nobody listens any more. */
async function run(): Promise<void> {
  sharp.concurrency(1);
  sharp.cache(false);
  // People at the desk come before pages that are still to be drawn.
  setPriority(10);
  const { outDir, seed, sheet, candidates, withSamples, coded } = JSON.parse(readFileSync(0, 'utf8')) as PageJob;
  mkdirSync(outDir, { recursive: true });
  const pageNos = Array.from({ length: coded?.sheet.plan.pages.length ?? pageCount(sheet.items.length) }, (_, index) => index + 1);
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
      keep(await (coded ? drawCoded(seed, coded, { candidate, hand, answers }, pageNo) : drawPage({ seed, sheet, pageNo, candidate, hand, answers })), candidate, pageNo);
    }
  }
}

await run();
