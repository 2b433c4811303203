import { describe, expect, it } from 'vitest';
import { valuesThatCount } from './qti-values';

const plain = { downToDecimals: 1, truncation: false };

describe('the numbers that count as a value', () => {
  it('lists the value, and its roundings where they are other numbers', () => {
    expect(valuesThatCount({ value: '61/10', decimals: 2 }, plain)).toEqual(['6.10']);
    // Both neighbours of a tie count: ISO 80000-1, annex B, rules A and B.
    expect(valuesThatCount({ value: '91/20', decimals: 2 }, plain)).toEqual(['4.55', '4.5', '4.6']);
    expect(valuesThatCount({ value: '91/20', decimals: 2 }, { downToDecimals: null, truncation: true })).toEqual(['4.55']);
  });

  it('cuts off where that is allowed', () => {
    expect(valuesThatCount({ value: '457/100', decimals: 2 }, { downToDecimals: 1, truncation: true })).toEqual(['4.57', '4.6', '4.5']);
  });

  it('writes a value that no decimal says to its figures, to fewer where they count, and to four more', () => {
    expect(valuesThatCount({ value: '200/3', decimals: 2, figures: 4 }, { downToDecimals: null, downToFigures: 3, truncation: false })).toEqual(['66.666667', '66.66667', '66.6667', '66.667', '66.67', '66.7']);
  });

  it('rounds to tens where the figures end before the point', () => {
    expect(valuesThatCount({ value: '2000/3', decimals: 0, figures: 3 }, { downToDecimals: null, downToFigures: 2, truncation: false })).toEqual(['666.6667', '666.667', '666.67', '666.7', '667', '670']);
  });
});
