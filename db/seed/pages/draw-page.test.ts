import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { handFonts, handFrom } from '../truth/hands';
import { randomFrom } from '../truth/random';
import type { WrittenAnswer } from '../truth/written';
import { drawPage, drawSamplePage } from './draw-page';
import type { PageSpec } from './draw-page';
import { promptRuns } from './printed';
import type { PrintedSheet } from './printed';
import { SCAN_HEIGHT_PX, SCAN_WIDTH_PX, onScan, scanPose } from './scan';
import { CORNER_MM, MID_EDGE_MM, PAGE_HEIGHT_MM, PAGE_WIDTH_MM, placeOfItem } from './sheet-layout';

const sheet: PrintedSheet = {
  title: 'CHM 214, Paper 2',
  lines: ['University of Wrenmoor', 'spring sitting, 6 May'],
  items: Array.from({ length: 12 }, (_, index) => ({
    number: index + 1,
    marks: 2,
    prompt: "By Slater's rules, find Z_eff for a 2p electron of the Mg²⁺ ion, to two decimals.",
  })),
};

const working = ['6 x 0.35 = 2.1', '17 - 10.9 = 6.10'];
const answers: readonly WrittenAnswer[] = [
  { itemNumber: 1, kind: 'value', text: '6.10', working },
  { itemNumber: 2, kind: 'value', text: '4.10', unclear: ['4.10', '4.70'], working },
  { itemNumber: 3, kind: 'two-answers', text: '4,55', second: '4.95', working: [] },
  { itemNumber: 4, kind: 'crossed-out', text: '5.20', working },
  { itemNumber: 5, kind: 'value', text: '2.20', struck: '2.85', working },
  { itemNumber: 6, kind: 'blank', text: '', working: [] },
];

const spec = (over: Partial<PageSpec> = {}): PageSpec => ({
  seed: 'test',
  sheet,
  pageNo: 1,
  candidate: 'W4071',
  hand: { ...handFrom(randomFrom('test', 'hand')), font: 'kalam' },
  answers,
  ...over,
});

const digest = (picture: Buffer): string => createHash('sha256').update(picture).digest('hex');
const pxPerMm = SCAN_WIDTH_PX / PAGE_WIDTH_MM;

async function greyOf(picture: Buffer): Promise<(x: number, y: number) => number> {
  const { data, info } = await sharp(picture).extractChannel(1).raw().toBuffer({ resolveWithObject: true });
  return (x, y) => data[Math.floor(y * pxPerMm) * info.width + Math.floor(x * pxPerMm)] ?? 0;
}

/** The darkest dot of a rectangle in mm. */
function darkest(grey: (x: number, y: number) => number, x: number, y: number, w: number, h: number): number {
  let least = 255;
  for (let down = 0; down < h; down += 0.15) {
    for (let across = 0; across < w; across += 0.15) least = Math.min(least, grey(x + across, y + down));
  }
  return least;
}

const PAPER = 205;
const INK = 150;

