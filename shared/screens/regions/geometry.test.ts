import { describe, expect, it } from 'vitest';
import { dragged, drawn, freePlace, kept, moved, resized } from './geometry';

const page = { widthMm: 210, heightMm: 297 };
const box = { x: 100, y: 50, w: 60, h: 20 };

describe('boxes on a page', () => {
  it('move on a grid of half a millimetre and stop at the edges', () => {
    expect(moved(box, 10.2, -3.3, page)).toEqual({ x: 110, y: 46.5, w: 60, h: 20 });
    expect(moved(box, 500, 500, page)).toEqual({ x: 150, y: 277, w: 60, h: 20 });
    expect(moved(box, -500, -500, page)).toEqual({ x: 0, y: 0, w: 60, h: 20 });
  });

  it('are resized from a corner, with the opposite corner in place', () => {
    expect(resized(box, 'se', 10, 5, page)).toEqual({ x: 100, y: 50, w: 70, h: 25 });
    expect(resized(box, 'nw', -10, 5, page)).toEqual({ x: 90, y: 55, w: 70, h: 15 });
    expect(resized(box, 'e', 10, 99, page)).toEqual({ x: 100, y: 50, w: 70, h: 20 });
  });

  it('never turn inside out', () => {
    expect(resized(box, 'e', -500, 0, page)).toEqual({ x: 100, y: 50, w: 5, h: 20 });
    expect(resized(box, 'n', 0, 500, page)).toEqual({ x: 100, y: 65, w: 60, h: 5 });
  });

  it('are drawn in any direction, and not at all by a click', () => {
    expect(drawn({ x: 50, y: 60 }, { x: 20, y: 30 }, page)).toEqual({ x: 20, y: 30, w: 30, h: 30 });
    expect(drawn({ x: 50, y: 60 }, { x: 52, y: 61 }, page)).toBeNull();
    expect(drawn({ x: 200, y: 290 }, { x: 400, y: 400 }, page)).toEqual({ x: 200, y: 290, w: 10, h: 7 });
  });

  it('find a place below the others, or the top again where the page is full', () => {
    expect(freePlace([], page)).toEqual({ x: 128, y: 20, w: 62, h: 20 });
    expect(freePlace([{ x: 128, y: 20, w: 62, h: 20 }], page)).toMatchObject({ y: 46 });
    expect(freePlace([{ x: 128, y: 270, w: 62, h: 20 }], page)).toMatchObject({ y: 20 });
  });

  describe('edge cases', () => {
    it('keeps a box larger than the page on it', () => {
      expect(kept({ x: 5, y: 5, w: 999, h: 999 }, page)).toEqual({ x: 0, y: 0, w: 210, h: 297 });
    });

    it('moves and resizes through one door', () => {
      expect(dragged(box, 'move', 1, 0, page)).toEqual(moved(box, 1, 0, page));
      expect(dragged(box, 's', 0, 1, page)).toEqual(resized(box, 's', 0, 1, page));
    });
  });
});
