import { mkdtempSync, writeFileSync } from 'node:fs';
import sharp from 'sharp';
import { printMasters, checkOf, layoutOf, secret } from './printed';
import { scenarios } from './faults';
import { scan } from './scanned';
import { fill, kinds } from './answers';
import { randomFrom } from '../../db/seed/truth/random';
import { createPictures } from '../../server/ingest/pictures';
import { loadCodeFinder } from '../../server/ingest/sheet/codes';
import { decodePage, greyOf } from '../../server/ingest/decode';
import { readSheet } from '../../server/ingest/sheet/read-sheet';
import { sheetPictures } from '../../server/ingest/sheet/sheet-pictures';
const masters = (await printMasters());
const dir = mkdtempSync('/tmp/register/x-');
const files: string[] = []; const pages: any[] = [];
for (const m of masters) pages.push({ sitting: m.identity.sitting, layout: 3, page: m.identity.page, boxes: layoutOf(m.identity)! });
const names = ['skew of 3 degrees', 'noise', 'punched and faint', 'phone', 'mixed', 'fading light'];
for (let i = 0; i < 24; i++) {
  const m = masters[i % masters.length]!; const s = names[i % names.length]!; const random = randomFrom('b', s, i);
  const canvas = { ...m, pixels: Uint8Array.from(m.pixels) };
  for (const b of layoutOf(m.identity)!.boxes) fill(canvas, b, random.pick(kinds), random);
  const { grey } = await scan(canvas, m.paper, scenarios[s]!(random), random);
  const path = `${dir}/${i}.jpg`; files.push(path);
  writeFileSync(path, await sharp(grey.data, { raw: { width: grey.width, height: grey.height, channels: 1 } }).toColourspace('srgb').jpeg({ quality: 80 }).toBuffer());
}
console.log((await sharp(files[0]!).metadata()).channels);
const find = await loadCodeFinder();
const t: Record<string, number[]> = {};
const tick = async <T>(n: string, f: () => T | Promise<T>): Promise<T> => { const b = performance.now(); const r = await f(); (t[n] ??= []).push(performance.now() - b); return r; };
for (let r = 0; r < 2; r++) for (const path of files) {
  const d = await tick('decode', () => decodePage({ path, index: 0, turns: 0 })); if (!d.ok) throw 1;
  const g = await tick('grey', () => greyOf(d.pixels));
  await tick('codes', () => find(g));
  const reading = await tick('codes+register+ink', () => readSheet(g, { findCodes: find, checkOf, layoutOf }));
  if (reading.state !== 'read') { console.log(reading); continue; }
  await tick('pictures', () => sheetPictures({ ...g, channels: 1 }, reading, layoutOf(reading.identity)!.boxes));
  await tick('floor', () => sharp(path).resize({ width: 1240 }).jpeg({ quality: 70 }).toBuffer());
}
for (const [k, v] of Object.entries(t)) { v.sort((a, b) => a - b); console.log(k, 'median', v[Math.floor(v.length / 2)]!.toFixed(1), 'p95', v[Math.floor(v.length * .95)]!.toFixed(1)); }
for (const threads of [2]) {
  const pictures = createPictures(threads);
  const ours = async (some: string[]) => { const rest = [...some]; await Promise.all(Array.from({ length: threads }, async () => { for (let p = rest.pop(); p; p = rest.pop()) { const r = await pictures.makeSheet({ path: p, index: 0, turns: 0, cut: null, sheets: { secret, pages } }); if (!r.ok || r.sheet.state !== 'read') console.log('!!', r); } })); };
  const floor = async (some: string[]) => { const rest = [...some]; await Promise.all(Array.from({ length: threads }, async () => { for (let p = rest.pop(); p; p = rest.pop()) await sharp(p).resize({ width: 1240 }).jpeg({ quality: 70 }).toBuffer(); })); };
  await ours(files.slice(0, 8)); await floor(files.slice(0, 8));
  for (let r = 0; r < 2; r++) {
  let b = performance.now(); await floor(files); const f = performance.now() - b;
  b = performance.now(); await ours(files); const o = performance.now() - b;
  console.log('threads', threads, 'floor/s', (24e3 / f).toFixed(1), 'ours/s', (24e3 / o).toFixed(1), 'ratio', (f / o).toFixed(3)); }
  await pictures.close();
}
