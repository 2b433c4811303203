import { describe, expect, it } from 'vitest';
import { roundTotal } from './totals';

const marks = (count: number): number => Math.round(count * 1200);

describe('a total', () => {
  // Halves up, as sums of marks are rounded: common practice, no source.
  it.each([
    [14.5, 15], [14.49, 14], [14.25, 14], [14.75, 15], [15, 15], [0, 0], [0.5, 1],
  ])('of %d marks is %d in whole marks', (total, rounded) => expect(roundTotal(marks(total), 'whole')).toBe(marks(rounded)));

  it.each([
    [14.25, 14.5], [14.24, 14], [14.74, 14.5], [14.75, 15], [14.5, 14.5],
  ])('of %d marks is %d in half marks', (total, rounded) => expect(roundTotal(marks(total), 'half')).toBe(marks(rounded)));

  it('stays as it is where nothing is rounded', () => expect([1, 401, 17_399].map((grains) => roundTotal(grains, 'none'))).toEqual([1, 401, 17_399]));
});
