import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { absolute, add, compare, decimal, ratio, subtract, toFractionText } from '../chemistry/exact';
import { bandOf, bandProblems, bandRange, contains } from './bands';
import type { Band, BandKind } from './scheme';

const band = (kind: BandKind, width: string, grains = 1200, name = 'near'): Band => ({ name, kind, width, grains });
const range = (kind: BandKind, width: string, key: string): string[] => {
  const { from, to } = bandRange(band(kind, width), decimal(key));
  return [toFractionText(from), toFractionText(to)];
};

describe('the range of a band', () => {
  // By hand; half a unit of the last place or figure is what rounding to it leaves open.
  it.each([
    ['absolute', '1/20', '6.10', '121/20', '123/20'],
    ['absolute', '1/20', '-6.10', '-123/20', '-121/20'],
    ['relative', '1/20', '6.10', '1159/200', '1281/200'],
    ['relative', '1/20', '-6.10', '-1281/200', '-1159/200'],
    ['decimal-places', '1', '6.10', '121/20', '123/20'],
    ['decimal-places', '0', '6.10', '28/5', '33/5'],
    ['significant-figures', '3', '6.10', '1219/200', '1221/200'],
    ['significant-figures', '1', '6.10', '28/5', '33/5'],
    ['significant-figures', '2', '1313', '1263', '1363'],
    ['significant-figures', '2', '0.0485', '6/125', '49/1000'],
  ] as const)('%s %s round %s', (kind, width, key, from, to) => {
    expect(range(kind, width, key)).toEqual([from, to].map((text) => toFractionText(ratio(BigInt(text.split('/')[0] ?? ''), BigInt(text.split('/')[1] ?? '1')))));
  });

  it('is closed at both ends, and the innermost that contains a value counts', () => {
    const inner = band('absolute', '1/20', 2400, 'inner');
    const outer = band('absolute', '1/5', 1200, 'outer');
    const found = (value: string, bands = [outer, inner]) => bandOf(bands, decimal('6.10'), decimal(value))?.name ?? null;
    expect(['6.10', '6.05', '6.15', '6.0499', '6.151', '5.90', '6.30', '5.8999', '6.3001'].map((value) => found(value))).toEqual(['inner', 'inner', 'inner', 'outer', 'outer', 'outer', 'outer', null, null]);
    expect(found('6.10', [inner, outer])).toBe('inner');
    expect(found('6.10', [])).toBeNull();
    // Of unlike kinds: 5 % of 6.10 is 0.305.
    expect(found('6.12', [band('relative', '1/20', 600, 'wide'), inner])).toBe('inner');
  });

  it('lies evenly round the key', () => {
    fc.assert(
      fc.property(fc.integer({ min: -9999, max: 9999 }), fc.constantFrom<BandKind>('absolute', 'relative', 'decimal-places', 'significant-figures'), fc.integer({ min: 1, max: 5 }), (hundredths, kind, width) => {
        const key = ratio(BigInt(hundredths), 100n);
        const { from, to } = bandRange(band(kind, String(width)), key);
        expect(toFractionText(add(from, to))).toBe(toFractionText(add(key, key)));
        expect(contains({ from, to }, key)).toBe(true);
        expect(compare(absolute(subtract(to, key)), absolute(subtract(from, key)))).toBe(0);
      }),
    );
  });
});

describe('what is wrong with bands', () => {
  const problems = (...bands: Band[]) => bandProblems(bands, decimal('6.10'), 3600).map(({ path, message }) => `${path}: ${message}`);

  it('is nothing where the narrower gives more', () => {
    expect(problems()).toEqual([]);
    expect(problems(band('absolute', '1/20', 3600))).toEqual([]);
    expect(problems(band('absolute', '1/5', 1200), band('absolute', '1/20', 2400), band('decimal-places', '3', 3600))).toEqual([]);
    expect(problems(band('decimal-places', '12'))).toEqual([]);
  });

  it.each([
    [band('absolute', '0')], [band('relative', '0')], [band('absolute', '-1/20')], [band('decimal-places', '0')],
  ])('%o has no width', (one) => expect(problems(one)).toEqual(['bands.0.width: A band needs a width above 0.']));

  it.each([
    [band('decimal-places', '3/2')], [band('significant-figures', '1/2')], [band('decimal-places', '13')],
  ])('%o does not count places', (one) => expect(problems(band('absolute', '5', 1), one)).toEqual(['bands.1.width: Places and figures are whole numbers up to 12.']));

  it.each([[0], [-1], [3601], [0.5]])('a share of %d grains', (grains) => {
    expect(problems(band('absolute', '1/20', grains))).toEqual(['bands.0.grains: A band gives more than 0 marks and no more than the item is worth.']);
  });

  it('is named before widths are compared', () => {
    expect(problems(band('absolute', '0', 0), band('absolute', '1/20', 1200), band('absolute', '1/20', 1200))).toEqual([
      'bands.0.width: A band needs a width above 0.', 'bands.0.grains: A band gives more than 0 marks and no more than the item is worth.',
    ]);
  });

  it('is two of one width, and a wider one that gives as much', () => {
    // One decimal place is 0.05 on either side.
    expect(problems(band('absolute', '1/20', 2400), band('decimal-places', '1', 1200))).toEqual(['bands.1.width: Two bands have the same width.']);
    expect(problems(band('absolute', '1/5', 1200), band('absolute', '1/20', 1200))).toEqual(['bands.0.grains: The narrower band must give more marks than the wider one.']);
    expect(problems(band('absolute', '1/20', 1200), band('absolute', '1/5', 2400))).toEqual(['bands.1.grains: The narrower band must give more marks than the wider one.']);
  });
});
