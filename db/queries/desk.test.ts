import { expect, it, vi } from 'vitest';
import { openDatabase } from '../client';
import { migrateDatabase } from '../migrate';
import { nextAnswers, ownLiveReading } from './desk';

/** How SQLite goes about the statements that the work prepares. */
function plansOf(work: (db: ReturnType<typeof openDatabase>) => void): string {
  const db = openDatabase(':memory:');
  migrateDatabase(db);
  const prepared = vi.spyOn(db.$client, 'prepare');
  work(db);
  const texts = prepared.mock.calls.map(([text]) => text).filter((text) => /^select .* from "(reading|answer)" /.test(text));
  prepared.mockRestore();
  return texts
    .flatMap((text) => db.$client.prepare(`explain query plan ${text}`).all(...Array.from({ length: text.split('?').length - 1 }, () => 'x')))
    .map((step) => (step as { detail: string }).detail)
    .join('\n');
}

it('whether a reader has read an answer costs the same after one reading and after thousands', () => {
  const plans = plansOf((db) => {
    ownLiveReading(db, 'answer', 'reader');
    nextAnswers(db, 'reader', 'item', 5);
  });
  expect(plans).toContain('SEARCH reading USING INDEX reading_by_answer (answer=? AND reader=?)');
  expect(plans).toContain('SEARCH mine USING INDEX reading_by_answer (answer=? AND reader=?)');
  expect(plans).not.toMatch(/SCAN/);
});
