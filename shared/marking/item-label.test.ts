import { expect, it } from 'vitest';
import { itemLabel } from './item-label';

it('names an ion by its charge and an atom without one', () => {
  expect(itemLabel({ asked: { symbol: 'Mg', charge: 2, electron: '2p' } })).toBe('Mg²⁺ 2p');
  expect(itemLabel({ asked: { symbol: 'Cl', charge: 0, electron: '3p' } })).toBe('Cl 3p');
});
