import { expect, it } from 'vitest';
import { windowsFor } from './ledger-windows';

it('names the windows of the rows on view', () => {
  expect(windowsFor([{ from: 0, to: 99 }])).toEqual([]);
  expect(windowsFor([{ from: 95, to: 120 }])).toEqual([1]);
  expect(windowsFor([{ from: 250, to: 401 }])).toEqual([2, 3, 4]);
});

it('fetches nothing between the rows on view and the row that is open far away', () => {
  expect(windowsFor([{ from: 9000, to: 9030 }, { from: 3, to: 5 }])).toEqual([90]);
  expect(windowsFor([{ from: 10, to: 40 }, { from: 899, to: 901 }])).toEqual([8, 9]);
});

it('takes rows before the first as the first', () => {
  expect(windowsFor([{ from: -2, to: 0 }])).toEqual([]);
});
