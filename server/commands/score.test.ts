import { spawnSync } from 'node:child_process';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, it } from 'vitest';
import { readRows } from './key-rows';

const command = fileURLToPath(new URL('./score.ts', import.meta.url));
const item = (symbol: string, electron: string, changes: object = {}) => ({
  asked: { symbol, charge: 0, electron, quantity: 'zeff', convention: 'slater' },
  decimals: 2,
  prompt: null,
  marks: '3',
  roundings: { downToDecimals: 1, truncation: false },
  bands: [],
  crossedOut: 'ask',
  twoAnswers: 'none',
  ...changes,
});

function run(items: object[], csv: string) {
  const path = join(mkdtempSync(join(tmpdir(), 'meniscus-score-')), 'paper.json');
  writeFileSync(path, JSON.stringify({ format: 'meniscus-paper', version: 1, title: 'Paper', items, pages: [], boxes: [] }));
  const { stdout, stderr, status } = spawnSync(process.execPath, ['--import', 'tsx', command, path], { input: csv, encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 });
  return { rows: status === 0 ? readRows(stdout) : [], stderr, status };
}

it('marks texts and codes by the rules of the paper', () => {
  const items = [item('Cl', '3p', { slips: [{ id: 'counts-itself', marks: '1' }] }), item('Fe', '4s')];
  const { rows } = run(items, 'candidate,item,text\nW1,1,6.10\nW1,2,"3,8"\nW2,1,5.75\nW2,2,@blank\nW3,1,@two-answers\nW3,2,@crossed-out\nW4,1,6.1.0\nW4,9,1\nW4,2,@gone\n');
  // Keys by Slater's coefficients (Phys. Rev. 36, 57, 1930): Cl 3p 6.10, Fe 4s 3.75; counting the electron itself gives 5.75.
  expect(rows.map(({ parsed, mark, max, rule, slips, error }) => [parsed, mark, max, rule, slips, (error ?? '').split(':')[0]])).toEqual([
    ['6.10', '3', '3', 'key', '', ''],
    ['3.8', '3', '3', 'rounding', '', ''],
    ['5.75', '1', '3', 'slip', 'counts the electron itself', ''],
    ['', '0', '3', 'code', '', ''],
    ['', '0', '3', 'code', '', ''],
    ['', '', '3', 'code', '', ''],
    ['', '', '3', '', '', 'text'],
    ['', '', '', '', '', 'item'],
    ['', '', '3', '', '', 'text'],
  ]);
});

it('names the item of a paper that cannot be worked, and marks nothing', () => {
  const { status, stderr } = run([item('Fe', '4p')], 'candidate,item,text\n');
  expect([status, stderr.trim()]).toEqual([1, 'Item 1, asked.electron: Iron has no 4p electron in its ground state.']);
});

it('marks ten thousand rows in less than ten seconds', { timeout: 30_000 }, () => {
  const begun = Date.now();
  const { rows } = run([item('Cl', '3p')], `candidate,item,text\n${Array.from({ length: 10_000 }, (_, index) => `W${index},1,${Math.floor(index / 100)}.${String(index % 100).padStart(2, '0')}`).join('\n')}\n`);
  expect(Date.now() - begun).toBeLessThan(10_000);
  expect(rows.filter(({ mark }) => mark === '3').map(({ text }) => text)).toEqual(['6.10']);
});
