import { mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, it } from 'vitest';
import { writeSheets, type SheetOrder } from './sheets-pdf';

const folder = mkdtempSync(join(tmpdir(), 'meniscus-print-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const order = (name: string, owners: number): SheetOrder => ({
  path: join(folder, name),
  paper: 'a4',
  sitting: 214,
  layout: 2,
  title: 'CHM 214, Paper 2',
  held: '6 May 2026',
  items: [1, 2, 3].map((number) => ({ number, prompt: 'By Slater’s rules, find Z_eff for a 2p electron of a C atom, to two decimals.', marks: '2' })),
  owners: Array.from({ length: owners }, (_, index) => ({ candidateNumber: `W${4071 + index}`, script: index + 1 })),
  secret: 'a secret of a test, long enough to be one',
  madeAt: Date.UTC(2026, 4, 1),
});

it('has the sheets on disk while it goes on, so that the document is never whole in memory', async () => {
  const onDisk: number[] = [];
  const wanted = order('streamed.pdf', 60);
  await writeSheets(wanted, () => onDisk.push(statSync(wanted.path).size));
  const whole = statSync(wanted.path).size;
  expect(onDisk).toHaveLength(60);
  // Half of the sheets weigh at least 400 kB; a quarter of a megabyte may wait for the disk.
  expect(whole).toBeGreaterThan(600_000);
  expect(onDisk[59]).toBeGreaterThan(whole - 400_000);
  expect(onDisk[29]).toBeGreaterThan(whole / 2 - 400_000);
});

it('writes the same bytes for the same order, so that a job may run again', async () => {
  await writeSheets(order('one.pdf', 2), () => undefined);
  await writeSheets(order('other.pdf', 2), () => undefined);
  expect(readFileSync(join(folder, 'one.pdf')).equals(readFileSync(join(folder, 'other.pdf')))).toBe(true);
});

it('ends with the reason when the disk refuses', async () => {
  await expect(writeSheets(order(join('no-such-folder', 'lost.pdf'), 3), () => undefined)).rejects.toThrow('ENOENT');
});

it('refuses items that cannot stand on a page', async () => {
  await expect(writeSheets({ ...order('none.pdf', 1), items: [] }, () => undefined)).rejects.toThrow('no-items');
});
