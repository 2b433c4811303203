import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { PDFDocument } from 'pdf-lib';
import sharp from 'sharp';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoSheet } from '../../db/seed/pages/demo-sheet';
import { demoFacts } from '../../db/seed/truth/demo-facts';
import { demoItems } from '../../db/seed/truth/demo-items';
import { candidateNumbers, inventTruth } from '../../db/seed/truth/truth';
import type { CandidateTruth } from '../../db/seed/truth/written';
import { codedJob } from '../../server/commands/demo-draw/coded-job';
import { drawPages } from '../../server/commands/demo-draw/draw-pages';
import { importClassList } from '../../server/services/class-list';
import { candidatesOf } from '../../server/services/candidates';
import { createItem } from '../../server/services/items';
import { createSitting } from '../../server/services/sittings';
import { findPageImage } from '../../db/queries/page-images';
import { scriptOfCandidate } from '../../db/queries/people-and-paper';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { actorOf, itemDraft } from '../support/paper';

const count = 20;
/** Two pages whose codes nobody can read. */
const spoilt = ['W4003-p2.jpg', 'W4011-p1.jpg'];
/** Two neighbours who wrote on each other's sheet. */
const exchanged: Readonly<Record<string, string>> = { W4007: 'W4008', W4008: 'W4007' };

/** The codes of a page painted over, as by a spilt drink. */
async function withoutCodes(jpeg: Buffer): Promise<Buffer> {
  const { width = 0, height = 0 } = await sharp(jpeg).metadata();
  const side = Math.round(width * 0.14);
  const stain = await sharp({ create: { width: side, height: side, channels: 3, background: '#e4ddcc' } }).png().toBuffer();
  const xs = [0, Math.round((width - side) / 2), width - side];
  return sharp(jpeg).composite(xs.flatMap((left) => [0, height - side].map((top) => ({ input: stain, left, top })))).jpeg({ quality: 74 }).toBuffer();
}

/** All pages as one PDF, as a scanner with a feeder writes it. */
async function asPdf(folder: string, files: readonly string[]): Promise<string> {
  const document = await PDFDocument.create();
  for (const file of files) {
    const bytes = readFileSync(join(folder, file));
    const picture = await document.embedJpg(spoilt.includes(file) ? await withoutCodes(bytes) : bytes);
    document.addPage([595, 842]).drawImage(picture, { x: 0, y: 0, width: 595, height: 842 });
  }
  const path = join(folder, 'stack.pdf');
  writeFileSync(path, await document.save());
  return path;
}

