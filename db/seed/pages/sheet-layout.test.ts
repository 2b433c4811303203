import { describe, expect, it } from 'vitest';
import { CORNER_MM, MID_EDGE_MM, PAGE_HEIGHT_MM, PAGE_WIDTH_MM, pageCount, sheetBoxes } from './sheet-layout';
import type { SheetBox } from './sheet-layout';
import { boxDisplacementMm, onScan, scanPose } from './scan';

const boxes = sheetBoxes(12);

/** Clear paper between two boxes; negative when they overlap. */
const gap = (a: SheetBox, b: SheetBox): number =>
  Math.max(b.x - (a.x + a.w), a.x - (b.x + b.w), b.y - (a.y + a.h), a.y - (b.y + b.h));

describe('the printed answer paper', () => {
  it('has an answer box and a working box for each of twelve items, six items a page', () => {
    expect(boxes).toHaveLength(24);
    expect(pageCount(12)).toBe(2);
    for (const use of ['answer', 'working'] as const) {
      const numbers = boxes.filter((box) => box.use === use).map((box) => box.itemNumber);
      expect(numbers).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]);
    }
    expect(boxes.filter((box) => box.pageNo === 1).map((box) => box.itemNumber)).not.toContain(7);
  });

  it('leaves at least 8 mm of clear paper between frames, and no boxes overlap', () => {
    for (const a of boxes) {
      for (const b of boxes) {
        if (a === b || a.pageNo !== b.pageNo) continue;
        expect(gap(a, b)).toBeGreaterThanOrEqual(a.use === 'answer' && b.use === 'answer' ? 8 : 2);
      }
    }
  });

  it('keeps boxes out of the corners, the middle of the edges and the punch zone', () => {
    const corner = { w: CORNER_MM, h: CORNER_MM };
    const [right, bottom] = [PAGE_WIDTH_MM - CORNER_MM, PAGE_HEIGHT_MM - CORNER_MM];
    const middle = { x: (PAGE_WIDTH_MM - MID_EDGE_MM) / 2, w: MID_EDGE_MM, h: CORNER_MM };
    const punch = { w: 16, y: PAGE_HEIGHT_MM / 2 - 44, h: 88 };
    const zones = [
      { x: 0, y: 0, ...corner },
      { x: right, y: 0, ...corner },
      { x: 0, y: bottom, ...corner },
      { x: right, y: bottom, ...corner },
      { y: 0, ...middle },
      { y: bottom, ...middle },
      { x: 0, ...punch },
      { x: PAGE_WIDTH_MM - punch.w, ...punch },
    ];
    for (const box of boxes) {
      for (const zone of zones) expect(gap(box, { ...box, ...zone })).toBeGreaterThanOrEqual(0);
    }
  });
});

describe('where a page lies on the scan', () => {
  it('moves no box by 2.5 mm or more, and turns some pages', () => {
    const poses = Array.from({ length: 2000 }, (_, index) => scanPose('demo', `W${index}`, 1));
    const farthest = Math.max(...poses.map((pose) => boxDisplacementMm(pose, 12)));
    expect(farthest).toBeLessThan(2.5);
    expect(farthest).toBeGreaterThan(1);
    for (const skewDegrees of [-0.8, 0.8]) {
      for (const [shiftXMm, shiftYMm] of [[0.3, 0.3], [-0.3, 0.3], [0.3, -0.3], [-0.3, -0.3]] as const) {
        expect(boxDisplacementMm({ skewDegrees, shiftXMm, shiftYMm }, 12)).toBeLessThan(2.5);
      }
    }
  });

  it('turns clockwise round the middle of the page', () => {
    const turned = onScan({ skewDegrees: 90, shiftXMm: 0, shiftYMm: 0 }, PAGE_WIDTH_MM / 2 + 10, PAGE_HEIGHT_MM / 2);
    expect(turned.x).toBeCloseTo(PAGE_WIDTH_MM / 2, 9);
    expect(turned.y).toBeCloseTo(PAGE_HEIGHT_MM / 2 + 10, 9);
  });
});
