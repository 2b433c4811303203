import { expect, it } from 'vitest';
import { touchedRows } from './touched';

it('tells rows changed by others from new rows and own acts', () => {
  const seen = new Map([['a', 1], ['b', 1], ['c', 4]]);
  const rows = [{ answerId: 'a', rev: 2 }, { answerId: 'b', rev: 2 }, { answerId: 'c', rev: 4 }, { answerId: 'd', rev: 9 }];
  expect(touchedRows(seen, rows, new Set(['b']))).toEqual(['a']);
});
