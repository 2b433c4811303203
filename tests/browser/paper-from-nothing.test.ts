import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { VettingItem } from '../../shared/contracts/vetting';
import { importClassList } from '../../server/services/class-list';
import { saveLayout } from '../../server/services/layouts';
import { createSitting } from '../../server/services/sittings';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { walkTo } from '../support/by-keyboard';
import { actorOf, layoutFor } from '../support/paper';

const savedLine = (page: Page) => page.getByTestId('save-line').filter({ hasText: /^saved/ }).waitFor();

describe('a paper from nothing', () => {
  let bench: BrowserBench;
  let sittingId: string;
  beforeAll(async () => {
    bench = await startBrowserBench();
    const { context } = bench.server;
    const lead = actorOf(bench.server, 'lead');
    sittingId = createSitting(context, lead, bench.server.courseId, { title: 'Paper 3, from nothing', heldOn: '2026-05-20', secondPolicy: 'none', totalRounding: 'none' }).id;
    importClassList(context, lead, sittingId, 'W5001\nW5002');
  });
  afterAll(() => bench.close());

  const paper = () => `${bench.address}/sittings/${sittingId}/paper`;
  const items = async (page: Page) => (await (await page.request.get(`${bench.address}/api/sittings/${sittingId}/items`)).json() as { items: { id: string; number: number; worked: { label: string; key: { text: string } } }[] }).items;

  it('grows by keyboard alone, an element found by typing, and by touch', { timeout: 120_000 }, async () => {
    const wide = await openPage(bench, 'lead', 'wide');
    await wide.page.goto(paper());
    await wide.page.getByTestId('add-item').waitFor();
    for (const [index, symbol] of ['Li', 'Be', 'B', 'C', 'N', 'O', 'Cl'].entries()) {
      await walkTo(wide.page, 'add-item');
      await wide.page.keyboard.press('Enter');
      await wide.page.getByRole('heading', { name: `Item ${index + 1},` }).first().waitFor();
      if (symbol !== 'Cl') continue;
      await walkTo(wide.page, 'element');
      await wide.page.keyboard.press('Enter');
      await wide.page.getByTestId('find-element').waitFor();
      await wide.page.keyboard.type('Cl');
      await wide.page.keyboard.press('Enter');
      await wide.page.getByRole('heading', { name: /Item 7, .* of Cl 2p/ }).first().waitFor();
      await walkTo(wide.page, 'electron');
      await wide.page.keyboard.type('3p');
      await wide.page.getByRole('heading', { name: /Item 7, .* of Cl 3p/ }).first().waitFor();
    }
    await savedLine(wide.page);
    expect(wide.complaints).toEqual([]);
    await wide.context.close();

    const phone = await openPage(bench, 'lead', 'phone');
    await phone.page.goto(paper());
    for (let number = 8; number <= 12; number += 1) {
      await phone.page.getByTestId('add-item').tap();
      await phone.page.getByRole('heading', { name: `Item ${number},` }).first().waitFor();
      await phone.page.getByRole('button', { name: 'Items', exact: true }).first().tap();
    }
    // Slater's rules worked by hand from the coefficients (Phys. Rev. 36, 57, 1930); 4.55 for O 2p is also the common textbook value.
    const keys = (await items(phone.page)).map(({ worked }) => `${worked.label} ${worked.key.text}`);
    expect(keys.slice(0, 7)).toEqual(['Li 2s 1.30', 'Be 2s 1.95', 'B 2p 2.60', 'C 2p 3.25', 'N 2p 3.90', 'O 2p 4.55', 'Cl 3p 6.10']);
    expect(keys).toHaveLength(12);
    expect(phone.complaints).toEqual([]);
    await phone.context.close();
  });

  it('warns of a 5 % band, is locked, vetted by a second person and printed', { timeout: 120_000 }, async () => {
    const { page, context } = await openPage(bench, 'lead', 'wide');
    const seven = (await items(page))[6]?.id ?? '';
    saveLayout(bench.server.context, actorOf(bench.server, 'lead'), sittingId, 0, layoutFor((await items(page)).map(({ id }) => id)));
    await page.goto(paper());
    await page.getByTestId(`item-row-${seven}`).click();
    await page.getByTestId('add-band').click();
    await page.getByTestId('band-0').getByLabel('Kind').selectOption('relative');
    await page.getByTestId('band-0-width').fill('5');
    // 5 % of 6.10 reaches 5.795 to 6.405: 6.40, all inner electrons at 0.85, lies in it (17 - 6 x 0.35 - 10 x 0.85).
    const guard = page.getByTestId('guard');
    await guard.filter({ hasText: '6.40' }).waitFor();
    expect(await guard.innerText()).toMatch(/all inner electrons at 0\.85/);
    await savedLine(page);
    await page.getByTestId('band-0').getByRole('button', { name: /^Remove/ }).click();
    await guard.waitFor({ state: 'detached' });
    await savedLine(page);
    await page.getByTestId('lock-paper').click();
    await page.getByTestId('confirm-lock').click();
    await page.getByText(/^locked /).first().waitFor();
    const printed = await page.request.get(`${bench.address}/api/sittings/${sittingId}/paper.pdf`);
    expect([printed.status(), printed.headers()['content-type'], (await printed.body()).subarray(0, 5).toString()]).toEqual([200, 'application/pdf', '%PDF-']);
    await context.close();

    const second = await openPage(bench, 'external', 'wide');
    await second.page.goto(`${bench.address}/sittings/${sittingId}/vetting`);
    await second.page.getByTestId('vet-7').click();
    expect(await second.page.content()).not.toContain('6.10');
    await second.page.getByTestId('own-value').fill('6.10');
    await second.page.getByTestId('uncover').click();
    await second.page.getByText('as you worked it').waitFor();
    await second.page.getByTestId('sign-item').click();
    await second.page.getByText('1 of 12 items signed').waitFor();
    const vetted = ((await (await second.page.request.get(`${bench.address}/api/sittings/${sittingId}/vetting`)).json()) as { items: VettingItem[] }).items;
    expect(vetted.filter(({ vettings }) => vettings[0]?.outcome === 'signed').map(({ number }) => number)).toEqual([7]);
    await second.context.close();
  });
});
