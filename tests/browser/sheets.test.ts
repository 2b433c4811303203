import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { importClassList } from '../../server/services/class-list';
import { createItem } from '../../server/services/items';
import { createSitting } from '../../server/services/sittings';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { actorOf, itemDraft } from '../support/paper';

describe('printing sheets on screen', () => {
  let bench: BrowserBench;
  beforeAll(async () => void (bench = await startBrowserBench()));
  afterAll(() => bench.close());

  /** An open paper of eight items and three candidates, nothing drawn. */
  function undrawn(): string {
    const { context, courseId } = bench.server;
    const lead = actorOf(bench.server, 'lead');
    const { id } = createSitting(context, lead, courseId, { title: 'Paper 3', heldOn: '2026-05-20', secondPolicy: 'none', totalRounding: 'none' });
    for (const symbol of ['C', 'N', 'O', 'F', 'Ne', 'B', 'Al', 'Cl']) createItem(context, lead, id, itemDraft(symbol, symbol === 'Al' || symbol === 'Cl' ? '3p' : '2p'));
    importClassList(context, lead, id, 'W4071\nW4072\nW4073');
    return id;
  }

  it('says what will be made, locks the paper, makes the PDF and hands it over', async () => {
    const sittingId = undrawn();
    const { page, context, complaints } = await openPage(bench, 'lead', 'wide');
    await page.goto(`${bench.address}/sittings/${sittingId}/sheets`);
    await page.getByTestId('sheet-page').waitFor();
    expect(await page.getByTestId('make-sheets').isDisabled()).toBe(true);
    expect(await page.getByRole('img', { name: 'Page 1 of 2 of the answer sheets, as printed for W4071' }).count()).toBe(1);
    await page.getByTestId('next-sheet-page').click();
    expect(await page.getByTestId('sheet-page-no').textContent()).toBe('Page 2 of 2');
    await page.getByTestId('lock-for-printing').click();
    await page.getByTestId('confirm-lock').click();
    await page.getByTestId('lock-for-printing').waitFor({ state: 'detached' });
    await page.getByTestId('spares').fill('2.5');
    expect(await page.getByTestId('make-sheets').isDisabled()).toBe(true);
    await page.getByTestId('spares').fill('2');
    expect(await page.getByTestId('sheets-amount').textContent()).toBe('3 candidates, 2 spares, 10 pages');
    await page.getByTestId('make-sheets').click();
    await page.getByTestId('download-2').waitFor();
    const [file] = await Promise.all([page.waitForEvent('download'), page.getByTestId('download-2').click()]);
    expect(file.suggestedFilename()).toMatch(/^answer-sheets-\d+-layout-2\.pdf$/);
    await page.getByText('Printed again, pages say layout 3').waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('opens the sheet whole on a phone, and comes back', async () => {
    const { page, context } = await openPage(bench, 'external', 'phone', 'dark');
    await page.goto(`${bench.address}/sittings/${undrawn()}/sheets`);
    await page.getByTestId('see-sheet').click();
    await page.getByTestId('sheet-page').waitFor();
    const { width = 0, height = 0 } = (await page.getByTestId('sheet-page').boundingBox()) ?? {};
    expect(width).toBeLessThanOrEqual(390);
    expect(height / width).toBeCloseTo(297 / 210, 2);
    await page.getByRole('button', { name: 'Back to the settings' }).click();
    await page.getByTestId('see-sheet').waitFor();
    expect(await page.getByTestId('make-sheets').count()).toBe(0);
    await context.close();
  });
});
