import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { demoSheet } from '../../db/seed/pages/demo-sheet';
import { codedJob } from './demo-draw/coded-job';
import { drawPages } from './demo-draw/draw-pages';
import { pageCount } from '../../db/seed/pages/sheet-layout';
import { demoItems } from '../../db/seed/truth/demo-items';
import { saveTruth } from '../../db/seed/truth/truth-file';
import { placesOfSitting } from '../../db/queries/page-images';
import { batchesOf } from '../../db/queries/uploads';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { createBatch } from '../services/batches';
import { receiveFile } from '../services/uploads';
import { readAhead } from './demo-readings';
import { demoSeed, demoTruth, firstBatch, type DemoSitting } from './demo-truth';

const bundle = 'A';
const sayEvery = 40;

/** Beside the database, never in it: what the demo's boxes say, and which sitting still waits for its pages. */
const truthPath = ({ config }: Context): string => join(config.dataDir, 'demo-truth.json');
const unfinishedPath = ({ config }: Context): string => join(config.dataDir, 'demo-unfinished.json');

export function noteUnfinished(context: Context, demo: DemoSitting): void {
  saveTruth(truthPath(context), { seed: demoSeed, candidates: demoTruth() });
  writeFileSync(unfinishedPath(context), JSON.stringify(demo));
}

/** The demo whose pages are not all in yet; also after a stop half way. */
export const unfinishedDemo = (context: Context): DemoSitting | null => (existsSync(unfinishedPath(context)) ? (JSON.parse(readFileSync(unfinishedPath(context), 'utf8')) as DemoSitting) : null);

/** Draws the demo's pages in a process of their own and brings each in as soon as it is drawn. Pages that are in already are passed over. */
export async function bringDemoPages(context: Context, demo: DemoSitting, say: (line: string) => void, signal?: AbortSignal): Promise<void> {
  const { db, config } = context;
  const reader: Actor = { personId: demo.readers[0] ?? '', isOfficer: false };
  const waiting = new Set(placesOfSitting(db, demo.sittingId).filter(({ image }) => image === null).map((place) => `${place.candidateNumber}-p${place.pageNo}.jpg`));
  const truth = firstBatch(demoTruth()).filter(({ candidate }) => waiting.has(`${candidate}-p1.jpg`) || waiting.has(`${candidate}-p2.jpg`));
  const outDir = join(config.dataDir, 'demo-pages');
  mkdirSync(outDir, { recursive: true });
  const batchId = batchesOf(db, demo.sittingId).find((batch) => batch.bundle === bundle)?.id ?? createBatch(context, reader, demo.sittingId, bundle).id;
  const all = truth.length * pageCount(demoItems.length);
  let begun = 0;
  let bringing = Promise.resolve();
  const afterTheOthers = (file: string): void => {
    bringing = bringing.then(() => bring(file));
    // What fails is thrown where it is awaited, below.
    bringing.catch(() => undefined);
  };
  const bring = async (file: string): Promise<void> => {
    if (waiting.has(file)) await receiveFile(context, reader, batchId, join(outDir, file));
    rmSync(join(outDir, file), { force: true });
    begun += 1;
    if (begun % sayEvery === 0 || begun === all) say(`${begun} of ${all} pages of the demo are drawn. Reading can go on meanwhile.`);
  };
  await drawPages({ outDir, seed: demoSeed, sheet: demoSheet, candidates: truth, coded: codedJob(context, demo.sittingId, { W4090: null, W4104: null }), onPage: ({ file }) => afterTheOthers(file), ...(signal ? { signal } : {}) });
  await bringing;
  await context.jobs.settle();
  readAhead(context, demo, firstBatch(demoTruth()));
  rmSync(outDir, { recursive: true, force: true });
  rmSync(unfinishedPath(context), { force: true });
  say(`All ${all} pages of the demo are in. What is written on them stands in ${truthPath(context)}.`);
}
