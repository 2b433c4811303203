import { expect, it } from 'vitest';
import { printableText } from './printable-text';

it('writes what the shipped fonts lack in other signs', () => {
  expect(printableText('σ of an Mg²⁺ ion')).toBe('sigma of an Mg(2+) ion');
  expect(printableText('(2.20 / 3)²')).toBe('(2.20 / 3)^2');
  expect(printableText('Z − σ = 6.10 × 2')).toBe('Z − sigma = 6.10 × 2');
});
