import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { inTransaction } from '../../db/client';
import type { ItemDraft } from '../../shared/contracts/items';
import { createItem } from '../../server/services/items';
import { giveLease } from '../../server/services/desk';
import { recordReading } from '../../server/services/readings';
import { changeSitting } from '../../server/services/sittings';
import { createBatch } from '../../server/services/batches';
import { receiveFile } from '../../server/services/uploads';
import { axeViolations } from '../support/axe';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { judgeInk } from '../support/empty-boxes';
import { giveEvidence } from '../support/evidence';
import { actorOf, buildPaper, itemDraft } from '../support/paper';
import { pageJpeg } from '../support/pictures';

/** A choice, an order, a difference, a typed key, and a link with all that costs and pays beside it. */
function ofEveryKind(first: string): ItemDraft[] {
  const options = ['O', 'F', 'N', 'C'].map((symbol) => ({ symbol, charge: 0, electron: '2p' }));
  const chlorine = itemDraft().asked;
  return [
    itemDraft('', '', { kind: 'choice', printed: { question: 'greatest', options, partMarks: [] } }),
    itemDraft('', '', { kind: 'order', printed: { question: 'increasing', options, partMarks: [{ inPlace: 2, marks: '1' }] } }),
    itemDraft('Cl', '3p', { asked: { ...chlorine, quantity: 'difference', other: { symbol: 'S', charge: 0, electron: '3p' } } }),
    itemDraft('', '', { asked: { symbol: '', charge: 0, electron: '', quantity: 'value', convention: 'typed', typed: { label: 'A wavelength', value: '121.6', unit: 'nm', source: 'by hand' } }, prompt: 'Find the wavelength, to one decimal.', decimals: 1, roundings: { downToDecimals: null, truncation: false } }),
    itemDraft('Cl', '3p', { asked: { ...chlorine, quantity: 'energy-ev' }, followThrough: { from: first, second: null, isTrivial: false }, methodMarks: [{ id: 'groups', text: 'Groups written out', marks: '1' }], unitCost: '0.5', signCost: '1' }),
  ];
}

/** A sitting with something of everything: an open paper beside it, pairs that agree and differ, a loose page. */
async function somethingOfEverything(bench: BrowserBench): Promise<{ open: string; locked: string; empty: string; kinds: readonly string[] }> {
  const { server } = bench;
  const { context, people } = server;
  const paper = buildPaper(server, { locked: false });
  const open = paper.sittingId;
  const kinds = ofEveryKind(paper.items[0] ?? '').map((draft) => createItem(context, actorOf(server, 'lead'), open, draft).id);
  const locked = buildPaper(server).sittingId;
  changeSitting(context, actorOf(server, 'lead'), locked, context.db.$client.prepare('select rev from sitting where id = ?').pluck().get(locked) as number, { secondPolicy: 'all' });
  const answers = giveEvidence(server, locked);
  const texts: readonly (readonly [string, string])[] = [['6.10', '5.75'], ['3.75', '3.70'], ['6.10', '6.10'], ['3.8', '3.80'], ['6.1', '6.7']];
  texts.forEach((pair, index) => {
    const answer = answers[index];
    pair.forEach((text, at) => {
      const reader = at === 0 ? people.readerOne : people.readerTwo;
      const leaseId = inTransaction(context.db, () => giveLease(context, answer?.id ?? '', reader));
      recordReading(context, { personId: reader, isOfficer: false }, uuidv7(), { answerId: answer?.id ?? '', leaseId, text, method: [], openedAt: 1 });
    });
  });
  const folder = mkdtempSync(join(tmpdir(), 'meniscus-loose-'));
  writeFileSync(join(folder, 'scan0001.jpg'), await pageJpeg(1));
  const batch = createBatch(context, actorOf(server, 'readerOne'), locked, 'B');
  await receiveFile(context, actorOf(server, 'readerOne'), batch.id, join(folder, 'scan0001.jpg'));
  await context.jobs.settle();
  const empty = buildPaper(server, { candidates: Array.from({ length: 30 }, (_, index) => `W${4071 + index}`) }).sittingId;
  judgeInk(server, giveEvidence(server, empty));
  return { open, locked, empty, kinds };
}

const settled = async (page: Page): Promise<void> => {
  await page.waitForLoadState('networkidle');
  await page.evaluate(() => document.fonts.ready);
};

