import { describe, expect, it } from 'vitest';
import { graduationsOf, outlineOf, placesOn, stepsOf } from './scale-geometry';

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
});
