import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { keyingStep } from './keying';

describe('one step of the fingers', () => {
  // Common practice, no source: the errors that people make when copying numbers.
  it.each([
    ['610', '6.10', 'point-missing'],
    ['61.0', '6.10', 'point-moved'],
    ['6.01', '6.10', 'digits-exchanged'],
    ['1.60', '6.10', 'digits-exchanged'],
    ['6.110', '6.10', 'digit-doubled'],
    ['6.0', '6.10', 'digit-dropped'],
    ['6.70', '6.10', 'look-alike'],
    ['4.55', '4.95', null],
    ['4.95', '9.95', 'look-alike'],
    ['56.25', '-56.25', 'sign-lost'],
    ['6.10', '6.10', null],
    ['6.120', '6.10', null],
    ['5.75', '6.10', null],
  ] as const)('%s for %s: %s', (typed, meant, step) => expect(keyingStep(typed, meant)).toBe(step));

  const number = fc.tuple(fc.integer({ min: 1, max: 99 }), fc.integer({ min: 10, max: 99 })).map(([whole, places]) => `${whole}.${places}`);

  it('finds the number itself by no step, and every doubled digit by one', () => {
    fc.assert(
      fc.property(number, fc.nat(), (meant, seed) => {
        const places = [...meant].flatMap((letter, at) => (letter === '.' ? [] : [at]));
        const at = places[seed % places.length] ?? 0;
        const doubled = meant.slice(0, at + 1) + meant.slice(at);
        return keyingStep(meant, meant) === null && keyingStep(doubled, meant) === 'digit-doubled' && keyingStep(meant.replace('.', ''), meant) === 'point-missing';
      }),
    );
  });

  it('leads back by the same step where the step has no direction', () => {
    fc.assert(
      fc.property(number, number, (one, other) => {
        const step = keyingStep(one, other);
        const hasDirection = step === null || !['digits-exchanged', 'look-alike', 'point-moved'].includes(step);
        return hasDirection || keyingStep(other, one) === step;
      }),
    );
  });
});
