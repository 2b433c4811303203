import { expect, it } from 'vitest';
import { amountOf, sparesOf, weightText } from './amount';

it('counts pages and paper for candidates and spares', () => {
  const preview = { candidates: 120, withoutSheet: 3, pages: [1, 2, 3, 4] };
  expect(amountOf(preview, { for: 'all', spares: '10' })).toEqual({ candidates: 120, spares: 10, pagesEach: 4, pages: 520, sheets: 260 });
  expect(amountOf(preview, { for: 'without-sheet', spares: '' })).toEqual({ candidates: 3, spares: 0, pagesEach: 4, pages: 12, sheets: 6 });
});

it('reads a count of spares and nothing else', () => {
  expect(['', ' 12 ', '0', '500'].map(sparesOf)).toEqual([0, 12, 0, 500]);
  expect(['501', '-1', '1.5', '1e2', 'ten', '0x1'].map(sparesOf)).toEqual([null, null, null, null, null, null]);
});

it('writes a weight', () => {
  expect([400, 47_193, 31_240_000].map(weightText)).toEqual(['1 kB', '47 kB', '31.2 MB']);
});
