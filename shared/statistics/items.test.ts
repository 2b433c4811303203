import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { alpha, alphaFromVariances, alphaIfDeleted, correctedItemTotal, discrimination, facility, type Script } from './items';
import { correlation } from './moments';

// LSAT section 6, 1,000 examinees, 5 items: R. D. Bock and M. Lieberman, Psychometrika 35, 179 (1970); pattern counts from memory.
const patterns =
  '00000:3 00001:6 00010:2 00011:11 00100:1 00101:1 00110:3 00111:4 01000:1 01001:8 01010:0 01011:16 01100:0 01101:3 01110:2 01111:15 ' +
  '10000:10 10001:29 10010:14 10011:81 10100:3 10101:28 10110:15 10111:80 11000:16 11001:56 11010:21 11011:173 11100:11 11101:61 11110:28 11111:298';
const lsat: number[][] = patterns.split(' ').flatMap((entry) => {
  const [pattern = '', count] = entry.split(':');
  return Array.from({ length: Number(count) }, () => [...pattern].map(Number));
});

describe('LSAT section 6', () => {
  it.each([
    [0, 0.924, 0.362, 0.1128, 0.2754],
    [1, 0.709, 0.5668, 0.1532, 0.2376],
    [2, 0.553, 0.6184, 0.1728, 0.2168],
    [3, 0.763, 0.5344, 0.1444, 0.2459],
    [4, 0.87, 0.4354, 0.1216, 0.2663],
  ])('item at %i: facility, r with the total, corrected r and alpha without it', (item, share, withTotal, corrected, without) => {
    const marks = lsat.map((script) => script[item] ?? 0);
    expect(facility(marks, 1)).toEqual({ state: 'value', n: 1000, value: expect.closeTo(share, 10) as number });
    expect(correlation(marks, lsat.map((script) => script.reduce((sum, mark) => sum + mark, 0)))).toBeCloseTo(withTotal, 4);
    expect(correctedItemTotal(lsat, item).value).toBeCloseTo(corrected, 4);
    expect(alphaIfDeleted(lsat, item).value).toBeCloseTo(without, 4);
  });

  it('has alpha 0.2950', () => expect(alpha(lsat)).toEqual({ state: 'value', n: 1000, value: expect.closeTo(0.295, 4) as number }));
});

describe('alpha', () => {
  // J. M. Bland and D. G. Altman, Br. Med. J. 314, 572 (1997), from memory.
  it('is 0.95 for ten items with variances of 11.16 in sum and 77.44 of the totals', () => expect(alphaFromVariances(10, 11.16, 77.44)).toBeCloseTo(0.95, 2));

  it('is 1 for identical items and 0 for independent ones', () => {
    const marks = Array.from({ length: 36 }, (_, at) => at % 4);
    expect(alpha(marks.map((mark) => [mark, mark, mark])).value).toBeCloseTo(1, 12);
    // Every combination of two marks on three items, nine times over.
    const every = Array.from({ length: 72 }, (_, at) => [at & 1, (at >> 1) & 1, (at >> 2) & 1]);
    expect(alpha(every).value).toBeCloseTo(0, 12);
  });

  it('is not there for one item or without variation of the totals', () => {
    expect(alpha(Array.from({ length: 40 }, (_, at) => [at % 2])).state).toBe('no variation');
    expect(alpha(Array.from({ length: 40 }, (_, at) => [at % 2, 1 - (at % 2)])).state).toBe('no variation');
  });

  it('does not depend on the unit, the order of scripts or that of items, and is never above 1', () => {
    const script = fc.tuple(fc.integer({ min: 0, max: 3 }), fc.integer({ min: 0, max: 3 }), fc.integer({ min: 0, max: 3 }));
    fc.assert(
      fc.property(fc.array(script, { minLength: 2, maxLength: 50 }), (scripts) => {
        const found = alpha(scripts).value;
        const turned = alpha([...scripts].reverse().map((marks) => [...marks].reverse().map((mark) => mark * 1200))).value;
        expect(turned === null).toBe(found === null);
        if (found !== null) expect(turned).toBeCloseTo(found, 8);
        expect(found ?? 0).toBeLessThanOrEqual(1 + 1e-12);
      }),
    );
  });
});

describe('discrimination by the upper and lower 27 %', () => {
  // Class of 40, groups of 11, 9 and 3 right: (9 - 3)/11.
  const classOf40 = Array.from({ length: 40 }, (_, at) => {
    const isRight = at < 11 ? at < 9 : at < 29 ? at % 2 === 0 : at < 32;
    return [isRight ? 1 : 0, 1000 - 10 * at - (isRight ? 1 : 0)];
  });

  it('is 0.545 for 9 and 3 right in groups of 11', () => expect(discrimination(classOf40, 0, 1)).toEqual({ state: 'value', n: 40, value: expect.closeTo(6 / 11, 12) as number }));

  it('does not depend on the order of scripts, lies between -1 and 1', () => {
    const script = fc.tuple(fc.integer({ min: 0, max: 1 }), fc.integer({ min: 0, max: 3 }));
    fc.assert(
      fc.property(fc.array(script, { minLength: 4, maxLength: 60 }), (scripts) => {
        const found = discrimination(scripts, 0, 1).value;
        expect(Math.abs(found ?? 0)).toBeLessThanOrEqual(1 + 1e-12);
        expect(discrimination([...scripts].reverse(), 0, 1).value ?? 0).toBeCloseTo(found ?? 0, 10);
      }),
    );
  });

  it('of an item that all have right is "no variation"', () => expect(discrimination(classOf40.map(([, rest]) => [1, rest ?? 0]), 0, 1).state).toBe('no variation'));
});

describe('what is not there', () => {
  it('blank counts, not yet read does not', () => expect(facility([3, 0, 3, null], 3)).toEqual({ state: 'too few', n: 3, value: expect.closeTo(2 / 3, 12) as number }));

  it('nothing read is too few', () => expect(facility([null, null], 3)).toEqual({ state: 'too few', n: 0, value: null }));

  it('only scripts read whole count in sums over items', () => {
    const scripts: Script[] = [...lsat.slice(0, 400), [1, null, 1, 1, 1], []];
    expect(correctedItemTotal(scripts, 0)).toEqual(correctedItemTotal(lsat.slice(0, 400), 0));
    expect(correctedItemTotal([[null, 1]], 0)).toEqual({ state: 'too few', n: 0, value: null });
  });

  it('an item, or the rest, without variation is "no variation", and 29 scripts are too few', () => {
    const all = Array.from({ length: 40 }, (_, at) => [1, at % 2, at % 3]);
    expect(correctedItemTotal(all, 0)).toEqual({ state: 'no variation', n: 40, value: null });
    expect(correctedItemTotal(Array.from({ length: 40 }, (_, at) => [at % 2, 1, 2]), 0).state).toBe('no variation');
    expect(correctedItemTotal(all.slice(0, 29), 1).state).toBe('too few');
    expect(correctedItemTotal(all.slice(0, 30), 1).state).toBe('value');
  });
});
