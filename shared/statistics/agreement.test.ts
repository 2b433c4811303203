import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cohenKappa, kendallTauB, matchRate, tableOfPairs } from './agreement';

describe("Cohen's kappa", () => {
  it('is 0.654 with raw agreement 0.770 for the table of 1960', () => {
    // J. Cohen, Educ. Psychol. Meas. 20, 37 (1960).
    const { n, agreement, kappa } = cohenKappa([[25, 3, 5], [6, 32, 8], [1, 0, 20]]);
    expect(n).toBe(100);
    expect(agreement).toBeCloseTo(0.77, 12);
    expect(kappa).toBeCloseTo(0.654, 3);
  });

  it('weighted is 0.348, unweighted 0.492, for the table of 1968', () => {
    // J. Cohen, Psychol. Bull. 70, 213 (1968); cells from memory.
    const table = [[88, 14, 18], [10, 40, 10], [2, 6, 12]];
    const weights = [[0, 1, 3], [1, 0, 6], [3, 6, 0]];
    expect(cohenKappa(table, (row, column) => weights[row]?.[column] ?? 0).kappa).toBeCloseTo(0.348, 3);
    expect(cohenKappa(table).kappa).toBeCloseTo(0.492, 3);
  });

  it('comes with raw agreement, since 94.4 % of it can go with a kappa below 0', () => {
    // The paradox of high agreement on one category; table recomputed apart from this code.
    const { agreement, kappa, n } = cohenKappa([[118, 5], [2, 0]]);
    expect([n, Math.round(1000 * (agreement ?? 0)) / 10]).toEqual([125, 94.4]);
    expect(kappa).toBeCloseTo(-0.023, 3);
  });

  it('is not there when one category was used, or none', () => {
    expect(cohenKappa([[40, 0], [0, 0]])).toEqual({ n: 40, agreement: 1, kappa: null, state: 'one category' });
    expect(cohenKappa([])).toEqual({ n: 0, agreement: null, kappa: null, state: 'nothing' });
  });

  it('is the same when readers are exchanged, or categories renamed, and 1 for equal readings', () => {
    const category = fc.constantFrom('blank', "can't read", 'crossed out');
    fc.assert(
      fc.property(fc.array(fc.tuple(category, category), { minLength: 1, maxLength: 60 }), (pairs) => {
        const found = cohenKappa(tableOfPairs(pairs)).kappa;
        const exchanged = cohenKappa(tableOfPairs([...pairs].reverse().map(([first, second]) => [`${second} `, `${first} `]))).kappa;
        if (found === null) expect(exchanged).toBeNull();
        else expect(exchanged).toBeCloseTo(found, 10);
        const alone = cohenKappa(tableOfPairs(pairs.map(([first]) => [first, first])));
        expect(alone.kappa ?? 1).toBeCloseTo(1, 12);
      }),
    );
  });
});

it('pairs are counted in a table by order of appearance', () => expect(tableOfPairs([['a', 'a'], ['a', 'b']])).toEqual([[1, 1], [0, 0]]));

it('the rate of exact matches has its interval, and none without readings', () => {
  // Case 0 of 20: R. G. Newcombe, Statist. Med. 17, 857 (1998), limits from memory.
  expect(matchRate(0, 20)).toEqual({ n: 20, same: 0, rate: 0, interval: { low: 0, high: expect.closeTo(0.1611, 4) as number } });
  expect(matchRate(0, 0)).toEqual({ n: 0, same: 0, rate: null, interval: null });
});

describe("Kendall's tau-b", () => {
  // The documented example of SciPy's kendalltau.
  it('counts ties on each variable', () => expect(kendallTauB([12, 2, 1, 12, 2], [1, 4, 7, 1, 0])).toBeCloseTo(-0.47140452079103173, 14));

  it('is 1 for one order, -1 for the opposite, null without variation', () => {
    expect([kendallTauB([1, 2, 3], [4, 5, 9]), kendallTauB([1, 2, 3], [9, 5, 4]), kendallTauB([1, 1], [1, 2]), kendallTauB([], [])]).toEqual([1, -1, null, null]);
    expect(() => kendallTauB([1], [])).toThrow('differ in length');
  });

  it('lies between -1 and 1, does not depend on the order of pairs, and turns its sign with one variable', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.integer({ min: 0, max: 9 }), fc.integer({ min: 0, max: 9 })), { minLength: 2, maxLength: 30 }), (pairs) => {
        const tau = (list: typeof pairs, sign = 1) => kendallTauB(list.map(([x]) => x), list.map(([, y]) => sign * y));
        const found = tau(pairs);
        fc.pre(found !== null);
        expect(Math.abs(found)).toBeLessThanOrEqual(1 + 1e-12);
        expect(tau([...pairs].reverse())).toBeCloseTo(found, 12);
        expect(tau(pairs, -1)).toBeCloseTo(-found, 12);
      }),
    );
  });
});
