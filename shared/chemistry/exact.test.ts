import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { absolute, add, compare, decimal, divide, equals, exactDecimals, fromFractionText, multiply, negate, ratio, subtract, toApproximate, toDecimals, toFractionText, whole } from './exact';

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

  describe('edge cases', () => {
    it('a literal of a table may carry sign and power of ten, and nothing else', () => {
      expect(equals(decimal('-0.35'), ratio(-7n, 20n))).toBe(true);
      expect(equals(decimal('1.2e-11'), ratio(12n, 10n ** 12n))).toBe(true);
      for (const text of ['', '.5', '6.', '1,5', '0x1', ' 1']) expect(() => decimal(text)).toThrow(RangeError);
    });
  });
});
