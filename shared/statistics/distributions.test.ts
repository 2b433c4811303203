import fc from 'fast-check';
import { expect, it } from 'vitest';
import { binomialAtMost, binomialProbability, gammaBelow, gammaQuantile, logGamma, whereItReaches } from './distributions';

it('binomial terms and sums are those worked by hand', () => {
  expect(binomialProbability(1, 2, 0.5)).toBeCloseTo(0.5, 12);
  expect(binomialAtMost(0, 360, 1 - 0.05 ** (1 / 360))).toBeCloseTo(0.05, 12);
  // 10 choose 0 to 2 over 1,024: (1 + 10 + 45)/1024.
  expect(binomialAtMost(2, 10, 0.5)).toBeCloseTo(56 / 1024, 12);
  expect([binomialProbability(0, 9, 0), binomialProbability(1, 9, 0), binomialProbability(9, 9, 1), binomialAtMost(9, 9, 0.3)]).toEqual([1, 0, 1, 1]);
});

it('the logarithm of the gamma function is that of a factorial at whole numbers', () => {
  expect(logGamma(5)).toBeCloseTo(Math.log(24), 12);
  expect(logGamma(0.5)).toBeCloseTo(Math.log(Math.sqrt(Math.PI)), 12);
});

it('the gamma distribution of shape 1 is the exponential one', () => {
  for (const x of [0.1, 1, 3, 20]) expect(gammaBelow(1, x)).toBeCloseTo(1 - Math.exp(-x), 12);
  expect(gammaQuantile(0.95, 1)).toBeCloseTo(Math.log(20), 10);
  expect([gammaBelow(2, -1), gammaBelow(2, 1e6)]).toEqual([0, 1]);
});

it('a quantile has its share below it', () => {
  fc.assert(
    fc.property(fc.double({ min: 0.01, max: 0.99, noNaN: true }), fc.double({ min: 0.5, max: 400, noNaN: true }), (share, shape) => {
      expect(gammaBelow(shape, gammaQuantile(share, shape))).toBeCloseTo(share, 8);
    }),
  );
});

it('a level is found where it is reached', () => expect(whereItReaches(2, 0, 2, (x) => x * x)).toBeCloseTo(Math.SQRT2, 12));
