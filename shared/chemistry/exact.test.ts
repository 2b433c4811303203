import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { absolute, add, compare, decimal, decimalsForFigures, divide, equals, exactDecimals, fromFractionText, multiply, negate, ratio, squareRoot, subtract, toApproximate, toDecimals, toFigures, toFractionText, whole } from './exact';

describe('exact fractions', () => {
  it('reduce and keep the denominator positive', () => {
    expect(ratio(55n, 10n)).toEqual({ n: 11n, d: 2n });
    expect(ratio(3n, -6n)).toEqual({ n: -1n, d: 2n });
    expect(() => ratio(1n, 0n)).toThrow(RangeError);
  });

  it('add up what binary floats do not', () => {
    expect(equals(add(decimal('0.1'), decimal('0.2')), decimal('0.3'))).toBe(true);
    expect(equals(multiply(whole(7), decimal('0.35')), decimal('2.45'))).toBe(true);
    expect(equals(divide(decimal('1'), decimal('0.25')), whole(4))).toBe(true);
    expect(equals(absolute(negate(decimal('1.5'))), decimal('1.5'))).toBe(true);
    expect(compare(decimal('6.10'), decimal('6.1'))).toBe(0);
    expect(toApproximate(decimal('6.125'))).toBe(6.125);
  });

  it('come back from the stored form', () => {
    fc.assert(
      fc.property(fc.bigInt({ min: -10_000n, max: 10_000n }), fc.bigInt({ min: 1n, max: 10_000n }), (n, d) => {
        const value = ratio(n, d);
        expect(equals(fromFractionText(toFractionText(value)), value)).toBe(true);
        expect(equals(subtract(add(value, value), value), value)).toBe(true);
      }),
    );
  });

  // ISO 80000-1:2009, annex B, rule B: the greater magnitude on a tie (from memory).
  it('print half away from zero', () => {
    expect(toDecimals(decimal('4.55'), 1)).toBe('4.6');
    expect(toDecimals(decimal('-4.55'), 1)).toBe('-4.6');
    expect(toDecimals(decimal('0.04'), 1)).toBe('0.0');
    expect(toDecimals(decimal('-0.04'), 1)).toBe('0.0');
    expect(toDecimals(decimal('9.999'), 2)).toBe('10.00');
    expect(toDecimals(whole(3), 0)).toBe('3');
  });

  it('know how many decimals they need', () => {
    expect(exactDecimals(decimal('3.750'))).toBe(2);
    expect(exactDecimals(ratio(1n, 3n))).toBeNull();
    expect(exactDecimals(whole(4))).toBe(0);
  });

  it('print significant figures', () => {
    const cases = [['9.9996', '10.00'], ['9.9994', '9.999'], ['54321', '54320'], ['99996', '100000'], ['-0.0123456', '-0.01235'], ['13.605', '13.61'], ['4', '4.000'], ['0', '0.000']];
    for (const [value = '', text] of cases) expect(toFigures(decimal(value), 4)).toBe(text);
    expect(decimalsForFigures(decimal('54321'), 4)).toBe(-1);
    expect(decimalsForFigures(decimal('13.605'), 4)).toBe(2);
  });

  it('have square roots, exact where there is one', () => {
    expect(squareRoot(ratio(9n, 4n))).toEqual(ratio(3n, 2n));
    expect(squareRoot(whole(0))).toEqual(whole(0));
    // The square root of 2 to 30 decimals, from memory.
    expect(toDecimals(squareRoot(whole(2)), 29)).toBe('1.41421356237309504880168872421');
    expect(() => squareRoot(whole(-1))).toThrow(RangeError);
    fc.assert(
      fc.property(fc.bigInt({ min: 1n, max: 10n ** 20n }), fc.bigInt({ min: 1n, max: 10n ** 12n }), (n, d) => {
        const value = ratio(n, d);
        const root = squareRoot(value);
        const next = add(root, ratio(1n, 10n ** 30n));
        expect(compare(multiply(root, root), value)).toBeLessThanOrEqual(0);
        expect(compare(multiply(next, next), value)).toBe(1);
      }),
    );
  });

  describe('edge cases', () => {
    it('a literal of a table may carry sign and power of ten, and nothing else', () => {
      expect(equals(decimal('-0.35'), ratio(-7n, 20n))).toBe(true);
      expect(equals(decimal('1.2e-11'), ratio(12n, 10n ** 12n))).toBe(true);
      for (const text of ['', '.5', '6.', '1,5', '0x1', ' 1']) expect(() => decimal(text)).toThrow(RangeError);
    });
  });
});