describe('axe finds nothing', () => {
  let bench: BrowserBench;
  let world: { open: string; locked: string; empty: string; kinds: readonly string[] };
  beforeAll(async () => {
    bench = await startBrowserBench();
    world = await somethingOfEverything(bench);
  });
  afterAll(() => bench.close());

  const variants = (['wide', 'phone'] as const).flatMap((viewport) => (['light', 'dark'] as const).map((scheme) => ({ viewport, scheme })));

  it.each(variants)('at the door, $viewport, $scheme', async ({ viewport, scheme }) => {
    const { page, context } = await openPage(bench, null, viewport, scheme);
    await page.goto(`${bench.address}/sign-in`);
    await page.getByLabel('Password').waitFor();
    expect(await axeViolations(page)).toEqual([]);
    await context.close();
  });

  it.each(variants)('on the screens of a lead, $viewport, $scheme', async ({ viewport, scheme }) => {
    const { page, context } = await openPage(bench, 'lead', viewport, scheme);
    // Without events the network comes to rest, and the tray asks by itself.
    await page.addInitScript(() => void Reflect.deleteProperty(window, 'EventSource'));
    const { open, locked, kinds } = world;
    for (const path of ['', 'settings', `sittings/${locked}`, `sittings/${open}/paper`, ...kinds.map((item) => `sittings/${open}/paper?item=${item}`), `sittings/${open}/vetting`, `sittings/${open}/regions`, `sittings/${locked}/regions`, `sittings/${locked}/class-list`, `sittings/${locked}/sheets`, `sittings/${open}/sheets`, `sittings/${locked}/scans`, `sittings/${locked}/sorting`, `sittings/${locked}/people`, `sittings/${locked}/numbers`, `sittings/${locked}/by-hand`, `sittings/${locked}/moderation`, `sittings/${locked}/marks`, 'nowhere']) {
      await page.goto(`${bench.address}/${path}`);
      await settled(page);
      expect(await axeViolations(page), path || 'bench').toEqual([]);
    }
    await context.close();
  });

  it.each(variants.map((variant, index) => ({ ...variant, index })))('in the side sheet, before and after the own reading, $viewport, $scheme', async ({ viewport, scheme, index }) => {
    const { page, context } = await openPage(bench, 'lead', viewport, scheme);
    await page.goto(`${bench.address}/sittings/${world.locked}/moderation?show=to-rule`);
    // Each in turn: what a lead has typed stays typed.
    await page.locator('[data-testid^="row-"]').nth(index).click();
    await page.getByTestId('third-reading').waitFor();
    await settled(page);
    expect(await axeViolations(page), 'covered').toEqual([]);
    await page.getByTestId('third-reading').fill('6.10');
    await page.getByTestId('record-third').click();
    await page.getByTestId('rule').waitFor();
    await settled(page);
    expect(await axeViolations(page), 'uncovered').toEqual([]);
    await context.close();
  });

  it.each(variants)('on a sheet of empty boxes, whole and with one unticked, $viewport, $scheme', async ({ viewport, scheme }) => {
    const { page, context } = await openPage(bench, 'readerOne', viewport, scheme);
    await page.goto(`${bench.address}/sittings/${world.empty}/blanks`);
    await page.locator('[data-testid^="box-"]').first().waitFor();
    await settled(page);
    expect(await axeViolations(page), 'whole').toEqual([]);
    await page.locator('[data-testid^="box-"]').first().click();
    await page.getByText('1 stays for the desk').waitFor();
    expect(await axeViolations(page), 'unticked').toEqual([]);
    await context.close();
  });

  it.each(variants)('at the desk, its codes, its note and its keys, $viewport, $scheme', async ({ viewport, scheme }) => {
    const { page, context } = await openPage(bench, 'readerOne', viewport, scheme);
    await page.goto(`${bench.address}/desk/${world.locked}`);
    await page.getByTestId('desk-candidate').waitFor();
    await settled(page);
    expect(await axeViolations(page), 'desk').toEqual([]);
    await page.getByTestId('other').click();
    expect(await axeViolations(page), 'codes').toEqual([]);
    await page.keyboard.press('Escape');
    for (const [key, dialog] of [['n', 'note-dialog'], ['?', 'keys-dialog']] as const) {
      await page.getByTestId('desk-field').focus();
      await page.keyboard.press(key);
      await page.getByTestId(dialog).waitFor();
      expect(await axeViolations(page), dialog).toEqual([]);
      await page.keyboard.press('Escape');
    }
    await context.close();
  });
});
