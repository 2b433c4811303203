import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { randomFrom } from '../../db/seed/truth/random';
import { createPictures } from '../../server/ingest/pictures';
import { scenarios } from './faults';
import { layoutOf, printMasters, secret, type Master } from './printed';
import { scan } from './scanned';

const folder = mkdtempSync(join(tmpdir(), 'meniscus-sheets-'));
const pictures = createPictures(1);
let masters: readonly Master[];
beforeAll(async () => {
  masters = await printMasters();
});
afterAll(async () => {
  await pictures.close();
  rmSync(folder, { recursive: true, force: true });
});

const layoutFor = (master: Master | undefined) => {
  const found = master && layoutOf(master.identity);
  if (!found) throw new Error('There is no such sheet.');
  return { master, layout: found };
};

it('makes the pictures of a sheet that lay on its side: upright, to scale, with a cut-out a box', async () => {
  const { master, layout } = layoutFor(masters[0]);
  const faultsOf = scenarios['quarter turns'];
  if (!faultsOf) throw new Error('There is no such fault.');
  const random = randomFrom('worker');
  const { grey } = await scan({ width: master.width, height: master.height, pixels: Uint8Array.from(master.pixels) }, master.paper, faultsOf(random), random);
  const path = join(folder, 'sheet.jpg');
  await sharp(grey.data, { raw: { width: grey.width, height: grey.height, channels: 1 } }).toColourspace('srgb').jpeg().toFile(path);
  const made = await pictures.makeSheet({ path, index: 0, turns: 0, cut: null, sheets: { secret, pages: [{ ...master.identity, boxes: layout }] } });
  if (!made.ok || made.sheet.state !== 'read') throw new Error('The sheet was not read.');
  expect(made.sheet).toMatchObject({ identity: master.identity, codes: 6, hasFewCodes: false, isBilevel: false });
  // A4 at 150 dpi.
  expect(made).toMatchObject({ width: 1240, height: 1754 });
  expect(await sharp(made.display ?? Buffer.alloc(0)).metadata()).toMatchObject({ width: 1240, height: 1754 });
  expect(made.sheet.mmToPx[0]).toBeCloseTo(150 / 25.4, 2);
  expect(made.crops.map(({ box }) => box)).toEqual(layout.boxes.map(({ id }) => id));
  const number = layout.boxes.find(({ isFramed }) => isFramed);
  // The box with 3 mm of paper round it at 200 dpi.
  expect(made.crops.find(({ box }) => box === number?.id)?.width).toBeCloseTo((((number?.w ?? 0) + 6) * 200) / 25.4, -1);
  expect(made.sheet.boxes.filter(({ sidesConfirmed }) => sidesConfirmed !== null).every(({ sidesConfirmed }) => sidesConfirmed === 4)).toBe(true);
});

it('makes a page without codes as it always did, and says that none was found', async () => {
  const path = join(folder, 'page.jpg');
  await sharp({ create: { width: 620, height: 877, channels: 3, background: '#f4f2ea' } }).jpeg().toFile(path);
  const task = { path, index: 0, turns: 0, cut: { page: { widthMm: 210, heightMm: 297 }, boxes: [{ id: 'a', x: 20, y: 40, w: 60, h: 18 }] } };
  const [read, plain] = [await pictures.makeSheet({ ...task, sheets: { secret, pages: [] } }), await pictures.make(task)];
  expect(read).toEqual({ ...plain, sheet: { state: 'unidentified', reason: 'no-code' } });
  expect(plain).toMatchObject({ ok: true, display: null, crops: [{ box: 'a', width: 195, height: 71 }] });
});