describe('sheets out, scans in', () => {
  let bench: BrowserBench;
  let folder: string;
  let sittingId: string;
  let truth: readonly CandidateTruth[];
  beforeAll(async () => {
    bench = await startBrowserBench();
    bench.server.context.jobs.run();
    folder = mkdtempSync(join(tmpdir(), 'meniscus-stack-'));
    truth = inventTruth({ seed: 'stack', items: demoFacts(), candidates: candidateNumbers(count), absentShare: 0 });
    const { context, courseId } = bench.server;
    const lead = actorOf(bench.server, 'lead');
    sittingId = createSitting(context, lead, courseId, { title: 'Paper 4', heldOn: '2026-05-27', secondPolicy: 'none', totalRounding: 'none' }).id;
    for (const { asked } of demoItems) createItem(context, lead, sittingId, itemDraft(asked.symbol, asked.electron, { asked: { symbol: asked.symbol, charge: asked.charge, electron: asked.electron, quantity: asked.quantity === 'sigma' ? 'sigma' : 'zeff', convention: 'slater' } }));
    importClassList(context, lead, sittingId, truth.map(({ candidate }) => candidate).join('\n'));
  });
  afterAll(async () => {
    await bench.close();
    rmSync(folder, { recursive: true, force: true });
  });

  it('a lead locks the paper and prints the sheets', async () => {
    const { page, context, complaints } = await openPage(bench, 'lead', 'wide');
    await page.goto(`${bench.address}/sittings/${sittingId}/sheets`);
    await page.getByTestId('lock-for-printing').click();
    await page.getByTestId('confirm-lock').click();
    await page.getByTestId('lock-for-printing').waitFor({ state: 'detached' });
    await page.getByTestId('make-sheets').click();
    await page.getByTestId('download-2').waitFor({ timeout: 60_000 });
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('a reader brings in the stack from a phone, and sorts what has no codes', async () => {
    const pages = await drawPages({ outDir: folder, seed: 'stack', sheet: demoSheet, candidates: truth, coded: codedJob(bench.server.context, sittingId, exchanged) });
    const stack = await asPdf(folder, pages.map(({ file }) => file));
    const { page, context, complaints } = await openPage(bench, 'readerOne', 'phone');
    await page.goto(`${bench.address}/sittings/${sittingId}/scans`);
    const chooser = page.waitForEvent('filechooser');
    await page.getByTestId('add-scans').click();
    await (await chooser).setFiles(stack);
    await page.getByTestId('send-files').click();
    // Progress is told while the stack is still in the making.
    await page.waitForFunction(() => /\b(?:[1-9]|[12]\d|3[0-7]) of 40\b/.test(document.body.innerText), undefined, { timeout: 60_000 });
    await bench.server.context.jobs.settle();
    await page.getByTestId('sort').first().click();
    for (const _ of spoilt) await sortOne(page);
    await page.getByText('Every page has its script').waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  }, 240_000);

  /** Looks which page lies there, as a person would by what is printed on it. */
  async function sortOne(page: Page): Promise<void> {
    await page.getByTestId('page-candidate').waitFor();
    const rows = bench.server.context.db.$client.prepare("select id from page_image where state = 'loose' order by upload, \"index\"").all() as { id: string }[];
    const image = findPageImage(bench.server.context.db, rows[0]?.id ?? '');
    const name = spoilt[spoilt.length - rows.length] ?? '';
    expect(image?.image.state).toBe('loose');
    await page.getByTestId('page-candidate').fill(name.slice(0, 5));
    await page.getByTestId('page-number').fill(name.slice(7, 8));
    await page.getByTestId('place-page').click();
    await page.getByText(`${name.slice(0, 5)}`).first().waitFor();
    await page.waitForFunction((left) => document.body.innerText.includes('Every page has its script') || document.body.innerText.includes(`of ${left}`), rows.length - 1);
  }

  it('what looks empty is confirmed on the contact sheet, and nothing that is written', async () => {
    const { page, context, complaints } = await openPage(bench, 'readerOne', 'phone');
    await page.goto(`${bench.address}/sittings/${sittingId}/blanks`);
    for (;;) {
      await page.getByTestId('record-blanks').or(page.getByTestId('to-desk')).first().waitFor();
      if ((await page.getByTestId('record-blanks').count()) === 0) break;
      const before = blanksRead();
      await page.getByTestId('record-blanks').click();
      await expect.poll(blanksRead, { timeout: 15_000 }).not.toEqual(before);
    }
    const empty = truth.flatMap(({ candidate, answers }) => answers.filter(({ kind }) => kind === 'blank').map(({ itemNumber }) => `${candidate} ${itemNumber}`));
    expect(empty.length).toBeGreaterThan(0);
    expect(empty).toEqual(expect.arrayContaining(blanksRead()));
    expect(blanksRead().length).toBeGreaterThan(empty.length / 2);
    expect(complaints).toEqual([]);
    await context.close();
  }, 120_000);

  /** Candidate and item of every reading that says blank. */
  const blanksRead = (): string[] =>
    bench.server.context.db.$client
      .prepare("select c.number || ' ' || i.number from reading r join answer a on a.id = r.answer join item i on i.id = a.item join script s on s.id = a.script join candidate c on c.id = s.candidate where r.code = 'blank' order by 1")
      .pluck()
      .all() as string[];

  it('the numbers are read blind, one by one', async () => {
    const { page, context, complaints } = await openPage(bench, 'readerTwo', 'phone', 'dark');
    const lead = actorOf(bench.server, 'lead');
    const numbers = new Map(candidatesOf(bench.server.context, lead, sittingId).map(({ id, number }) => [scriptOfCandidate(bench.server.context.db, id)?.id ?? '', exchanged[number] ?? number]));
    await page.goto(`${bench.address}/sittings/${sittingId}/numbers`);
    for (let left = count; left > 0; left -= 1) {
      await page.getByText(`${left} to read`, { exact: true }).waitFor();
      const address = (await page.getByRole('img', { name: 'The number as it was written' }).first().getAttribute('src')) ?? '';
      const script = /scripts\/([^/]+)\//.exec(address)?.[1] ?? '';
      await page.getByTestId('number-field').fill(numbers.get(script) ?? expect.fail(`No script ${script}.`));
      await page.getByTestId('number-field').press('Enter');
    }
    await page.getByText('Every number has been read').waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('a lead sees every page in place, and exchanges the two sheets by keyboard', async () => {
    const { page, context, complaints } = await openPage(bench, 'lead', 'wide');
    await page.goto(`${bench.address}/sittings/${sittingId}/people`);
    await page.getByText(`${count * 2} of ${count * 2} pages in place`).waitFor();
    expect(await page.getByText('the two were exchanged').count()).toBe(2);
    await page.getByTestId('swap-W4007').focus();
    await page.keyboard.press('Enter');
    await page.getByTestId('people-dialog').waitFor();
    await page.getByTestId('people-go').focus();
    await page.keyboard.press('Enter');
    await page.getByText(`${count} numbers agree`).waitFor();
    expect(await page.getByText('the two were exchanged').count()).toBe(0);
    await page.getByText('Script 7: W4007 to W4008').waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });
});
