import { describe, expect, it } from 'vitest';
import { beyond, graduationsOf, hangColumns, layOutLabels, outlineOf, placesOn, stepsOf } from './scale-geometry';

describe('the scale', () => {
  const limits = { lo: 5, hi: 7, major: 0.5, minor: 0.1 };

  it('has a graduation at every minor step, long at the major ones', () => {
    const graduations = graduationsOf(limits);
    expect(graduations).toHaveLength(21);
    expect(graduations.filter(({ isMajor }) => isMajor).map(({ at }) => at.toFixed(1))).toEqual(['5.0', '5.5', '6.0', '6.5', '7.0']);
  });

  it('puts values between its ends', () => {
    const place = placesOn(limits, 220, 10);
    expect([place(5), place(6), place(7)]).toEqual([10, 110, 210]);
  });

  it('draws bands as steps, the widest first and the narrow ones wide enough to see', () => {
    const place = placesOn(limits, 220, 10);
    const steps = stepsOf([{ name: 'near', from: 6.09, to: 6.11, marks: 3 }, { name: 'wide', from: 5.9, to: 6.3, marks: 1 }], place, 100, 20);
    expect(steps.map(({ band, top }) => [band.name, top])).toEqual([['wide', 80], ['near', 40]]);
    const near = steps[1];
    expect(near && near.right - near.left).toBe(5);
    expect(outlineOf(steps, 100)).toMatch(/^M100,100 V80 H\S+ V40 H\S+ V80 H140 V100$/);
  });

  it('draws nothing for limits without sense', () => {
    expect(graduationsOf({ lo: 0, hi: 1, major: 0, minor: 0 })).toEqual([]);
    expect(outlineOf([], 100)).toBe('');
  });

  it('hangs columns as long as their counts and writes a count where it is large or has room', () => {
    const place = placesOn({ lo: 5, hi: 7 }, 220, 10);
    const hung = hangColumns([{ at: 6.1, count: 71 }, { at: 6.18, count: 3 }, { at: 5.75, count: 31 }, { at: 6.4, count: 2 }], place, 71);
    expect(hung.map(({ count, length, isCountShown }) => [count, length, isCountShown])).toEqual([
      [31, 31, true],
      [71, 71, true],
      [3, 6, false],
      [2, 6, true],
    ]);
  });

  it('counts what lies beyond its ends', () => {
    const { low, high, within } = beyond([{ at: 4, count: 2 }, { at: 6, count: 1 }, { at: 8, count: 9 }, { at: 17, count: 1 }], { lo: 5, hi: 7 });
    expect([low, high, within.length]).toEqual([2, 10, 1]);
  });

  it('puts labels that would touch into rows above each other', () => {
    const laid = layOutLabels([{ at: 50, width: 80 }, { at: 100, width: 80 }, { at: 160, width: 80 }, { at: 300, width: 80 }], { from: 0, to: 320 });
    expect(laid.map(({ row, anchor }) => [row, anchor])).toEqual([
      [0, 'middle'],
      [0, 'start'],
      [1, 'middle'],
      [0, 'end'],
    ]);
  });
});
