import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { correlation, hasVariation, moments, total } from './moments';

const relative = (got: number | null | undefined, due: number): number => Math.abs(((got ?? NaN) - due) / due);

describe('mean and standard deviation', () => {
  // NIST StRD, univariate summary statistics, data set NumAcc1.
  it('are right for three large numbers close together', () => {
    const found = moments([10000001, 10000003, 10000002]);
    expect(relative(found?.mean, 10000002)).toBeLessThan(1e-12);
    expect(relative(found?.sd, 1)).toBeLessThan(1e-8);
  });

  // NIST StRD, data set NumAcc4: 1,001 values.
  it('are right for a thousand large numbers that differ in the last figure', () => {
    const values = [10000000.2, ...Array.from({ length: 500 }, () => [10000000.1, 10000000.3]).flat()];
    expect(values).toHaveLength(1001);
    const found = moments(values);
    expect(relative(found?.mean, 10000000.2)).toBeLessThan(1e-12);
    expect(relative(found?.sd, 0.1)).toBeLessThan(1e-8);
  });

  it('of nothing are nothing; one value has a mean and no deviation', () => {
    expect(moments([])).toBeNull();
    expect(moments([4])).toEqual({ n: 1, mean: 4, variance: null, sd: null });
  });

  it('never have a negative variance, do not depend on the order, and follow a shift', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -24000, max: 24000 }), { minLength: 2, maxLength: 60 }), fc.integer({ min: -1e6, max: 1e6 }), (values, shift) => {
        const found = moments(values);
        const moved = moments([...values].reverse().map((value) => value + shift));
        expect(found?.variance).toBeGreaterThanOrEqual(0);
        expect(moved?.sd).toBeCloseTo(found?.sd ?? NaN, 6);
        expect(moved?.mean).toBeCloseTo((found?.mean ?? NaN) + shift, 6);
      }),
    );
  });
});

it('values vary when two of them differ', () => {
  expect([hasVariation([2, 2, 3]), hasVariation([2, 2]), hasVariation([])]).toEqual([true, false, false]);
});

it('a sum keeps what adding in turn would lose', () => {
  expect(total([1, 1e100, 1, -1e100])).toBe(2);
});

describe('correlation', () => {
  it('is 1 for a column and its double, null without variation, refused for columns of two lengths', () => {
    expect(correlation([1, 2, 3], [2, 4, 6])).toBeCloseTo(1, 12);
    expect(correlation([1, 1, 1], [2, 4, 6])).toBeNull();
    expect(correlation([], [])).toBeNull();
    expect(() => correlation([1], [1, 2])).toThrow('differ in length');
  });

  it('lies between -1 and 1 and is the same both ways', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.integer({ min: 0, max: 3600 }), fc.integer({ min: 0, max: 3600 })), { minLength: 2, maxLength: 40 }), (pairs) => {
        const xs = pairs.map(([x]) => x);
        const ys = pairs.map(([, y]) => y);
        const found = correlation(xs, ys);
        fc.pre(found !== null);
        expect(Math.abs(found)).toBeLessThanOrEqual(1);
        expect(correlation(ys, xs)).toBeCloseTo(found, 10);
      }),
    );
  });
});
