import { expect, it } from 'vitest';
import { chainOf, linksOf, numbersFollowed, type Linked } from './chain-of';

const item = (number: number, from: number | null = null, second: number | null = null, isTrivial = false): Linked => ({
  id: String(number),
  number,
  draft: { followThrough: from === null ? null : { from: String(from), second: second === null ? null : String(second), isTrivial } },
});

// 1 and 2 lead to 4, 4 to 5; 3 stands alone, and 6 follows 1 by a step that is not carried on.
const paper = [item(1), item(2), item(3), item(4, 1, 2), item(5, 4), item(6, 1, null, true)];

it('finds the whole chain from any of its items, in paper order', () => {
  for (const id of ['1', '2', '4', '5', '6']) expect(chainOf(paper, id).items.map(({ number }) => number)).toEqual([1, 2, 4, 5, 6]);
  expect(chainOf(paper, '3')).toEqual({ items: [paper[2]], links: [] });
});

it('names each link once, and which is too short', () => {
  expect(chainOf(paper, '5').links.map(({ from, to, isTrivial }) => `${from}-${to}${isTrivial ? ' short' : ''}`)).toEqual(['1-4', '2-4', '4-5', '1-6 short']);
  expect(linksOf([item(2, 1, 1), item(1)])).toHaveLength(1);
});

it('leaves out a link to an item that is not there, and holds where two follow each other', () => {
  expect(linksOf([item(2, 9)])).toEqual([]);
  expect(chainOf([item(1, 2), item(2, 1)], '1').items).toHaveLength(2);
});

it('numbers what an item follows', () => {
  expect(numbersFollowed(paper, item(7, 4, 2))).toEqual([2, 4]);
  expect(numbersFollowed(paper, item(7))).toEqual([]);
});
