import { expect, it } from 'vitest';
import { byValue } from './value-order';

const option = (symbol: string) => ({ symbol, charge: 0, electron: '2p' });

it('orders options by value, the least first, with the numbers they are printed under', () => {
  expect(byValue(['O', 'F', 'N'].map(option), ['4.55', '5.20', '3.90']).map(({ number }) => number)).toEqual([3, 1, 2]);
  // Energies are below zero.
  expect(byValue(['O', 'F'].map(option), ['-70.42', '-91.98']).map(({ number }) => number)).toEqual([2, 1]);
});

it('leaves what has no value at the end, in printed order', () => {
  expect(byValue(['O', 'F', 'N'].map(option), [null, '5.20']).map(({ number }) => number)).toEqual([2, 1, 3]);
});
