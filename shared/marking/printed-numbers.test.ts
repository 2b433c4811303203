import { describe, expect, it } from 'vitest';
import { inPlace, readPrintedNumbers } from './printed-numbers';

describe('the printed numbers of options', () => {
  it.each(['312', '3 1 2', '3,1,2', ' 3, 1 2 ', '3\t1\t2'])('%j is the order 3 1 2', (text) => {
    expect(readPrintedNumbers(text)).toEqual({ ok: true, value: { n: 312n, d: 1n }, decimals: 0, figures: 3, unit: null, canonical: '3 1 2' });
  });

  it('are at most nine, and wait until there is one', () => {
    expect(readPrintedNumbers('123456789')).toMatchObject({ canonical: '1 2 3 4 5 6 7 8 9', figures: 9 });
    expect(readPrintedNumbers('1 234567891')).toEqual({ ok: false, unfinished: false, at: 0, length: 11, message: 'At most 9 numbers.' });
    for (const text of ['', ' ', ' , ']) expect(readPrintedNumbers(text)).toEqual({ ok: false, unfinished: true });
  });

  it('are digits only', () => {
    expect(readPrintedNumbers('3 a')).toEqual({ ok: false, unfinished: false, at: 2, length: 1, message: '“a” is no printed number. Type the numbers in their order, such as 3 1 2.' });
    expect(readPrintedNumbers('3.1')).toMatchObject({ at: 1 });
  });

  it('stand in place where the answer has the same number', () => {
    expect([inPlace('3 1 2', '3 1 2'), inPlace('3 2 1', '3 1 2'), inPlace('1 2 3', '3 1 2'), inPlace('3', '3 1 2'), inPlace('3 1 2 4', '3 1 2')]).toEqual([3, 1, 0, 1, 3]);
  });
});
