import { expect, it } from 'vitest';
import { droppedAt } from './drop-place';

const heights = [58, 74, 58, 58];

it('passes a row once more than half of it is behind, however tall it is', () => {
  expect([droppedAt(heights, 0, 36), droppedAt(heights, 0, 38), droppedAt(heights, 0, 74 + 30)]).toEqual([0, 1, 2]);
  expect(droppedAt(heights, 3, -(58 + 37))).toBe(1);
});

it('stays within the list, and where it is without a movement', () => {
  expect([droppedAt(heights, 2, 900), droppedAt(heights, 2, -900), droppedAt(heights, 2, 0)]).toEqual([3, 0, 2]);
});
