import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { inTransaction } from '../../db/client';
import { giveLease } from '../../server/services/desk';
import { recordReading } from '../../server/services/readings';
import { axeViolations } from '../support/axe';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { giveEvidence } from '../support/evidence';
import { buildPaper, itemDraft, type BuiltPaper } from '../support/paper';

const methodMarks = [{ id: 'groups', text: 'Writes the groups as Slater does', marks: '1' }, { id: 'count', text: 'Counts six others in the same group', marks: '1' }];
const options = [{ symbol: 'Li', charge: 0, electron: '2s' }, { symbol: 'F', charge: 0, electron: '2p' }, { symbol: 'C', charge: 0, electron: '2p' }];

describe('method marks and printed numbers at the desk', () => {
  let bench: BrowserBench;
  let built: BuiltPaper;

  beforeAll(async () => {
    bench = await startBrowserBench();
    built = buildPaper(bench.server, {
      drafts: [itemDraft('Cl', '3p', { marks: '4', methodMarks, twoAnswers: 'last' }), itemDraft('', '', { kind: 'order', printed: { question: 'increasing', options, partMarks: [] } })],
      candidates: Array.from({ length: 16 }, (_, index) => `W${4071 + index}`),
    });
    const pair = giveEvidence(bench.server, built.sittingId).find(({ candidate, itemId }) => candidate === 'W4074' && itemId === built.items[0])?.id ?? '';
    const { context, people } = bench.server;
    const readTwice = context.db.$client.prepare('update sitting set second_policy = ? where id = ?');
    readTwice.run('all', built.sittingId);
    for (const [reader, method] of [[people.readerOne, ['groups', 'count']], [people.readerTwo, ['groups']]] as const) {
      const leaseId = inTransaction(context.db, () => giveLease(context, pair, reader));
      recordReading(context, { personId: reader, isOfficer: false }, uuidv7(), { answerId: pair, leaseId, text: '5.75', method: [...method], openedAt: 1 });
    }
    readTwice.run('none', built.sittingId);
  });
  afterAll(() => bench.close());

  const methodOf = (text: string): unknown => bench.server.context.db.$client.prepare('select method from reading where text = ?').pluck().get(text);
  const stored = (text: string, method: string) => expect.poll(() => methodOf(text), { timeout: 20_000 }).toBe(method);
  const deskOf = (item: number): string => `${bench.address}/desk/${built.sittingId}?item=${built.items[item - 1]}`;

  // The pictures of this evidence are not drawn, so the page complains of them.
  it('are struck by keyboard, with a value typed and before one is, and begin anew with the next answer', async () => {
    const { page, context } = await openPage(bench, 'readerOne', 'wide');
    await page.goto(deskOf(1));
    await page.getByTestId('desk-field').waitFor();
    const isStruck = (number: number) => page.getByTestId(`method-${number}`).getAttribute('aria-checked');
    await page.keyboard.press('m');
    await page.getByText('Which, 1 to 2?').waitFor();
    await page.keyboard.press('1');
    await page.keyboard.type('6.10');
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('2');
    expect([await isStruck(1), await isStruck(2), await page.getByTestId('desk-field').inputValue()]).toEqual(['true', 'true', '6.10']);
    // The same again takes one off.
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('1');
    const before = await page.getByTestId('desk-candidate').textContent();
    await page.keyboard.press('Enter');
    await page.waitForFunction((number) => document.querySelector('[data-testid="desk-candidate"]')?.textContent !== number, before);
    expect([await isStruck(1), await isStruck(2)]).toEqual(['false', 'false']);
    await stored('6.10', 'count');
    await page.getByText('method 2', { exact: true }).waitFor();
    // In the choice of a code the figures are its own, until a method mark is begun.
    await page.keyboard.press('w');
    await page.getByText('Two answers standing: type the last one.').waitFor();
    await page.keyboard.press('m');
    await page.keyboard.press('2');
    await page.keyboard.press('1');
    expect(await isStruck(2)).toBe('true');
    await page.getByRole('button', { name: 'Record crossed out' }).waitFor();
    expect(await axeViolations(page)).toEqual([]);
    // Escape leaves the choice, then takes off what is struck, and stays at the desk.
    await page.keyboard.press('Escape');
    await page.keyboard.press('Escape');
    expect(await isStruck(2)).toBe('false');
    await context.close();
  });

  it('are struck by touch, and go with a blank too', async () => {
    const { page, context } = await openPage(bench, 'readerTwo', 'phone');
    await page.goto(deskOf(1));
    await page.getByTestId('method-1').tap();
    expect(await page.getByTestId('method-1').getAttribute('aria-checked')).toBe('true');
    expect(await axeViolations(page)).toEqual([]);
    await page.getByTestId('code-blank').tap();
    await expect.poll(() => bench.server.context.db.$client.prepare("select method from reading where code = 'blank'").pluck().get(), { timeout: 20_000 }).toBe('groups');
    expect(await page.getByTestId('method-1').getAttribute('aria-checked')).toBe('false');
    // Where the screen is short the numbers stand for the texts, and a sheet has those.
    await page.setViewportSize({ width: 375, height: 667 });
    await page.getByTestId('method-texts').tap();
    await page.getByTestId('method-sheet').getByTestId('method-2').tap();
    await page.keyboard.press('Escape');
    expect(await page.getByTestId('method-2').getAttribute('aria-checked')).toBe('true');
    await context.close();
  });

  it('a reading kept on the device from before there were any is sent, with none', async () => {
    const { server, address } = bench;
    const answer = server.context.db.$client.prepare("select id from answer where item = ? and readings_due > 0 and id not in (select answer from lease where ended_at is null)").pluck().get(built.items[0]) as string;
    const leaseId = inTransaction(server.context.db, () => giveLease(server.context, answer, server.people.readerTwo));
    const { page, context } = await openPage(bench, 'readerTwo', 'wide');
    await page.goto(`${address}/settings`);
    const kept = { id: uuidv7(), sittingId: built.sittingId, itemId: built.items[0], answerId: answer, leaseId, candidateNumber: 'W4071', text: '7.77', openedAt: 1, keptAt: 1 };
    await page.evaluate(
      ({ name, reading }) =>
        new Promise<void>((done, failed) => {
          const opening = indexedDB.open(name);
          opening.onupgradeneeded = () => opening.result.createObjectStore('readings');
          opening.onerror = () => failed(opening.error);
          opening.onsuccess = () => {
            const writing = opening.result.transaction('readings', 'readwrite');
            writing.objectStore('readings').put(reading, reading.id);
            writing.oncomplete = () => {
              opening.result.close();
              done();
            };
          };
        }),
      { name: `meniscus-readings-${server.people.readerTwo}`, reading: kept },
    );
    await page.reload();
    await stored('7.77', '');
    await context.close();
  });

  it('printed numbers have a pad of digits and a space, and are read back in their order', async () => {
    const { page, context } = await openPage(bench, 'readerTwo', 'phone');
    await page.goto(deskOf(2));
    const pad = page.getByRole('group', { name: 'Keypad' });
    await pad.waitFor();
    const keys = await pad.getByRole('button').allTextContents();
    expect(keys.sort()).toEqual(['0', '1', '2', '3', '4', '5', '6', '7', '8', '9', 'Blank', 'Other', 'Record', 'space']);
    for (const key of ['3', 'space', '1', '2']) await pad.getByRole('button', { name: key, exact: true }).tap();
    await page.getByText('Three numbers in this order.').waitFor();
    await page.getByTestId('record').tap();
    await stored('3 12', '');
    await context.close();
  });

  it('a lead strikes them in the sheet, and sees that a pair differs in nothing else', async () => {
    const { page, context } = await openPage(bench, 'lead', 'wide');
    await page.goto(`${bench.address}/sittings/${built.sittingId}/moderation?find=W4074`);
    await page.getByTestId('row-W4074-1').click();
    await page.getByTestId('third-reading').waitFor();
    expect(await page.getByTestId('method-compare').count()).toBe(0);
    await page.getByText('Writes the groups as Slater does, 1 mark').waitFor();
    await page.keyboard.press('m');
    await page.keyboard.press('1');
    await page.keyboard.type('5.75');
    await page.keyboard.press('Enter');
    await page.getByTestId('only-method').waitFor();
    expect(await page.getByTestId('compared-2').textContent()).toContain('differs');
    expect(await page.getByTestId('compared-1').textContent()).not.toContain('differs');
    await page.getByRole('button', { name: 'Rule 5.75 with method 1, 1 mark' }).waitFor();
    expect(await axeViolations(page)).toEqual([]);
    await page.keyboard.press('Enter');
    await page.getByTestId('standing').getByText('Ruled by you: 5.75 with method 1, 1 mark').waitFor();
    await context.close();
  });
});
