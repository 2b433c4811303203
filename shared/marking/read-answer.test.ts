import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimal, equals, ratio, toFractionText } from '../chemistry/exact';
import { canonicalOf } from './canonical';
import { readAnswer } from './read-answer';

const value = (text: string, units: readonly string[] = []) => {
  const read = readAnswer(text, units);
  return read.ok ? toFractionText(read.value) : null;
};
const form = (text: string, units: readonly string[] = []) => canonicalOf({ text }, { kind: 'numeric', units });
const trouble = (text: string, units: readonly string[] = []) => {
  const read = readAnswer(text, units);
  return read.ok || read.unfinished ? null : { at: read.at, length: read.length, message: read.message };
};

describe('reading a typed answer', () => {
  it('takes a point, a comma, a sign, an exponent, a fraction, a name before it', () => {
    expect(['3.75', '3,75', '+3.75', '~3.75', '= 3.75', 'Z_eff = 3.75', 'Zeff=3.75', '15/4', '0.375e1', '37.5 x 10^-1', '37.5 × 10^\u22121'].map((text) => value(text))).toEqual(
      Array.from({ length: 11 }, () => '15/4'),
    );
    expect([value('-0.35'), value('\u22120.35'), value('.85'), value('4.55+')]).toEqual(['-7/20', '-7/20', '17/20', '91/20']);
  });

  it('takes a unit of the closed list only', () => {
    expect(value('52.9 pm', ['pm'])).toBe('529/10');
    expect(trouble('52.9 nm', ['pm'])).toEqual({ at: 5, length: 2, message: '“nm” is not understood. Units here: pm.' });
    expect(trouble('52.9 pm')).toEqual({ at: 5, length: 2, message: '“pm” is not understood. This item has no unit.' });
  });

  it('keeps the form apart from the value', () => {
    expect(form('6.1')).not.toBe(form('6.10'));
    expect(form('15/4')).not.toBe(form('3.75'));
    expect(form('4.55+')).not.toBe(form('4.55'));
    expect(new Set(['.85', '0.85', ',85', ' 0,85', '+0.85', '~ 0.85', 'σ = 0.85'].map((text) => form(text)))).toEqual(new Set(['0.85']));
  });

  it('waits for what is not yet a value', () => {
    for (const text of ['', ' ', '-', '6.', '6,', '.', '1e', '1.2 x 10^', '15/', 'Z_eff =']) expect(readAnswer(text, []), text).toEqual({ ok: false, unfinished: true });
  });

  describe('edge cases', () => {
    it('refuses two points, naming the one to keep', () => {
      expect(trouble('6..1')).toEqual({ at: 2, length: 2, message: 'Two points. Keep one: 6.1' });
      expect(trouble('3,8.5')?.message).toBe('Two points. Keep one: 3.8');
    });

    it('refuses letters, a second number, a fraction over nothing, and what is too long or too large', () => {
      expect(trouble('six')?.at).toBe(0);
      expect(trouble('6.10 6.20')?.at).toBe(5);
      expect(trouble('5/0')?.at).toBe(2);
      expect(trouble('1.5/2')?.at).toBe(3);
      expect(trouble('1e31')?.message).toBe('An exponent goes from -30 to 30.');
      expect(trouble('1'.repeat(65))?.at).toBe(64);
      expect(trouble('Infinity')).not.toBeNull();
      expect(trouble('0x10')).not.toBeNull();
    });
  });

  it('reads back exactly every decimal that is printed, with its zeros', () => {
    const printed = fc.tuple(fc.boolean(), fc.integer({ min: 0, max: 9_999_999 }), fc.integer({ min: 0, max: 6 }));
    fc.assert(
      fc.property(printed, ([isNegative, digits, places]) => {
        const padded = String(digits).padStart(places + 1, '0');
        const body = places === 0 ? padded : `${padded.slice(0, -places)}.${padded.slice(-places)}`;
        const text = `${isNegative ? '-' : ''}${body}`;
        const read = readAnswer(text, []);
        return read.ok && equals(read.value, decimal(text)) && read.decimals === places && read.canonical === text;
      }),
    );
  });

  it('never throws, whatever is typed, and understands its own forms as the same value', () => {
    const typed = fc.string({ unit: fc.constantFrom(...'0123456789.,-+/eE x10^~= '), maxLength: 20 });
    fc.assert(
      fc.property(typed, (text) => {
        const read = readAnswer(text, []);
        if (!read.ok) return true;
        const again = readAnswer(read.canonical, []);
        return again.ok && equals(again.value, read.value) && again.canonical === read.canonical;
      }),
      { numRuns: 2000 },
    );
  });

  it('does not round what floats would', () => {
    expect(value('0.1')).toBe(toFractionText(ratio(1n, 10n)));
    expect(value('9007199254740993')).toBe('9007199254740993');
  });
});

it('takes the e of a unit as no exponent', () => {
  expect(readAnswer('13.6 eV', ['eV', 'kJ/mol'])).toMatchObject({ ok: true, unit: 'eV', canonical: '13.6 eV' });
  expect(readAnswer('13.6eV', ['eV'])).toMatchObject({ ok: true, unit: 'eV' });
  expect(readAnswer('13.6 e', ['eV'])).toEqual({ ok: false, unfinished: true });
  expect(readAnswer('1.36e1 eV', ['eV'])).toMatchObject({ ok: true, unit: 'eV', canonical: '1.36e1 eV' });
});
