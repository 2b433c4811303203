import axeSource from 'axe-core';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { cast, castPassword } from '../support/cast';
import { buildPaper } from '../support/paper';

/** What axe finds on the page as it stands, by the rules of WCAG 2.2 A and AA. */
async function axeViolations(page: Page): Promise<string[]> {
  await page.addScriptTag({ content: axeSource.source }).catch(() => undefined);
  const isThere = await page.evaluate(() => 'axe' in globalThis);
  if (!isThere) await page.evaluate(axeSource.source);
  return page.evaluate(async () => {
    const { axe } = globalThis as unknown as { axe: { run(options: object): Promise<{ violations: { id: string; nodes: { html: string }[] }[] }> } };
    const { violations } = await axe.run({ runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] });
    return violations.flatMap(({ id, nodes }) => nodes.map(({ html }) => `${id}: ${html}`));
  });
}

describe('a lead at work', () => {
  let bench: BrowserBench;
  let sittingId: string;
  beforeAll(async () => {
    bench = await startBrowserBench();
    ({ sittingId } = buildPaper(bench.server, { locked: false }));
  });
  afterAll(() => bench.close());

  it('signs in by keyboard alone and comes to the bench', async () => {
    const { page, context } = await openPage(bench, null, 'wide');
    await page.goto(bench.address);
    await page.getByLabel('E-mail').waitFor();
    await page.keyboard.type(cast.lead.email);
    await page.keyboard.press('Tab');
    await page.keyboard.type(castPassword);
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { name: 'Bench' }).waitFor();
    expect(await page.getByText('CHM 214, Paper 2, spring sitting').count()).toBe(1);
    await context.close();
  });

  it('is told in words when the password does not fit', async () => {
    const { page, context } = await openPage(bench, null, 'phone');
    await page.goto(`${bench.address}/sign-in`);
    await page.getByLabel('E-mail').fill(cast.lead.email);
    await page.getByLabel('Password').fill('not this one');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByText(/do not go together\. \d+ tries are left/).waitFor();
    await context.close();
  });

  it('tries a value against an item and reads the mark with its reason', async () => {
    const { page, context, complaints } = await openPage(bench, 'lead', 'wide');
    await page.goto(`${bench.address}/sittings/${sittingId}/paper`);
    const spot = page.getByTestId('spot-test-value');
    await spot.fill('6.1');
    // 6.1 is the key 6.10 to one decimal: Slater's rules for Cl 3p, 17 - (6 x 0.35 + 8 x 0.85 + 2 x 1.00).
    await page.getByText(/the key, rounded/i).first().waitFor();
    await spot.fill('5.75');
    await page.getByText(/nothing fits/i).first().waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('a reader does not get to the paper', async () => {
    const { page, context } = await openPage(bench, 'readerOne', 'wide');
    await page.goto(`${bench.address}/sittings/${sittingId}/paper`);
    await page.getByText('The paper with its keys is for leads and the external examiner').waitFor();
    expect(await page.getByRole('textbox').count()).toBe(0);
    expect(await page.content()).not.toContain('6.10');
    await context.close();
  });

  for (const viewport of ['wide', 'phone'] as const) {
    for (const scheme of ['light', 'dark'] as const) {
      it(`axe finds nothing on the screens, ${viewport}, ${scheme}`, async () => {
        const door = await openPage(bench, null, viewport, scheme);
        await door.page.goto(`${bench.address}/sign-in`);
        await door.page.getByLabel('Password').waitFor();
        expect(await axeViolations(door.page)).toEqual([]);
        await door.context.close();

        const { page, context } = await openPage(bench, 'lead', viewport, scheme);
        for (const path of ['', `sittings/${sittingId}/paper`, `sittings/${sittingId}/regions`, `sittings/${sittingId}/class-list`]) {
          await page.goto(`${bench.address}/${path}`);
          await page.waitForLoadState('networkidle');
          expect(await axeViolations(page), path || 'bench').toEqual([]);
        }
        await context.close();
      });
    }
  }
});
