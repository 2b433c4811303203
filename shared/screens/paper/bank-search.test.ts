import { expect, it } from 'vitest';
import type { BankItem } from '../../contracts/item-bank';
import { bankItemsFound } from './bank-search';

const item = (label: string, prompt: string) => ({ itemId: label, label, prompt }) as BankItem;
const items = [item('Cl 3p', 'By Slater’s rules, find Z_eff'), item('Fe 3d', 'Find the screening constant')];

it('finds by element, electron or words of the question, all of them', () => {
  expect(bankItemsFound(items, ' cl ').map(({ label }) => label)).toEqual(['Cl 3p']);
  expect(bankItemsFound(items, '3d screening').map(({ label }) => label)).toEqual(['Fe 3d']);
  expect(bankItemsFound(items, '3d slater')).toEqual([]);
  expect(bankItemsFound(items, '')).toHaveLength(2);
});
