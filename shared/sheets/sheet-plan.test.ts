import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clearBetweenFramesMm, clearOfTextMm, codePlaces, frameLineMm, grown, keepOutZones, overlap, paperSizes, quietZoneMm, type PaperSize, type Rect } from './geometry';
import { labelSizeMm, mostBoxesOfPage, planSheets, stemSizeMm, type PlannedPage, type SheetItem } from './sheet-plan';

const papers = Object.keys(paperSizes) as PaperSize[];
const itemsOf = (lineCounts: readonly number[]): SheetItem[] =>
  lineCounts.map((lines, index) => ({ number: index + 1, marks: '2', lines: Array.from({ length: lines }, () => [{ fount: 'text' as const, sizeMm: stemSizeMm, text: 'words', x: 0, drop: 0 }]) }));
const planned = (lineCounts: readonly number[], paper: PaperSize) => {
  const result = planSheets(itemsOf(lineCounts), paper);
  if (!result.ok) throw new Error(result.reason);
  return result.plan;
};
const framed = ({ boxes }: PlannedPage) => boxes.filter(({ use }) => use !== 'working');
/** Clear paper between the lines of two frames, up-down or sideways. */
const clear = (a: Rect, b: Rect): number => Math.max(a.x - (b.x + b.w), b.x - (a.x + a.w), a.y - (b.y + b.h), b.y - (a.y + a.h)) - frameLineMm;

const anyPaper = fc.constantFrom(...papers);
const anyItems = fc.array(fc.integer({ min: 1, max: 9 }), { minLength: 1, maxLength: 40 });
const onEveryPage = (claim: (page: PlannedPage, paper: PaperSize) => void): void =>
  fc.assert(fc.property(anyItems, anyPaper, (lines, paper) => planned(lines, paper).pages.forEach((page) => claim(page, paper))));

describe('any paper of 1 to 40 items', () => {
  it('keeps boxes out of codes, quiet zones, punched holes and the edge that stays white', () => {
    onEveryPage(({ boxes }, paper) => {
      for (const box of boxes) for (const zone of keepOutZones(paperSizes[paper])) expect(overlap(grown(box, frameLineMm / 2), zone)).toBe(false);
    });
  });

  it('keeps boxes apart and frames 8 mm clear of one another', () => {
    onEveryPage((page) => {
      page.boxes.forEach((box, index) => page.boxes.slice(index + 1).forEach((other) => expect(overlap(box, other)).toBe(false)));
      const frames = framed(page);
      frames.forEach((box, index) => frames.slice(index + 1).forEach((other) => expect(clear(box, other)).toBeGreaterThanOrEqual(clearBetweenFramesMm - 1e-9)));
    });
  });

  it('keeps stems and labels 2 mm from every frame', () => {
    onEveryPage((page) => {
      for (const { item, stemY, labelY, isMoreWorking } of page.blocks) {
        // Rows of words over the whole width: from the ascent of the first line to the descent of the last.
        const rows = [{ top: stemY - stemSizeMm, bottom: stemY + (item.lines.length - 1) * 5.1 + 1 }, ...(isMoreWorking ? [] : [{ top: labelY - labelSizeMm * 0.75, bottom: labelY + 0.9 }])];
        for (const { y, h } of framed(page)) for (const { top, bottom } of rows) expect(Math.max(y - frameLineMm / 2 - bottom, top - (y + h + frameLineMm / 2))).toBeGreaterThanOrEqual(clearOfTextMm - 1e-9);
      }
    });
  });

  it('gives every item one answer box, in order, and page 1 the box for the candidate number', () => {
    fc.assert(
      fc.property(anyItems, anyPaper, (lines, paper) => {
        const { pages } = planned(lines, paper);
        const answers = pages.flatMap(({ boxes }) => boxes.filter(({ use }) => use === 'answer').map(({ item }) => item));
        expect(answers).toEqual(lines.map((_, index) => index + 1));
        expect(pages.map(({ boxes }) => boxes.filter(({ use }) => use === 'number').length)).toEqual(pages.map((_, index) => (index === 0 ? 1 : 0)));
        expect(pages.length % 2).toBe(0);
        for (const { boxes } of pages) {
          expect(boxes.length).toBeGreaterThan(0);
          expect(boxes.filter(({ use }) => use === 'answer').length).toBeLessThanOrEqual(mostBoxesOfPage);
          expect(boxes.every(({ w, h }) => w >= 5 && h >= 5)).toBe(true);
        }
      }),
    );
  });
});

it.each(papers)('puts twelve items with short stems on one sheet of %s, and thirteen on two', (paper) => {
  expect(planned(Array(12).fill(1), paper).pages).toHaveLength(2);
  expect(planned(Array(13).fill(1), paper).pages).toHaveLength(4);
});

it('turns over after six items, spreads few over both sides, and leaves a lone one the back to work on', () => {
  const items = (count: number) => planned(Array(count).fill(1), 'a4').pages.map(({ boxes }) => boxes.filter(({ use }) => use === 'answer').map(({ item }) => item));
  expect(items(8)).toEqual([[1, 2, 3, 4, 5, 6], [7, 8]]);
  expect(items(5)).toEqual([[1, 2, 3], [4, 5]]);
  expect(items(1)).toEqual([[1], []]);
  expect(planned([1], 'a4').pages[1]?.boxes).toMatchObject([{ use: 'working', item: 1 }]);
});

it('names the item whose stem leaves no room for an answer, and refuses a paper without items', () => {
  expect(planSheets(itemsOf([1, 60]), 'letter')).toEqual({ ok: false, item: 2, reason: 'stem-too-long' });
  expect(planSheets([], 'a4')).toEqual({ ok: false, item: null, reason: 'no-items' });
});

it.each(papers)('places six codes of 15 mm on %s, 9 mm from the edges', (paper) => {
  const { widthMm, heightMm } = paperSizes[paper];
  const places = codePlaces(paperSizes[paper]);
  expect(places.map(({ place }) => place)).toEqual([1, 2, 3, 4, 5, 6]);
  expect(places[0]).toMatchObject({ x: 9, y: 9, w: 15, h: 15 });
  expect(places[5]?.x).toBeCloseTo(widthMm - 24);
  expect(places[5]?.y).toBeCloseTo(heightMm - 24);
  expect((places[1]?.x ?? 0) + 7.5).toBeCloseTo(widthMm / 2);
  expect(quietZoneMm).toBeCloseTo(2.4);
});
