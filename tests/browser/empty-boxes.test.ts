import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { axeViolations } from '../support/axe';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { doubtFrame, judgeInk } from '../support/empty-boxes';
import { giveEvidence } from '../support/evidence';
import { buildPaper, type BuiltPaper } from '../support/paper';

const candidates = Array.from({ length: 9 }, (_, index) => `W${4071 + index}`);

describe('boxes that look empty', () => {
  let bench: BrowserBench;
  let built: BuiltPaper;
  beforeAll(async () => {
    bench = await startBrowserBench();
  });
  afterAll(() => bench.close());

  const fresh = (): void => {
    built = buildPaper(bench.server, { candidates });
    judgeInk(bench.server, giveEvidence(bench.server, built.sittingId), ['W4079']);
  };
  const blanks = (): number => bench.server.context.db.$client.prepare("select count(*) from reading join answer on answer.id = reading.answer left join reading_end on reading_end.reading = reading.id where answer.sitting = ? and code = 'blank' and reading_end.reading is null").pluck().get(built.sittingId) as number;
  const leased = (): number => bench.server.context.db.$client.prepare('select count(*) from lease join answer on answer.id = lease.answer where answer.sitting = ? and ended_at is null').pluck().get(built.sittingId) as number;

  it('are confirmed by keyboard alone, one unticked, taken back and confirmed again to the end', async () => {
    fresh();
    const { page, context } = await openPage(bench, 'readerOne', 'wide');
    await page.goto(`${bench.address}/desk/${built.sittingId}`);
    await page.getByTestId('empty-boxes-head').click();
    await page.locator('[data-testid^="box-"]').first().waitFor();
    expect(await page.locator('[data-testid^="box-"]').count()).toBe(8);
    expect(await page.getByTestId('box-W4079').count()).toBe(0);
    await page.waitForFunction(() => document.activeElement?.getAttribute('role') === 'checkbox');
    await page.keyboard.press('ArrowRight');
    await page.keyboard.press(' ');
    expect(await page.getByTestId('record-blanks').textContent()).toContain('These 7 are blank');
    expect(await page.locator('[role="checkbox"][aria-checked="false"]').count()).toBe(1);
    expect(await page.evaluate(() => document.activeElement?.getAttribute('aria-checked'))).toBe('false');
    await page.keyboard.press('Enter');
    await page.getByTestId('take-back-blanks').waitFor();
    expect(blanks()).toBe(7);
    await page.getByText('7 recorded as blank.').waitFor();
    await page.keyboard.press('u');
    await page.getByText('7 taken back. Here they are again.').waitFor();
    await page.getByText('These 8 are blank').waitFor();
    expect(blanks()).toBe(0);
    await page.waitForFunction(() => document.activeElement?.getAttribute('role') === 'checkbox');
    await page.keyboard.press('Enter');
    await page.getByText('8 recorded as blank.').waitFor();
    await page.getByText('Fe').first().waitFor();
    await page.waitForFunction(() => document.activeElement?.getAttribute('role') === 'checkbox');
    await page.keyboard.press('Enter');
    await page.getByText('All boxes that looked empty are seen').waitFor();
    expect(blanks()).toBe(16);
    await page.getByTestId('to-desk').click();
    await page.getByTestId('desk-candidate').waitFor();
    expect(await page.getByTestId('desk-candidate').textContent()).toBe('W4079');
    await context.close();
  });

  it('are confirmed by touch; what is left unread goes back', async () => {
    fresh();
    const { page, context } = await openPage(bench, 'readerTwo', 'phone');
    await page.goto(`${bench.address}/sittings/${built.sittingId}/blanks`);
    await page.getByTestId('box-W4072').tap();
    await page.getByText('1 stays for the desk').waitFor();
    expect(await axeViolations(page)).toEqual([]);
    await page.getByTestId('record-blanks').tap();
    await page.getByText('7 recorded as blank.').waitFor();
    expect(blanks()).toBe(7);
    await page.getByRole('link', { name: 'Desk' }).tap();
    await page.getByTestId('desk-candidate').waitFor();
    await expect.poll(leased, { timeout: 10_000 }).toBeLessThanOrEqual(5);
    await context.close();
  });

  it('of a frame not seen whole say so at the desk, with the page one press away', async () => {
    built = buildPaper(bench.server, { candidates: ['W4071'] });
    for (const { id } of giveEvidence(bench.server, built.sittingId)) doubtFrame(bench.server, id);
    const { page, context } = await openPage(bench, 'readerOne', 'wide');
    await page.goto(`${bench.address}/desk/${built.sittingId}`);
    await page.getByText('Check position: the frame was not seen whole.').waitFor();
    expect(await axeViolations(page)).toEqual([]);
    await page.getByTestId('show-whole-page').click();
    await page.getByText('Hide the page').waitFor();
    await context.close();
  });
});
