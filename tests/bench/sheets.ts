import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { randomFrom } from '../../db/seed/truth/random';
import { decodePage, greyOf } from '../../server/ingest/decode';
import { createPictures, type Pictures } from '../../server/ingest/pictures';
import { loadCodeFinder } from '../../server/ingest/sheet/codes';
import type { SheetLayout } from '../../server/ingest/sheet/layout';
import { readSheet } from '../../server/ingest/sheet/read-sheet';
import { sheetPictures } from '../../server/ingest/sheet/sheet-pictures';
import type { SheetKeys } from '../../server/ingest/sheet/sheet-task';
import { fill, kinds } from '../sheets/answers';
import { scenarios } from '../sheets/faults';
import { checkOf, layoutOf, printMasters, secret, type Master } from '../sheets/printed';
import { scan } from '../sheets/scanned';
import { median, type BenchLine } from './figures';

const threads = 2;
const pages = 24;
const rounds = 3;
const usual = ['skew of 3 degrees', 'punched and faint', 'fading light', 'phone', 'stain on a code', 'mixed'];

const layoutOfMaster = ({ identity }: Master): SheetLayout => layoutOf(identity) ?? { page: { widthMm: 1, heightMm: 1 }, boxes: [] };

/** Sheets as an office scanner and a phone save them: JPEG with three channels. */
async function scanSheets(folder: string, masters: readonly Master[]): Promise<string[]> {
  const files: string[] = [];
  for (let at = 0; at < pages; at += 1) {
    const master = masters[at % masters.length];
    const faultsOf = scenarios[usual[at % usual.length] ?? ''];
    if (!master || !faultsOf) continue;
    const random = randomFrom('bench', at);
    const canvas = { ...master, pixels: Uint8Array.from(master.pixels) };
    for (const box of layoutOfMaster(master).boxes) fill(canvas, box, random.pick(kinds), random);
    const { grey } = await scan(canvas, master.paper, faultsOf(random), random);
    const file = join(folder, `${at}.jpg`);
    writeFileSync(file, await sharp(grey.data, { raw: { width: grey.width, height: grey.height, channels: 1 } }).toColourspace('srgb').jpeg({ quality: 85 }).toBuffer());
    files.push(file);
  }
  return files;
}

/** Seconds for all files, so many in hand at a time. */
async function secondsFor(files: readonly string[], work: (file: string) => Promise<unknown>): Promise<number> {
  const begun = performance.now();
  const rest = [...files];
  const hand = async (): Promise<void> => {
    for (let file = rest.pop(); file !== undefined; file = rest.pop()) await work(file);
  };
  await Promise.all(Array.from({ length: threads }, hand));
  return (performance.now() - begun) / 1000;
}

async function millisecondsOfSteps(files: readonly string[]): Promise<string> {
  const findCodes = await loadCodeFinder();
  const times: Record<string, number[]> = {};
  const timed = async <Made>(name: string, work: () => Made | Promise<Made>): Promise<Made> => {
    const begun = performance.now();
    const made = await work();
    (times[name] ??= []).push(performance.now() - begun);
    return made;
  };
  for (const path of [...files, ...files]) {
    const decoded = await timed('decode', () => decodePage({ path, index: 0, turns: 0 }));
    if (!decoded.ok) continue;
    const grey = await timed('grey', () => greyOf(decoded.pixels));
    const codes = await timed('find codes', () => findCodes(grey));
    const reading = await timed('identify, register, ink', () => readSheet(grey, { findCodes: () => codes, checkOf, layoutOf }));
    if (reading.state === 'read') await timed('draw and encode', () => sheetPictures({ ...grey, channels: 1 }, reading, layoutOf(reading.identity)?.boxes ?? []));
  }
  return Object.entries(times).map(([name, all]) => `${name} ${median(all).toFixed(0)}`).join(', ');
}

const readWith = (pictures: Pictures, sheets: SheetKeys) => async (path: string): Promise<void> => {
  const made = await pictures.makeSheet({ path, index: 0, turns: 0, cut: null, sheets });
  if (!made.ok || made.sheet.state !== 'read') throw new Error('A sheet of the bench was not read.');
};

/** Printed sheets read a second (decoded, identified, registered, judged for ink, all pictures made) to sharp alone: decode, resize, encode. */
export async function benchSheets(): Promise<BenchLine[]> {
  const folder = mkdtempSync(join(tmpdir(), 'meniscus-bench-'));
  const pictures = createPictures(threads);
  try {
    const masters = await printMasters();
    const files = await scanSheets(folder, masters);
    const sheets: SheetKeys = { secret, pages: masters.map((master) => ({ ...master.identity, boxes: layoutOfMaster(master) })) };
    sharp.concurrency(1);
    sharp.cache(false);
    const read = readWith(pictures, sheets);
    const alone = (file: string): Promise<unknown> => sharp(file).resize({ width: 1240 }).jpeg({ quality: 70 }).toBuffer();
    await secondsFor(files, read);
    await secondsFor(files.slice(0, 4), alone);
    const ratios: { ratio: number; ours: number; floor: number }[] = [];
    for (let round = 0; round < rounds; round += 1) {
      const floor = await secondsFor(files, alone);
      const ours = await secondsFor(files, read);
      ratios.push({ ratio: floor / ours, ours: pages / ours, floor: pages / floor });
    }
    const middle = ratios.sort((one, other) => one.ratio - other.ratio)[Math.floor(rounds / 2)];
    const steps = await millisecondsOfSteps(files);
    return [{ name: 'printed sheets read a second / sharp alone', ratio: middle?.ratio ?? 0, budget: { least: 0.42 }, detail: `${pages} pages, ${middle?.ours.toFixed(1)} to ${middle?.floor.toFixed(1)} a second; ms in one thread: ${steps}` }];
  } finally {
    await pictures.close();
    rmSync(folder, { recursive: true, force: true });
  }
}