describe('a drawn page', () => {
  it('is a JPEG of A4 at 150 dots to the inch and under 250 kB', async () => {
    const picture = await drawPage(spec());
    const { format, width, height, density } = await sharp(picture).metadata();
    expect({ format, width, height, density }).toEqual({ format: 'jpeg', width: SCAN_WIDTH_PX, height: SCAN_HEIGHT_PX, density: 150 });
    expect(picture.length).toBeLessThan(250_000);
  });

  it('is the same picture for the same seed, and another for another candidate', async () => {
    const [first, again, other] = [await drawPage(spec()), await drawPage(spec()), await drawPage(spec({ candidate: 'W4072' }))];
    expect(digest(again)).toBe(digest(first));
    expect(digest(other)).not.toBe(digest(first));
  });

  it('has ink in every box that was written in and none in a blank one', async () => {
    const grey = await greyOf(await drawPage(spec()));
    const pose = scanPose('test', 'W4071', 1);
    for (const { itemNumber, kind } of answers) {
      const { answer } = placeOfItem(itemNumber);
      const middle = onScan(pose, answer.x + answer.w / 2, answer.y + answer.h / 2);
      const [w, h] = [answer.w - 4, answer.h - 4];
      const least = darkest(grey, middle.x - w / 2, middle.y - h / 2, w, h);
      if (kind === 'blank') expect(least).toBeGreaterThan(PAPER);
      else expect(least).toBeLessThan(INK);
    }
  });

  it('lies where its pose says: the frames are found there', async () => {
    const grey = await greyOf(await drawPage(spec()));
    const pose = scanPose('test', 'W4071', 1);
    for (const itemNumber of [1, 6]) {
      const { answer } = placeOfItem(itemNumber);
      const edges = [
        [answer.x, answer.y + 5],
        [answer.x + answer.w, answer.y + 5],
        [answer.x + 9, answer.y],
        [answer.x + 9, answer.y + answer.h],
      ] as const;
      for (const [x, y] of edges) {
        const there = onScan(pose, x, y);
        expect(darkest(grey, there.x - 0.45, there.y - 0.45, 0.9, 0.9)).toBeLessThan(INK);
      }
    }
  });

  it('can be written in every hand', async () => {
    for (const font of handFonts) {
      const hand = { ...spec().hand, font };
      const elsewhere: WrittenAnswer = { itemNumber: 1, kind: 'elsewhere', text: 'see over', working: ['26x1 + 8x0.85 - 2 = .5'] };
      const muddled: WrittenAnswer = { itemNumber: 2, kind: 'cannot-read', text: '-9.47', working: [] };
      await expect(drawPage(spec({ hand, answers: [elsewhere, muddled] }))).resolves.toBeInstanceOf(Buffer);
    }
  });
});

describe('the page as printed', () => {
  it('leaves the corners and the middle of the top and bottom edge bare for codes', async () => {
    for (const pageNo of [1, 2]) {
      const grey = await greyOf(await drawSamplePage(sheet, pageNo));
      const [right, bottom, edge] = [PAGE_WIDTH_MM - CORNER_MM, PAGE_HEIGHT_MM - CORNER_MM, 2];
      for (const x of [edge, right]) for (const y of [edge, bottom]) {
        expect(darkest(grey, x, y, CORNER_MM - edge, CORNER_MM - edge)).toBeGreaterThan(PAPER);
      }
      for (const y of [edge, bottom]) {
        expect(darkest(grey, (PAGE_WIDTH_MM - MID_EDGE_MM) / 2, y, MID_EDGE_MM, CORNER_MM - edge)).toBeGreaterThan(PAPER);
      }
    }
  });

  it('has no print within 2 mm of a frame, inside or outside', async () => {
    const grey = await greyOf(await drawSamplePage(sheet, 1));
    for (const itemNumber of [1, 2, 3, 4, 5, 6]) {
      const { x, y, w, h } = placeOfItem(itemNumber).answer;
      const [from, to] = [0.8, 2];
      const strips = [
        [x - to, y - to, w + 2 * to, to - from],
        [x - to, y + h + from, w + 2 * to, to - from],
        [x - to, y - to, to - from, h + 2 * to],
        [x + w + from, y - to, to - from, h + 2 * to],
        [x + from, y + from, w - 2 * from, h - 2 * from],
      ] as const;
      for (const strip of strips) expect(darkest(grey, ...strip)).toBeGreaterThan(PAPER);
    }
  });

  it('sets quantities, subshells and charges as a printer would', () => {
    const runs = promptRuns('Find Z_eff for a 2p electron of Mg²⁺.');
    expect(runs.map((run) => run.text)).toEqual(['Find ', 'Z', 'eff', ' for a ', '2', 'p', ' electron of Mg', '2+', '.']);
    expect(runs.filter((run) => run.font === 'serif-italic').map((run) => run.text)).toEqual(['Z', 'p']);
    expect(runs[7]?.rise).toBeGreaterThan(0);
  });
});
