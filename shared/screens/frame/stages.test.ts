import { expect, it } from 'vitest';
import type { ProgressView } from '../../contracts/progress';
import { levelOf, stagesOf } from './stages';

const locked: ProgressView = {
  sittingId: 's',
  seq: 1,
  status: 'draft',
  isLocked: true,
  items: 2,
  itemsPlaced: 2,
  layoutPages: 1,
  candidates: { expected: 3, present: 0, absent: 0, withdrawn: 0, deferred: 0, late: 0 },
  pages: { due: 3, in: 0, excused: 0, loose: 0 },
  readings: { taken: 0, due: 0 },
  answers: { all: 6, readable: 0, held: 0, scored: 0 },
};

it('leaves something in the burette of a locked sitting while answers are unread', () => {
  const stages = stagesOf({ id: 's', roles: ['lead'] }, locked, null);
  expect(stages.at(-1)).toEqual({ label: 'Reading', note: 'not begun' });
  expect(levelOf(locked)).toBe(stages.length - 1);
  expect(levelOf({ ...locked, readings: { taken: 6, due: 0 } })).toBe(stages.length);
});

it('leads only a lead or an external examiner to the paper', () => {
  const ways = (roles: ('lead' | 'reader' | 'officer')[]) => stagesOf({ id: 's', roles }, locked, null).flatMap(({ label, href }) => (href ? [label] : []));
  expect([ways(['lead']), ways(['reader']), ways(['officer'])]).toEqual([['Paper', 'Regions', 'Class list'], ['Class list'], []]);
});
