import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { residualError, type Stratum } from './residual-error';

const one = (share: number, fullMark: number, reRead: number, wrong: number, item = '1'): Stratum => ({ item, share, fullMark, reRead, wrong });
const close = (value: number, digits = 5): number => expect.closeTo(value, digits) as number;

describe('one sampling share', () => {
  it('0 wrong in 360 of 3,600 is at most 0.83 %, one-sided 95 %, and never no errors', () => {
    // 1 - 0.05^(1/360) and 1 - 0.025^(1/360): Clopper and Pearson 1934 with no errors.
    const found = residualError([one(0.1, 3600, 360, 0)]);
    expect(found.measure).toBe('simple random sample');
    expect(found.statement?.percent).toBe('0.83');
    expect(found.asTyped).toEqual({ estimate: 0, low: 0, high: close(0.0101946), atMost: close(0.00829) });
    expect(found.left).toEqual(found.asTyped);
  });

  it('what was found wrong is put right and no longer left', () => {
    const { asTyped, left } = residualError([one(0.1, 1000, 100, 4)]);
    expect(asTyped.estimate).toBeCloseTo(0.04, 12);
    // 4 found of 40 expected: 36 of 1,000.
    expect(left.estimate).toBeCloseTo(0.036, 12);
    expect(left.atMost).toBeCloseTo(asTyped.atMost - 0.004, 12);
  });

  it('items of one share are one sample, however chance spread it over them', () => {
    const spread = residualError([one(0.1, 103, 16, 0), one(0.1, 97, 4, 1, '2'), one(0.1, 20, 0, 0, '3')]);
    expect(spread).toEqual(residualError([one(0.1, 220, 20, 1)]));
  });

  it('when all was re-read nothing is left', () => expect(residualError([one(1, 40, 40, 3)]).left).toEqual({ estimate: 0, low: 0, high: 0, atMost: 0 }));
});

describe('shares that differ by item', () => {
  it('errors weigh as the readings they stand for', () => {
    // By hand: 0.9 x 1/90 + 0.1 x 2/100 = 0.012.
    const found = residualError([one(0.1, 900, 90, 1), one(1, 100, 100, 2, '2')]);
    expect(found.measure).toBe('stratified by share');
    expect(found.asTyped.estimate).toBeCloseTo(0.012, 12);
    expect(found.statement).toBeNull();
  });

  it('with equal weights the limits are the exact ones of a Poisson count', () => {
    // F. Garwood, Biometrika 28, 437 (1936), from memory: 3 gives 0.619 to 8.767, 10 gives 4.795 to 18.39. Two items of one weight
    // beside a third that is not measured, so that the stratified way is taken.
    for (const [count, low, high] of [[3, 0.619, 8.767], [10, 4.795, 18.39]] as const) {
      const { asTyped } = residualError([one(0.1, 5000, 500, count - 1), one(0.1001, 5000, 500, 1, '2'), one(0, 10, 0, 0, '3')]);
      expect(1000 * asTyped.low).toBeCloseTo(low, 2);
      expect(1000 * asTyped.high).toBeCloseTo(high, 2);
    }
  });

  it('without an error the bound is that of the item with the smallest share', () => {
    // -ln 0.05 = 2.9957 errors at most, each standing for 0.5/50 of the readings.
    const { asTyped } = residualError([one(0.1, 500, 50, 0), one(0.5, 500, 250, 0, '2')]);
    expect(asTyped).toMatchObject({ estimate: 0, low: 0, atMost: close(2.995732 * 0.01, 5) });
  });

  it('items without a re-read value are named', () => {
    expect(residualError([one(0.1, 500, 50, 0), one(0, 200, 0, 0, 'item 2'), one(0, 0, 0, 0, 'item 3')]).unmeasured).toEqual(['item 2']);
  });
});

it('where nothing was re-read nothing is known', () => {
  expect(residualError([one(0.1, 500, 0, 0)])).toMatchObject({ measure: 'nothing re-read', statement: null, left: { estimate: 0, low: 0, high: 1, atMost: 1 } });
  expect(residualError([]).measure).toBe('nothing re-read');
});

it('an interval holds its estimate, lies within 0 and 1, and does not depend on the order of items', () => {
  const stratum = fc.tuple(fc.constantFrom(0.05, 0.1, 0.2), fc.integer({ min: 1, max: 300 }), fc.integer({ min: 0, max: 300 }), fc.integer({ min: 0, max: 6 })).map(([share, fullMark, reRead, wrong]) => one(share, fullMark, Math.min(fullMark, reRead), Math.min(fullMark, reRead, wrong)));
  fc.assert(
    fc.property(fc.array(stratum, { minLength: 1, maxLength: 8 }), (strata) => {
      const found = residualError(strata);
      for (const { estimate, low, high, atMost: bound } of [found.asTyped, found.left]) {
        expect(low).toBeGreaterThanOrEqual(0);
        expect(low).toBeLessThanOrEqual(estimate + 1e-12);
        expect(high).toBeGreaterThanOrEqual(estimate - 1e-12);
        expect(high).toBeGreaterThanOrEqual(Math.min(bound, estimate) - 1e-12);
        expect(high).toBeLessThanOrEqual(1);
      }
      const turned = residualError([...strata].reverse());
      expect(turned.measure).toBe(found.measure);
      expect(turned.left.atMost).toBeCloseTo(found.left.atMost, 10);
    }),
    { numRuns: 200 },
  );
});
