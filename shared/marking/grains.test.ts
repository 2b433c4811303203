import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { marksText } from './grains';
import { readMarks } from './typed-marks';

describe('marks as a person reads them', () => {
  // 1200 grains a mark: 1200/2, 1200/3 and so on, by hand.
  it.each([
    [0, '0'], [1200, '1'], [2400, '2'], [600, '0.5'], [120, '0.1'], [12, '0.01'], [1332, '1.11'], [1320, '1.1'], [2580, '2.15'],
    [400, '1/3'], [800, '2/3'], [200, '1/6'], [150, '1/8'], [100, '1/12'], [1600, '1 1/3'], [2550, '2 1/8'],
    [-600, '-0.5'], [-1600, '-1 1/3'], [-2400, '-2'],
  ])('%i grains are %s', (grains, text) => expect(marksText(grains)).toBe(text));

  it('are read back as they were, every grain', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 24_000 }), (grains) => { expect(readMarks(marksText(grains))).toEqual({ ok: true, grains }); }));
  });
});
