import { expect, it } from 'vitest';
import { nextHeld, paramsOf, questionOf } from './question';

it('reads a question from the address and writes it back', () => {
  const question = questionOf({ show: 'to-rule', find: '5.7*', sort: 'mark', direction: 'down', item: 'i' });
  expect(question).toEqual({ show: 'to-rule', find: '5.7*', sort: 'mark', direction: 'down', item: 'i' });
  expect(questionOf(paramsOf(question))).toEqual(question);
});

it('takes what it does not know as not asked', () => {
  expect(questionOf({ show: 'everything', sort: 'luck' })).toEqual({ show: 'all', item: null, find: '', sort: 'candidate', direction: 'up' });
  expect(Object.values(paramsOf(questionOf({}))).every((value) => value === undefined)).toBe(true);
});

it('goes round among the rows that wait', () => {
  expect([nextHeld([2, 7, 9], 2, 1), nextHeld([2, 7, 9], 9, 1), nextHeld([2, 7, 9], 2, -1), nextHeld([], 3, 1)]).toEqual([7, 2, 9, null]);
});
