import { createHmac } from 'node:crypto';
import fc from 'fast-check';
import { expect, it } from 'vitest';
import { composeCode, digitsOfCode, largest, parseCode, type CheckOf } from './identity';

/** The first four bytes of an HMAC, modulo a million: any keyed check will do here. */
const checkOf: CheckOf = (digits) => String(createHmac('sha256', 'a test').update(digits).digest().readUInt32BE(0) % 1_000_000).padStart(6, '0');
const one = (most: number) => fc.integer({ min: 1, max: most });
const anyIdentity = fc.record({ sitting: one(largest.sitting), script: one(largest.script), page: one(largest.page), place: one(6), layout: one(largest.layout) });

it('lays out format, sitting, script, page, place, layout and check in 24 digits', () => {
  const text = composeCode({ sitting: 214, script: 5, page: 1, place: 3, layout: 2 }, () => '987654');
  expect(text).toBe('1' + '000214' + '00005' + '01' + '3' + '002' + '987654');
  expect(text).toHaveLength(digitsOfCode);
});

it('reads back what it wrote', () => {
  fc.assert(fc.property(anyIdentity, (identity) => void expect(parseCode(composeCode(identity, checkOf), checkOf)).toEqual({ ok: true, identity })));
});

it('refuses a code with one digit misread, another format, and what is no code of ours', () => {
  const text = composeCode({ sitting: 214, script: 5, page: 1, place: 3, layout: 2 }, checkOf);
  for (let at = 1; at < text.length; at += 1) {
    const misread = text.slice(0, at) + String((Number(text[at]) + 1) % 10) + text.slice(at + 1);
    expect(parseCode(misread, checkOf)).toEqual({ ok: false, reason: 'wrong-check' });
  }
  expect(parseCode(`2${text.slice(1)}`, checkOf)).toEqual({ ok: false, reason: 'other-format' });
  expect(parseCode('a page elsewhere', checkOf)).toEqual({ ok: false, reason: 'not-ours' });
  const nobody = '1' + '0'.repeat(17);
  expect(parseCode(nobody + checkOf(nobody), checkOf)).toEqual({ ok: false, reason: 'not-ours' });
});

it('has no room for a number that is too large or none', () => {
  const identity = { sitting: 214, script: 5, page: 1, place: 3, layout: 2 };
  expect(() => composeCode({ ...identity, script: 100_000 }, checkOf)).toThrow('No room in the code for script 100000.');
  expect(() => composeCode({ ...identity, layout: 0 }, checkOf)).toThrow(RangeError);
});
