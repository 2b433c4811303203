import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { binomialAtMost } from './distributions';
import { atLeast, atMost, clopperPearson, errorStatement, sampleForZeroErrors, wilson } from './intervals';

describe('the Wilson interval', () => {
  // Cases of R. G. Newcombe, Statist. Med. 17, 857 (1998); printed limits from memory. Formula also in NIST/SEMATECH e-Handbook 7.2.4.1.
  it.each([
    [81, 263, 0.2553, 0.3662],
    [15, 148, 0.0624, 0.1605],
    [0, 20, 0, 0.1611],
    [1, 29, 0.0061, 0.1718],
  ])('of %i in %i is %f to %f', (count, n, low, high) => {
    const found = wilson(count, n);
    expect(found.low).toBeCloseTo(low, 4);
    expect(found.high).toBeCloseTo(high, 4);
  });

  it('stays within 0 and 1 and holds the share', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2000 }), fc.double({ min: 0, max: 1, noNaN: true }), (n, part) => {
        const count = Math.round(n * part);
        const { low, high } = wilson(count, n);
        expect(low).toBeGreaterThanOrEqual(0);
        expect(high).toBeLessThanOrEqual(1);
        expect(low).toBeLessThanOrEqual(count / n);
        expect(high).toBeGreaterThanOrEqual(count / n);
      }),
    );
  });
});

describe('exact bounds', () => {
  // 1 - 0.05^(1/n), the Clopper-Pearson bound with no errors.
  it.each([[60, 0.0487], [100, 0.0295], [300, 0.00994], [360, 0.00829], [720, 0.00415]])('0 wrong in %i is at most %f', (n, bound) => {
    expect(atMost(0, n)).toBeCloseTo(bound, bound < 0.01 ? 5 : 4);
    expect(atLeast(n, n)).toBeCloseTo(1 - bound, bound < 0.01 ? 5 : 4);
  });

  it('0 in 20 is 0 to 0.1684', () => {
    // 1 - 0.025^(1/20), by hand.
    expect(clopperPearson(0, 20).low).toBe(0);
    expect(clopperPearson(0, 20).high).toBeCloseTo(0.1684, 4);
  });

  it('81 in 263 is 0.2527 to 0.3676', () => {
    // Newcombe 1998, method 5, from memory.
    const { low, high } = clopperPearson(81, 263);
    expect(low).toBeCloseTo(0.2527, 4);
    expect(high).toBeCloseTo(0.3676, 4);
  });

  it('a bound is where the chance of so few is what the confidence leaves', () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 400 }), fc.integer({ min: 0, max: 399 }), (n, count) => {
        fc.pre(count < n);
        expect(binomialAtMost(count, n, atMost(count, n))).toBeCloseTo(0.05, 8);
      }),
    );
  });

  it('an interval covers the share it came from in at least 95 % of cases', () => {
    for (const p of [0.002, 0.01, 0.1, 0.5]) {
      const n = 60;
      let covered = 0;
      for (let count = 0; count <= n; count += 1) {
        const { low, high } = clopperPearson(count, n);
        if (low <= p && p <= high) covered += binomialAtMost(count, n, p) - (count === 0 ? 0 : binomialAtMost(count - 1, n, p));
      }
      expect(covered).toBeGreaterThanOrEqual(0.95);
    }
  });
});

it.each([[0.05, 59], [0.02, 149], [0.01, 299], [0.005, 598], [0.001, 2995]])('to stay below %f without an error takes %i', (share, n) => {
  // ceil(ln 0.05 / ln(1 - p)).
  expect(sampleForZeroErrors(share)).toBe(n);
  expect(atMost(0, n)).toBeLessThanOrEqual(share);
  expect(atMost(0, n - 1)).toBeGreaterThan(share);
});

describe('the sentence on errors', () => {
  it('says at most 0.83 % for none in 360', () => {
    expect(errorStatement(0, 360)).toEqual({ wrong: 0, reRead: 360, atMost: expect.closeTo(0.00829, 5) as number, percent: '0.83', confidence: 'one-sided 95 %' });
  });

  it('rounds up, and with nothing re-read says nothing', () => {
    expect([errorStatement(0, 60), errorStatement(3, 20), errorStatement(0, 0), errorStatement(0, 2995)].map(({ percent }) => percent)).toEqual(['4.9', '35', '100', '0.100']);
  });
});

it.each([[1, 0], [3, 2], [-1, 4], [0.5, 4]])('%f of %i is no share and is refused', (count, n) => expect(() => wilson(count, n)).toThrow(RangeError));
