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
});

const upload = (id: string, state: UploadView['state']): UploadView => ({ id, fileName: `${id}.jpg`, size: 1, partSize: 1, parts: [], state, problem: 'why', pages: [] });
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
