import { expect, it } from 'vitest';
import { slipCatalogue } from './catalogue';
import { slipLetter } from './letters';

it('gives every slip a letter of its own, the commonest a', () => {
  expect(slipLetter('counts-itself')).toBe('a');
  const all = slipCatalogue.map(({ id }) => slipLetter(id));
  expect(new Set(all).size).toBe(slipCatalogue.length);
  expect(all[26]).toBe('aa');
  expect(slipLetter('no such slip')).toBe('?');
});
