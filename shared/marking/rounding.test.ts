import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compare, decimal, negate, toDecimals } from '../chemistry/exact';
import { isRounding, leadingExponent, roundings, truncation } from './rounding';

const both = (text: string, places: number) => roundings(decimal(text), places).map((value) => toDecimals(value, places));

describe('rounding', () => {
  it('takes both neighbours of a tie: what ISO 80000-1 rules A (to even) and B (away from zero) give is among them', () => {
    expect(both('12.25', 1)).toEqual(['12.2', '12.3']);
    expect(both('12.35', 1)).toEqual(['12.3', '12.4']);
    expect(both('4.55', 1)).toEqual(['4.5', '4.6']);
    expect(both('2.675', 2)).toEqual(['2.67', '2.68']);
    expect(both('-4.55', 1)).toEqual(['-4.6', '-4.5']);
  });

  it('takes one value where there is no tie', () => {
    expect(both('3.72', 1)).toEqual(['3.7']);
    expect(both('3.78', 1)).toEqual(['3.8']);
  });

  it('cuts off toward zero only where that is allowed', () => {
    expect([toDecimals(truncation(decimal('4.57'), 1), 1), toDecimals(truncation(decimal('-4.57'), 1), 1)]).toEqual(['4.5', '-4.5']);
    expect(isRounding(decimal('4.5'), decimal('4.57'), 1, true)).toBe(true);
    expect(isRounding(decimal('4.5'), decimal('4.57'), 1, false)).toBe(false);
  });

  it('finds the power of ten of the first figure', () => {
    expect(['6.10', '0.01', '10.9', '999', '0.0999'].map((text) => leadingExponent(decimal(text)))).toEqual([0, -2, 1, 2, -2]);
  });

  it('mirrors for negatives and lies within half a unit, for every value', () => {
    fc.assert(
      fc.property(fc.integer({ min: -99_999, max: 99_999 }), fc.integer({ min: 0, max: 2 }), (thousandths, places) => {
        const value = decimal(`${thousandths < 0 ? '-' : ''}${Math.floor(Math.abs(thousandths) / 1000)}.${String(Math.abs(thousandths) % 1000).padStart(3, '0')}`);
        const here = roundings(value, places);
        const mirrored = roundings(negate(value), places).map(negate).reverse();
        return here.length === mirrored.length && here.every((one, index) => compare(one, mirrored[index] ?? one) === 0);
      }),
    );
  });
});
