import { beforeAll, describe, expect, it } from 'vitest';
import { randomFrom } from '../../db/seed/truth/random';
import { loadCodeFinder, type CodeFinder } from '../../server/ingest/sheet/codes';
import type { LayoutOf, SheetLayout } from '../../server/ingest/sheet/layout';
import type { Grey } from '../../server/ingest/sheet/pixels';
import { readSheet } from '../../server/ingest/sheet/read-sheet';
import { darkRuns } from '../../server/print/code-modules';
import { checkWith } from '../../server/print/sheet-check';
import { composeCode } from '../../shared/sheets/identity';
import { scenarios } from './faults';
import { checkOf, layoutOf, printMasters, type Master } from './printed';
import { scan } from './scanned';

const picture = (width = 1200, height = 1600): Grey => ({ width, height, data: new Uint8Array(width * height).fill(245) });

/** A code of 25 modules drawn into a picture, 5 pixels a module. */
function drawCode({ width, data }: Grey, digits: string, x: number, y: number): void {
  for (const { row, from, modules } of darkRuns(digits)) for (let line = 0; line < 5; line += 1) data.fill(15, (y + row * 5 + line) * width + x + from * 5, (y + row * 5 + line) * width + x + (from + modules) * 5);
}

function beside(one: Grey, other: Grey): Grey {
  const both = picture(one.width + other.width, Math.max(one.height, other.height));
  for (const [grey, left] of [[one, 0], [other, one.width]] as const) for (let row = 0; row < grey.height; row += 1) both.data.set(grey.data.subarray(row * grey.width, (row + 1) * grey.width), row * both.width + left);
  return both;
}

describe('pictures that are no sheet of ours', () => {
  let masters: readonly Master[];
  let findCodes: CodeFinder;
  beforeAll(async () => {
    masters = await printMasters();
    findCodes = await loadCodeFinder();
  });
  const read = (grey: Grey, layouts: LayoutOf = layoutOf) => readSheet(grey, { findCodes, checkOf, layoutOf: layouts });
  const scanned = async (index: number): Promise<{ grey: Grey; master: Master }> => {
    const master = masters[index];
    const faults = scenarios['skew of 3 degrees'];
    if (!master || !faults) throw new Error('There is no such sheet.');
    const random = randomFrom('strangers', index);
    const { grey } = await scan({ width: master.width, height: master.height, pixels: Uint8Array.from(master.pixels) }, master.paper, faults(random), random);
    return { grey, master };
  };

  it('finds no identity in noise or on white paper', () => {
    const random = randomFrom('noise');
    for (let each = 0; each < 6; each += 1) {
      const { width, height, data } = picture();
      expect(read({ width, height, data: data.map(() => random.whole(0, 255)) })).toEqual({ state: 'unidentified', reason: 'no-code' });
    }
    expect(read(picture())).toEqual({ state: 'unidentified', reason: 'no-code' });
  });

  it('takes codes of others for what they are', () => {
    const random = randomFrom('foreign');
    for (let each = 0; each < 8; each += 1) {
      const grey = picture();
      for (const [x, y] of [[100, 100], [700, 1200]] as const) drawCode(grey, Array.from({ length: 20 }, () => random.whole(0, 9)).join(''), x, y);
      expect(read(grey)).toEqual({ state: 'unidentified', reason: 'other-codes' });
    }
    const forged = picture();
    drawCode(forged, composeCode({ sitting: 214, script: 5, page: 1, layout: 3, place: 1 }, checkWith('a secret of others')), 100, 100);
    expect(read(forged)).toEqual({ state: 'unidentified', reason: 'wrong-check' });
  });

  it('never takes one of two sheets in a picture, nor one sheet twice', async () => {
    const [one, other] = [(await scanned(0)).grey, (await scanned(1)).grey];
    expect(read(beside(one, other))).toMatchObject({ state: 'unidentified', reason: 'several-sheets' });
    expect(read(beside(one, one))).toMatchObject({ state: 'unidentified', reason: 'several-sheets' });
  });

  it('places nothing for a layout it does not know, nor by one that is not the page’s', async () => {
    const { grey, master } = await scanned(0);
    const own = layoutOf(master.identity);
    if (!own) throw new Error('There is no layout.');
    expect(read(grey, () => null)).toMatchObject({ state: 'unplaced', reason: 'unknown-layout', identity: master.identity });
    const moved = (by: number): SheetLayout => ({ ...own, boxes: own.boxes.map((box) => ({ ...box, x: box.x + by, y: box.y + by })) });
    for (const by of [-8, -5, 5, 8]) expect(read(grey, () => moved(by))).toMatchObject({ state: 'unplaced', reason: 'frames-not-found' });
    expect(read(grey, () => own)).toMatchObject({ state: 'read' });
  });

  it('places boxes without frames by the page alone, and judges no ink in them', async () => {
    const { grey, master } = await scanned(0);
    const own = layoutOf(master.identity);
    const open = (): SheetLayout | null => own && { ...own, boxes: own.boxes.map((box) => ({ ...box, isFramed: false })) };
    const [framed, drawn] = [read(grey), read(grey, open)];
    if (framed.state !== 'read' || drawn.state !== 'read') throw new Error('The sheet was not read.');
    for (const [index, box] of drawn.boxes.entries()) {
      expect(box).toMatchObject({ sidesConfirmed: null, ink: null });
      for (const [at, { x, y }] of box.corners.entries()) expect(Math.hypot(x - (framed.boxes[index]?.corners[at]?.x ?? 0), y - (framed.boxes[index]?.corners[at]?.y ?? 0))).toBeLessThan(4);
    }
  });
});
