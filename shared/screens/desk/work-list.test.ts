import { expect, it } from 'vitest';
import type { DeskLease } from '../../contracts/desk';
import { emptyWork, looking, onView, withLeases, withReading, withTakenBack } from './work-list';

const lease = (answerId: string): DeskLease => ({ id: `l-${answerId}`, answerId, candidateNumber: answerId, pageNo: 1, pageCount: 1, pageImageId: 'p', pageImageRev: 1, crops: [] });
const done = (answerId: string) => ({ readingId: `r-${answerId}`, lease: lease(answerId), said: { text: '1' }, at: 1 });
const three = withLeases(emptyWork, ['a', 'b', 'c'].map(lease), new Set());

it('adds no answer twice, and none whose reading is still on its way', () => {
  const more = withLeases(three, ['b', 'd', 'e'].map(lease), new Set(['e']));
  expect(more.held.map(({ answerId }) => answerId)).toEqual(['a', 'b', 'c', 'd']);
});

it('does not bring back what was read while the server answered', () => {
  const after = withReading(three, { ...done('a'), at: 20 });
  expect(withLeases(after, ['a', 'd'].map(lease), new Set(), 10).held.map(({ answerId }) => answerId)).toEqual(['b', 'c', 'd']);
  // Read before it was asked, it comes again: the reading was refused or taken back.
  expect(withLeases(after, ['a'].map(lease), new Set(), 30).held.map(({ answerId }) => answerId)).toEqual(['b', 'c', 'a']);
});

it('shows the next once the first is read, and looks back at what was said', () => {
  const after = withReading(three, done('a'));
  expect(onView(after)).toMatchObject({ kind: 'next', lease: { answerId: 'b' } });
  expect(onView(looking(after, 1))).toMatchObject({ kind: 'done', done: { readingId: 'r-a' } });
  expect(looking(looking(after, 1), 1).back).toBe(1);
  expect(onView(looking(after, -1))).toMatchObject({ kind: 'later', lease: { answerId: 'c' } });
  expect(looking(looking(after, -1), -1).back).toBe(-1);
});

it('brings an answer that was taken back first, unless it went elsewhere', () => {
  const after = withReading(three, done('a'));
  expect(withTakenBack(after, 'r-a', lease('a')).held.map(({ answerId }) => answerId)).toEqual(['a', 'b', 'c']);
  expect(withTakenBack(after, 'r-a', null)).toMatchObject({ done: [], back: 0 });
});

it('shows nothing when nothing is held', () => {
  expect(onView(emptyWork)).toEqual({ kind: 'none' });
  expect(looking(emptyWork, -1).back).toBe(0);
});
