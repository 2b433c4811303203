import { expect, it } from 'vitest';
import { struckWords } from './method-words';

const marks = ['a', 'b', 'c'].map((id) => ({ id, text: `shows ${id}` }));

it('names the method marks struck by their numbers, in the order of the item', () => {
  expect([struckWords(['c', 'a'], marks), struckWords(['b'], marks), struckWords(['a', 'b', 'c'], marks)]).toEqual(['method 1 and 3', 'method 2', 'method 1, 2 and 3']);
  expect([struckWords([], marks), struckWords([], [])]).toEqual(['no method mark', '']);
});
