import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { cast, castPassword } from '../support/cast';
import { buildPaper } from '../support/paper';

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
    await page.getByRole('group', { name: 'CHM 214, Paper 2, spring sitting' }).waitFor();
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
    await page.getByText(/fits a, b, counts the electron itself/i).first().waitFor();
    await spot.fill('5.76');
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
});
