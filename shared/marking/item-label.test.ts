import { expect, it } from 'vitest';
import { electronLabel, itemLabel } from './item-label';

const chlorine = { symbol: 'Cl', charge: 0, electron: '3p' };

it('names an ion by its charge and an atom without one', () => {
  expect(itemLabel({ asked: { symbol: 'Mg', charge: 2, electron: '2p' } })).toBe('Mg²⁺ 2p');
  expect(itemLabel({ asked: chlorine })).toBe('Cl 3p');
});

it('stars a configuration that was typed', () => {
  expect(electronLabel({ symbol: 'Ne', charge: 0, electron: '3s', configuration: '1s2 2s2 2p5 3s1' })).toBe('Ne* 3s');
  expect(electronLabel({ ...chlorine, configuration: ' ' })).toBe('Cl 3p');
});

it('names a difference by both electrons, and a typed key as the lead does', () => {
  expect(itemLabel({ asked: { ...chlorine, other: { symbol: 'S', charge: 0, electron: '3p' } } })).toBe('Cl 3p less S 3p');
  expect(itemLabel({ asked: { symbol: '', charge: 0, electron: '', typed: { label: 'pH of the buffer', source: 'by hand' } } })).toBe('pH of the buffer');
});

it.each([
  ['greatest', 'the greatest of 4'], ['least', 'the least of 4'], ['increasing', '4 in increasing order'], ['decreasing', '4 in decreasing order'],
] as const)('names the question %s by its options', (question, label) => {
  expect(itemLabel({ asked: chlorine, printed: { question, options: [1, 2, 3, 4] } })).toBe(label);
});
