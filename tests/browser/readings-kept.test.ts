import type { BrowserContext, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { cast, castPassword, type CastName } from '../support/cast';
import { buildDemoSitting } from '../support/demo-sitting';
import { giveEvidence } from '../support/evidence';

/** Readings on their way: what happens to them when the connection, the session or the page does not last. */
describe('readings kept on the device', () => {
  let bench: BrowserBench;
  let page: Page;
  let context: BrowserContext;
  let desk: string;

  beforeAll(async () => {
    bench = await startBrowserBench();
    const built = buildDemoSitting(bench.server, Array.from({ length: 20 }, (_, index) => `W${5001 + index}`), 1);
    giveEvidence(bench.server, built.sittingId);
    desk = `${bench.address}/desk/${built.sittingId}`;
    ({ page, context } = await openPage(bench, 'readerOne', 'wide'));
    await page.goto(desk);
    await page.getByTestId('desk-field').waitFor();
  });
  afterAll(() => bench.close());

  const timesStored = (text: string): unknown => bench.server.context.db.$client.prepare('select count(*) from reading where text = ?').pluck().get(text);
  const stored = (text: string) => expect.poll(() => timesStored(text), { timeout: 20_000 }).toBe(1);
  const candidate = async () => (await page.getByTestId('desk-candidate').textContent()) ?? '';

  /** Types and records, and waits until another answer is there. */
  async function read(text: string): Promise<string> {
    const before = await candidate();
    await page.keyboard.type(text);
    await page.keyboard.press('Enter');
    await page.waitForFunction((number) => document.querySelector('[data-testid="desk-candidate"]')?.textContent !== number, before);
    return before;
  }

  async function signIn(name: CastName): Promise<void> {
    await page.getByLabel(/mail/i).first().fill(cast[name].email);
    await page.getByLabel('Password', { exact: true }).fill(castPassword);
    await page.keyboard.press('Enter');
    await page.waitForURL((url) => url.pathname === '/');
  }

  it('waits out a lost connection, says how many wait, and says Recorded only once they are at the server', async () => {
    await context.setOffline(true);
    await read('1.01');
    const last = await read('1.02');
    await page.getByText('No connection. 2 readings are kept on this device and go when it returns.').waitFor();
    expect(await page.getByTestId('desk-said').textContent()).toBe('');
    expect([timesStored('1.01'), timesStored('1.02')]).toEqual([0, 0]);
    await context.setOffline(false);
    await page.waitForFunction((said) => document.querySelector('[data-testid="desk-said"]')?.textContent === said, `Recorded ${last}`);
    expect([timesStored('1.01'), timesStored('1.02')]).toEqual([1, 1]);
    await page.getByTestId('offline').waitFor({ state: 'detached' });
  });

  it('stores a reading once though the answer of the server was lost twice', async () => {
    let lost = 0;
    await page.route('**/api/readings/*', async (route) => {
      lost += 1;
      if (lost > 2) return route.continue();
      await route.fetch();
      return route.abort();
    });
    await read('1.03');
    await expect.poll(() => lost, { timeout: 20_000 }).toBeGreaterThan(2);
    await stored('1.03');
    await page.unroute('**/api/readings/*');
  });

  it('keeps a reading over a reload of the page, and stays with the item', async () => {
    await page.route('**/api/readings/*', (route) => route.abort());
    await read('1.04');
    const address = page.url();
    expect(address).toContain('item=');
    await page.reload();
    await page.getByTestId('desk-field').waitFor();
    expect(page.url()).toBe(address);
    expect(timesStored('1.04')).toBe(0);
    await page.unroute('**/api/readings/*');
    await stored('1.04');
  });

  it('names a refused reading with what was typed, and sends it again when asked', async () => {
    await page.route('**/api/readings/*', (route) => route.fulfill({ status: 409, json: { error: { code: 'conflict', message: 'Not now.', requestId: 'test' } } }));
    const number = await read('1.05');
    await page.getByText(`${number}, 1.05: Not now.`).waitFor();
    await page.unroute('**/api/readings/*');
    await page.getByRole('button', { name: `Send ${number} again` }).click();
    await stored('1.05');
  });

  it('swallows no figure of a fast hand, and a press on a tool leaves the focus in the field', async () => {
    await page.keyboard.type('1.06');
    await page.keyboard.press('Enter');
    await page.keyboard.type('1.07');
    await page.getByRole('button', { name: 'Turn' }).click();
    await page.keyboard.type('5');
    expect(await page.getByTestId('desk-field').inputValue()).toBe('1.075');
    await page.keyboard.press('Enter');
    await stored('1.06');
    await stored('1.075');
  });

  it('does not send under another person, and sends from any screen once its own is back', async () => {
    await context.clearCookies();
    await read('1.08');
    await page.getByText('You are signed out. 1 reading is kept on this device until you sign in again.').waitFor();
    await page.getByRole('button', { name: 'Sign in' }).click();
    await signIn('readerTwo');
    await page.goto(desk);
    await page.getByTestId('desk-field').waitFor();
    await page.keyboard.type('1.09');
    await page.keyboard.press('Enter');
    await stored('1.09');
    expect(timesStored('1.08')).toBe(0);
    await context.clearCookies();
    await page.goto(`${bench.address}/sign-in`);
    await signIn('readerOne');
    await stored('1.08');
  });
});
