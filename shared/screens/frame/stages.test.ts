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
  sheetsPrinted: 0,
  candidates: { expected: 3, present: 0, absent: 0, withdrawn: 0, deferred: 0, late: 0 },
  pages: { due: 3, in: 0, excused: 0, loose: 0 },
  readings: { taken: 0, due: 0 },
  answers: { all: 6, readable: 0, held: 0, scored: 0 },
};

it('counts a stage as finished only when all of it is, so that the meniscus falls with the work', () => {
  expect(levelOf(undefined)).toBe(0);
  expect(levelOf({ ...locked, isLocked: false })).toBe(0);
  expect(levelOf(locked)).toBe(4);
  const half = { ...locked, pages: { due: 3, in: 3, excused: 0, loose: 0 }, readings: { taken: 3, due: 3 }, answers: { all: 6, readable: 6, held: 1, scored: 2 } };
  expect(levelOf(half)).toBe(5.5);
  expect(levelOf({ ...half, readings: { taken: 6, due: 0 } })).toBeCloseTo(6 + 2 / 6);
  expect(levelOf({ ...half, readings: { taken: 6, due: 0 }, answers: { all: 6, readable: 6, held: 0, scored: 6 } })).toBe(8);
});

it('leads each role only where it may go', () => {
  const ways = (roles: ('lead' | 'reader' | 'external' | 'officer')[]) => stagesOf({ id: 's', roles }, locked, null).flatMap(({ label, href }) => (href ? [label] : []));
  expect(ways(['lead'])).toEqual(['Paper', 'Regions', 'Class list', 'Sheets', 'Scans', 'Reading', 'Moderation', 'Marks']);
  expect(ways(['reader'])).toEqual(['Class list', 'Scans', 'Reading']);
  expect(ways(['external'])).toEqual(['Paper', 'Regions', 'Class list', 'Sheets', 'Scans', 'Moderation', 'Marks']);
  expect(ways(['officer'])).toEqual([]);
});

it('tells a reader nothing of what is held or scored', () => {
  const seen = stagesOf({ id: 's', roles: ['reader'] }, { ...locked, answers: { all: 6, readable: 6, held: null, scored: null } }, null);
  expect(seen.slice(-2).map(({ note }) => note)).toEqual(['', '']);
});
