import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ratio, toDecimals, toFractionText } from '../chemistry/exact';
import { scaleOf } from './scale';
import { defaultScheme } from './scheme-checks';
import type { ItemScheme } from './scheme';

const asked = { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'zeff', convention: 'slater' } as const;
const schemeOf = (value: string, text: string, decimals = 2, changes: Partial<ItemScheme> = {}): ItemScheme => ({ ...defaultScheme(asked, { value, text, decimals }, 3600), ...changes });

/** Round 6.10 of chlorine, with a value of every kind; where each stands, by hand. */
const full = scaleOf(
  schemeOf('61/10', '6.10', 2, {
    bands: [{ name: 'near', kind: 'absolute', width: '1/2', grains: 1200 }],
    alternatives: [{ name: 'core count', value: '7', text: '7.00', decimals: 2, grains: 600, reason: '' }],
    slips: [{ id: 'counts-itself', letter: 'a', name: 'counts the electron itself', value: '23/4', text: '5.75', grains: 300, feedback: '' }],
  }),
);

describe('what the scale draws', () => {
  it('is the key, bands, alternatives and slips at their places, with their marks', () => {
    expect(full).toMatchObject({
      maxGrains: 3600,
      key: { at: 6.1, label: '6.10' },
      bands: [{ name: 'near', from: 5.6, to: 6.6, grains: 1200 }],
      alternatives: [{ at: 7, label: '7.00', grains: 600 }],
      slips: [{ at: 5.75, letter: 'a', name: 'counts the electron itself', text: '5.75', grains: 300 }],
      roundings: [],
    });
    expect(scaleOf(schemeOf('61/10', '6.10')).slips).toEqual([]);
  });

  it('names the key with its decimals, or as many as it needs, up to six', () => {
    const label = (value: string, decimals: number) => scaleOf(schemeOf(value, '', decimals)).key.label;
    expect([label('61/10', 2), label('61161/10000', 2), label('1/3', 2), label('12345678/10000000', 2), label('3', 0)]).toEqual(['6.10', '6.1161', '0.33', '1.234568', '3']);
  });

  it('has the accepted roundings apart from the key, both neighbours of a tie', () => {
    const roundings = (value: string, downToDecimals: number | null, decimals = 2) => scaleOf(schemeOf(value, '', decimals, { roundings: { downToDecimals, truncation: false } })).roundings;
    expect(roundings('15/4', 1)).toEqual([{ at: 3.7, label: '3.7' }, { at: 3.8, label: '3.8' }]);
    expect(roundings('15/4', 0)).toEqual([{ at: 4, label: '4' }, { at: 3.7, label: '3.7' }, { at: 3.8, label: '3.8' }]);
    expect(roundings('61/10', 1)).toEqual([]);
    expect(roundings('15/4', null)).toEqual([]);
    // 4.0 of 81/20 = 4.05 has the numerator of no reduced fraction in common, 4.1 neither.
    expect(roundings('81/20', 1)).toEqual([{ at: 4, label: '4.0' }, { at: 4.1, label: '4.1' }]);
    // 1/2 to no decimals: 0 and 1, the second with the numerator of the key.
    expect(roundings('1/2', 0, 1)).toEqual([{ at: 0, label: '0' }, { at: 1, label: '1' }]);
  });
});

describe('its limits and graduations', () => {
  it.each([
    // The widths are twice the half width of the band and 15 %, by hand: 2.4, 2.76, 5.75, 11.5, 34.5, 69, 230 and 2300.
    ['1/2', 0.5, 0.1, 1], ['6/5', 0.5, 0.1, 1], ['5/2', 1, 0.2, 0], ['5', 2, 0.5, 0], ['15', 5, 1, 0], ['30', 10, 2, 0], ['100', 100, 20, 0], ['1000', 1000, 200, 0],
  ])('a band of %s has numerals every %d and lines every %d', (width, major, minor, decimals) => {
    expect(scaleOf(schemeOf('200', '200.00', 2, { bands: [{ name: '', kind: 'absolute', width, grains: 1200 }] }))).toMatchObject({ major, minor, decimals });
  });

  it('end on a line, 1.2 from the key at least, and hold all that is drawn with 15 % to spare', () => {
    expect([scaleOf(schemeOf('6', '6.00')).lo, scaleOf(schemeOf('6', '6.00')).hi].map((end) => end.toFixed(3))).toEqual(['4.800', '7.200']);
    fc.assert(
      fc.property(fc.integer({ min: -2000, max: 9999 }), fc.integer({ min: 1, max: 4000 }), fc.integer({ min: -3000, max: 9999 }), (key, width, other) => {
        const value = ratio(BigInt(key), 100n);
        const scheme = schemeOf(toFractionText(value), toDecimals(value, 2), 2, {
          bands: [{ name: '', kind: 'absolute', width: `${width}/100`, grains: 1200 }],
          alternatives: [{ name: '', value: toFractionText(ratio(BigInt(other), 100n)), text: '', decimals: 2, grains: 1, reason: '' }],
        });
        const { lo, hi, minor, major, roundings } = scaleOf(scheme);
        const at = key / 100;
        const drawn = [at - width / 100, at + width / 100, other / 100, ...roundings.map((one) => one.at)];
        const farthest = Math.max(1.2, ...drawn.map((one) => Math.abs(one - at) * 1.15));
        for (const [end, side] of [[lo, -1], [hi, 1]] as const) {
          expect(Math.abs(end / minor - Math.round(end / minor))).toBeLessThan(1e-6);
          const spare = side * (end - at) - farthest;
          expect(spare).toBeGreaterThan(-1e-8);
          expect(spare).toBeLessThan(minor * 1.000001);
        }
        expect((hi - lo) / major).toBeGreaterThan(1);
        expect((hi - lo) / major).toBeLessThan(13);
      }),
    );
  });
});
