import { describe, expect, it } from 'vitest';
import { tubeShape } from './tube-geometry';

describe('a tube', () => {
  it('is filled to exactly the graduation of the marks given', () => {
    const shape = tubeShape(38, 3);
    const two = shape.graduations[1];
    expect(two?.share).toBeCloseTo(2 / 3);
    expect(two?.y).toBe(shape.level(2 / 3));
  });

  it('rises evenly from the floor to below the mouth', () => {
    const shape = tubeShape(96, 4);
    expect(shape.level(0)).toBe(shape.floor);
    expect(shape.level(1)).toBeGreaterThan(shape.mouth);
    expect(shape.level(0.5)).toBeCloseTo((shape.level(0) + shape.level(1)) / 2);
  });

  it('has one graduation a mark up to five', () => {
    expect(tubeShape(26, 3).graduations).toHaveLength(3);
    expect(tubeShape(26, 5).graduations).toHaveLength(5);
  });

  it('shows half and full on a small tube of many marks', () => {
    expect(tubeShape(26, 20).graduations.map(({ share }) => share)).toEqual([0.5, 1]);
  });

  it('makes every fifth long on a large tube of many marks', () => {
    const lengths = tubeShape(96, 20).graduations.map(({ length }) => length);
    const longest = Math.max(...lengths);
    expect(lengths.filter((length) => length === longest)).toHaveLength(4);
  });

  describe('edge cases', () => {
    it('has no graduations where nothing can be given', () => {
      expect(tubeShape(26, 0).graduations).toEqual([]);
    });

    it('leaves room for a stopper', () => {
      expect(tubeShape(38, 3, true).mouth).toBeGreaterThan(tubeShape(38, 3).mouth);
    });
  });
});
