import { expect, it } from 'vitest';
import { composeCode, type CheckOf, type CodeIdentity } from '../../../shared/sheets/identity';
import type { FoundCode } from './codes';
import { identify } from './identify';

const checkOf: CheckOf = (digits) => [...digits].reduce((sum, digit, index) => (sum * 7 + Number(digit) * (index + 3)) % 1_000_000, 11).toString().padStart(6, '0');
const corner = { x: 0, y: 0 };
const seen = (text: string): FoundCode => ({ text, corners: [corner, corner, corner, corner], isInverted: false });
const page: CodeIdentity = { sitting: 214, script: 5, page: 1, layout: 3, place: 1 };
const code = (changes: Partial<CodeIdentity> = {}): FoundCode => seen(composeCode({ ...page, ...changes }, checkOf));
const misread = (place: number): FoundCode => seen(`${code({ place }).text.slice(0, 23)}${(Number(code({ place }).text[23]) + 1) % 10}`);

it('takes a page that all its codes agree on, with their places', () => {
  const { place: _, ...identity } = page;
  expect(identify([code(), code({ place: 4 })], checkOf)).toMatchObject({ ok: true, identity, codes: [{ place: 1 }, { place: 4 }] });
});

it('passes over codes from elsewhere and over fewer misread codes than good ones', () => {
  expect(identify([seen('https://example.org'), code(), code({ place: 2 }), misread(3)], checkOf)).toMatchObject({ ok: true });
});

it.each([
  ['no code', [], 'no-code'],
  ['only codes from elsewhere', [seen('https://example.org')], 'other-codes'],
  ['a wrong check', [misread(1), misread(2)], 'wrong-check'],
  ['as many wrong checks as right ones', [code(), misread(2)], 'wrong-check'],
  ['another format', [seen(`2${code().text.slice(1)}`)], 'other-format'],
] as const)('takes no page from %s', (_, codes, reason) => {
  expect(identify(codes, checkOf)).toEqual({ ok: false, reason });
});

it.each([
  ['of two pages', [code(), code({ place: 2, script: 6 })]],
  ['of one page twice', [code(), code({ place: 2 }), code()]],
])('takes no page from codes %s', (_, codes) => {
  expect(identify(codes, checkOf)).toMatchObject({ ok: false, reason: 'several-sheets' });
});
