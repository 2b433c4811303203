import { expect, it } from 'vitest';
import type { BatchSummary, UploadView } from '../../contracts/scans';
import { nextBundle, trayRows } from './tray-rows';

const batch = (id: string, bundle: string, loose = 0, sending = 0): BatchSummary => ({
  id,
  sittingId: 's',
  bundle,
  madeAt: 1,
  state: 'open',
  isOwn: true,
  files: { sending, received: 0, done: 3, refused: 0, duplicate: 0, cancelled: 0 },
  pages: { waiting: 0, placed: 3, loose, refused: 0, discarded: 0 },
  making: { done: 0, of: 0 },
  stuck: 0,
});

const upload = (id: string, state: UploadView['state']): UploadView => ({ id, fileName: `${id}.jpg`, size: 1, partSize: 1, parts: [], state, problem: 'why', stuck: null, of: null, pages: [] });
const file = (key: string, batchId: string, state: 'waiting' | 'sending' | 'sent' | 'refused' | 'offline', sentBytes = 0) => ({ key, batchId, fileName: `${key}.jpg`, size: 10, sentBytes, state, problem: state === 'refused' ? 'Too large.' : null });

it('puts what needs someone first, then what is on its way, then the bundles', () => {
  const rows = trayRows([batch('b', 'B'), batch('a', 'A', 2)], [file('1', 'b', 'refused'), file('2', 'b', 'sending', 5), file('3', 'b', 'waiting')], [upload('x', 'done'), upload('y', 'duplicate'), upload('z', 'refused')], 'a');
  expect(rows.map(({ kind }) => kind)).toEqual(['refused-here', 'refused', 'loose', 'duplicate', 'sending', 'batch', 'batch']);
  expect(rows[4]).toMatchObject({ bundle: 'B', files: 2, sent: 0, doneBytes: 5, bytes: 20, isOffline: false });
});

it('says how many files of a bundle were broken off elsewhere, not those being sent from here', () => {
  const rows = trayRows([batch('a', 'A', 0, 3)], [file('1', 'a', 'sending')], [], null);
  expect(rows.at(-1)).toMatchObject({ kind: 'batch', brokenOff: 2 });
  expect(trayRows([batch('a', 'A')], [file('1', 'a', 'sent', 10)], [], null).map(({ kind }) => kind)).toEqual(['batch']);
});

it('names the next bundle by the first free letter', () => {
  expect(nextBundle([])).toBe('A');
  expect(nextBundle(['a', 'C', 'back row'])).toBe('B');
  expect(nextBundle(Array.from({ length: 26 }, (_, index) => String.fromCharCode(65 + index)))).toBe('A2');
});

it('names the pages of a file that were not taken, the advice it came with, how far it is, and what is stuck', () => {
  const page = (index: number, changes: object) => ({ id: `p${index}`, index, name: null, state: 'placed' as const, place: 'W1, page 1', why: null, note: null, ...changes });
  const stack: UploadView = { ...upload('stack', 'received'), of: 9, pages: [page(0, { note: 'Scan in grey.' }), page(1, { note: 'Scan in grey.' }), page(2, { state: 'refused', place: null, why: 'Damaged.' }), page(3, { name: 'a.jpg', state: 'refused', place: null, why: 'Empty.' })] };
  const rows = trayRows([batch('a', 'A')], [], [stack, { ...upload('held', 'received'), stuck: 'The disk is full.' }], 'a');
  expect(rows.map(({ kind }) => kind)).toEqual(['stuck', 'pages-refused', 'note', 'making', 'batch']);
  expect(rows[0]).toMatchObject({ uploadId: 'held', problem: 'The disk is full.' });
  expect(rows[1]).toMatchObject({ bundle: 'A', pages: [{ name: 'page 3', why: 'Damaged.' }, { name: 'a.jpg', why: 'Empty.' }], more: 0 });
  expect(rows[2]).toMatchObject({ note: 'Scan in grey.', pages: 2 });
  expect(rows[3]).toMatchObject({ done: 4, of: 9 });
});
