import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { krippendorffAlpha, type Level } from './krippendorff';

const column = (text: string): (number | null)[] => text.split(' ').map((entry) => (entry === '.' ? null : Number(entry)));

// K. Krippendorff, Computing Krippendorff's Alpha-Reliability (2011): four observers, twelve units, readings missing.
const observers = ['1 2 3 3 2 1 4 1 2 . . .', '1 2 3 3 2 2 4 1 2 5 . 3', '. 3 3 3 2 3 4 2 2 5 1 .', '1 2 3 3 2 4 4 1 2 5 1 .'].map(column);

describe("Krippendorff's alpha", () => {
  it.each<[Level, number]>([['nominal', 0.743], ['ordinal', 0.815], ['interval', 0.849], ['ratio', 0.797]])('%s of the example of 2011 is %f', (level, due) => {
    const found = krippendorffAlpha(observers, level);
    expect(found.alpha).toBeCloseTo(due, 3);
    // The twelfth unit was read once only: 40 values stand beside another one.
    expect([found.units, found.values, found.state]).toEqual([11, 40, 'value']);
  });

  it('is not there without two different values, or without a unit read twice', () => {
    expect(krippendorffAlpha([[3, 3], [3, 3]], 'ratio')).toEqual({ units: 2, values: 4, alpha: null, state: 'no variation' });
    expect(krippendorffAlpha([[3, null], [null, 3]], 'nominal')).toEqual({ units: 0, values: 0, alpha: null, state: 'nothing' });
    expect(krippendorffAlpha([], 'nominal').state).toBe('nothing');
  });

  it('does not depend on the order of readers or units, is at most 1, and 1 for equal readings', () => {
    const value = fc.option(fc.integer({ min: 1, max: 5 }));
    fc.assert(
      fc.property(fc.array(fc.tuple(value, value, value), { minLength: 2, maxLength: 20 }), fc.constantFrom<Level>('nominal', 'ordinal', 'interval', 'ratio'), (units, level) => {
        const readers = [0, 1, 2].map((at) => units.map((unit) => unit[at] ?? null));
        const found = krippendorffAlpha(readers, level).alpha;
        const turned = krippendorffAlpha([...readers].reverse().map((reader) => [...reader].reverse()), level).alpha;
        if (found === null) expect(turned).toBeNull();
        else {
          expect(turned).toBeCloseTo(found, 10);
          expect(found).toBeLessThanOrEqual(1 + 1e-12);
        }
        const first = readers[0] ?? [];
        expect(krippendorffAlpha([first, first], level).alpha ?? 1).toBeCloseTo(1, 12);
      }),
    );
  });
});
