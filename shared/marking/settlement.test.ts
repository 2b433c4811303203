import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { codeCanonical } from './canonical';
import type { Code } from './scheme';
import { settlement, type SettlingReading } from './settlement';

let made = 0;
const value = (text: string): SettlingReading => ({ id: String((made += 1)), canonical: text, code: null, method: '' });
const coded = (code: Code): SettlingReading => ({ id: String((made += 1)), canonical: codeCanonical(code), code, method: '' });
const settle = (readings: readonly SettlingReading[], wanted = 1, decides: readonly Code[] = []) =>
  settlement({ readings, ruling: null, wanted, schemeDecides: (code) => decides.includes(code) });

describe('settling an answer', () => {
  it('says what holds first, from not read to concordant', () => {
    expect(settle([])).toMatchObject({ state: 'not-read', due: 1, isMarked: false });
    expect(settle([value('6.10')])).toMatchObject({ state: 'one-reading', due: 0, canonical: '6.10', isMarked: true });
    expect(settle([value('6.10')], 2)).toMatchObject({ state: 'one-reading', due: 1, canonical: null, isMarked: false });
    expect(settle([value('6.10'), value('6.10')], 2)).toMatchObject({ state: 'concordant', canonical: '6.10', isMarked: true });
    expect(settle([value('6.10'), value('6.1')], 2)).toMatchObject({ state: 'discordant', isMarked: false });
    expect(settle([coded('blank')])).toMatchObject({ state: 'blank', isMarked: true });
    expect(settle([coded('blank'), value('6.10')], 2)).toMatchObject({ state: 'discordant' });
  });

  it('holds codes that the scheme leaves to a person, setting aside before what cannot be read', () => {
    expect(settle([coded('cannot-read')])).toMatchObject({ state: 'cannot-read', isMarked: false });
    expect(settle([coded('cannot-read'), coded('ask-the-lead')], 2)).toMatchObject({ state: 'set-aside' });
    expect(settle([coded('two-answers')])).toMatchObject({ state: 'set-aside' });
    expect(settle([coded('two-answers')], 1, ['two-answers'])).toMatchObject({ state: 'one-reading', isMarked: true });
  });

  it('lets a ruling stand before everything; a ruled mark changes no value', () => {
    const readings = [value('6.10'), value('6.70')];
    const ruled = (canonical: string | null, of = readings) => settlement({ readings: of, ruling: { id: 'r', canonical }, wanted: 2, schemeDecides: () => false });
    expect(ruled('6.10')).toMatchObject({ state: 'ruled', canonical: '6.10', from: 'ruling' });
    expect(ruled(null)).toMatchObject({ state: 'ruled', canonical: null });
    expect(ruled(null, [value('6.10'), value('6.10')])).toMatchObject({ canonical: '6.10', from: 'reading' });
  });

  it('does not depend on the order of the readings, and gives a mark or waits, never both', () => {
    const reading = fc.oneof(fc.constantFrom('6.10', '6.1', '6.70').map(value), fc.constantFrom<Code>('blank', 'cannot-read', 'ask-the-lead').map(coded));
    fc.assert(
      fc.property(fc.array(reading, { maxLength: 3 }), fc.integer({ min: 0, max: 2 }), (readings, wanted) => {
        const forward = settle(readings, wanted);
        const backward = settle([...readings].reverse(), wanted);
        return forward.state === backward.state && forward.canonical === backward.canonical && !(forward.isMarked && forward.due > 0);
      }),
    );
  });
});
