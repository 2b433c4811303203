import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { ItemView } from '../../shared/contracts/items';
import { createItem } from '../../server/services/items';
import { saveLayout } from '../../server/services/layouts';
import { lockPaper } from '../../server/services/paper-lock';
import { createSitting } from '../../server/services/sittings';
import { axeViolations } from '../support/axe';
import { openPage, startBrowserBench, type BrowserBench } from '../support/browser';
import { actorOf, itemDraft, layoutFor } from '../support/paper';
import { choose, pickElement, typeInto, walkTo } from '../support/by-keyboard';

const savedLine = (page: Page) => page.getByTestId('save-line').filter({ hasText: /^saved/ }).waitFor();
/** What is half typed is offered to the server and refused with its field named; the browser writes that down too. */
const unexpected = (complaints: readonly string[]): string[] => complaints.filter((line) => !line.includes('status of 400'));
const head = (page: Page, name: RegExp) => page.getByRole('heading', { name, level: 1 }).first().waitFor();

describe('a paper of every kind of item', () => {
  let bench: BrowserBench;
  let sittingId: string;
  beforeAll(async () => {
    bench = await startBrowserBench();
  });
  afterAll(() => bench.close());

  const newSitting = (title: string): string => createSitting(bench.server.context, actorOf(bench.server, 'lead'), bench.server.courseId, { title, heldOn: '2026-05-20', secondPolicy: 'none', totalRounding: 'none' }).id;
  const items = async (page: Page): Promise<ItemView[]> => ((await (await page.request.get(`${bench.address}/api/sittings/${sittingId}/items`)).json()) as { items: ItemView[] }).items;
  const add = async (page: Page, number: number): Promise<void> => {
    await walkTo(page, 'add-item');
    await page.keyboard.press('Enter');
    await head(page, new RegExp(`^Item ${number},`));
  };

  it('is built by keyboard: a chain, a difference, a choice, an order, a typed key, method marks, a unit rule', { timeout: 300_000 }, async () => {
    sittingId = newSitting('Paper 4, of every kind');
    const { page, complaints, context } = await openPage(bench, 'lead', 'wide');
    await page.goto(`${bench.address}/sittings/${sittingId}/paper`);
    await page.getByTestId('add-item').waitFor();

    await add(page, 1);
    await pickElement(page, 'element', 'Cl');
    await choose(page, 'electron', '3p');
    await head(page, /^Item 1, .* of Cl 3p$/);
    await savedLine(page);

    // Item 2 takes up where item 1 left off, with two method marks beside the value, a unit and a sign that cost.
    await add(page, 2);
    await pickElement(page, 'element', 'Cl');
    await choose(page, 'electron', '3p');
    await choose(page, 'quantity', 'energy-ev');
    await head(page, /^Item 2, energy of Cl 3p/);
    await walkTo(page, 'add-follow');
    await page.keyboard.press('Enter');
    await page.getByTestId('chain').waitFor();
    for (const [index, text] of ['Groups written out', 'Third shell used'].entries()) {
      await walkTo(page, 'add-method-mark');
      await page.keyboard.press('Enter');
      await typeInto(page, `method-text-${index}`, text);
      await typeInto(page, `method-marks-${index}`, '0.5');
    }
    await walkTo(page, 'unit-rule');
    await page.keyboard.press('Space');
    await typeInto(page, 'unit-cost', '0.5');
    await walkTo(page, 'sign-rule');
    await page.keyboard.press('Space');
    expect(await page.getByTestId('method-sum').innerText()).toBe('Method 1 mark, the value 2: 3 in all.');
    await savedLine(page);

    // S 3p, then what Cl 3p has more: both electrons are followed.
    await add(page, 3);
    await pickElement(page, 'element', 'S');
    await choose(page, 'quantity', 'zeff');
    await choose(page, 'electron', '3p');
    await head(page, /^Item 3, .* of S 3p$/);
    await savedLine(page);
    await add(page, 4);
    await pickElement(page, 'element', 'Cl');
    await choose(page, 'electron', '3p');
    await choose(page, 'quantity', 'difference');
    await head(page, /^Item 4, .* of Cl 3p less S 3p$/);
    await walkTo(page, 'add-follow');
    await page.keyboard.press('Enter');
    await page.getByTestId('follow-second').waitFor();
    await page.getByTestId('difference-step').filter({ hasText: '6.10 − 5.45 = 0.65' }).waitFor();
    await savedLine(page);

    // A choice from the periodic table, one option moved.
    await add(page, 5);
    await pickElement(page, 'element', 'O');
    await choose(page, 'quantity', 'zeff');
    await choose(page, 'electron', '2p');
    await choose(page, 'kind', 'choice');
    await pickElement(page, 'add-option', 'N');
    await page.getByTestId('option-value-2').filter({ hasText: '3.90' }).waitFor();
    await walkTo(page, 'option-up-2');
    await page.keyboard.press('Enter');
    await page.getByTestId('answer').filter({ hasText: '3' }).waitFor();
    await savedLine(page);

    // An order of four; two options of one value are named, then mended.
    await add(page, 6);
    await choose(page, 'kind', 'order');
    await choose(page, 'question', 'increasing');
    await pickElement(page, 'option-0-element', 'O');
    await pickElement(page, 'option-1-element', 'F');
    await pickElement(page, 'add-option', 'O');
    await page.getByTestId('options-problem').filter({ hasText: 'Options 1 and 3 have the same value' }).waitFor();
    await pickElement(page, 'option-2-element', 'N');
    await pickElement(page, 'add-option', 'C');
    await page.getByTestId('answer').filter({ hasText: '4 3 1 2' }).waitFor();
    await walkTo(page, 'add-part-mark');
    await page.keyboard.press('Enter');
    await typeInto(page, 'part-marks-0', '1');
    await savedLine(page);

    // A key of the lead’s own: nothing is proposed, and it is said that nobody checked it.
    await add(page, 7);
    await choose(page, 'convention', 'typed');
    await page.getByTestId('unchecked').waitFor();
    await typeInto(page, 'typed-label', 'Wavelength of the line');
    await typeInto(page, 'typed-value', '121.6');
    await typeInto(page, 'typed-unit', 'nm');
    await typeInto(page, 'typed-source', 'Worked from the Rydberg constant by hand');
    await typeInto(page, 'prompt', 'Find the wavelength of the first line, in nm, to one decimal.');
    await savedLine(page);

    expect(unexpected(complaints)).toEqual([]);
    expect(await axeViolations(page)).toEqual([]);
    const paper = await items(page);
    // J. C. Slater, Phys. Rev. 36, 57 (1930), by hand: Cl 3p 17 - 10.90, S 3p 16 - 10.55; -13.605693 x (6.10 / 3)^2 = -56.25; C, N, O, F 2p 3.25, 3.90, 4.55, 5.20.
    expect(paper.map(({ worked }) => `${worked.label} ${worked.key?.text ?? ''}`)).toEqual(['Cl 3p 6.10', 'Cl 3p -56.25', 'S 3p 5.45', 'Cl 3p less S 3p 0.65', 'the greatest of 3 3', '4 in increasing order 4 3 1 2', 'Wavelength of the line 121.6']);
    const [one, energy, sulphur, difference, , order, typed] = paper.map(({ id, draft }) => ({ id, draft }));
    expect(energy?.draft).toMatchObject({ followThrough: { from: one?.id, second: null, isTrivial: false }, unitCost: '0.5', signCost: '1', methodMarks: [{ text: 'Groups written out', marks: '0.5' }, { text: 'Third shell used', marks: '0.5' }] });
    expect(difference?.draft.followThrough).toEqual({ from: one?.id, second: sulphur?.id, isTrivial: false });
    expect(order?.draft.printed?.partMarks).toEqual([{ inPlace: 2, marks: '1' }]);
    expect(typed?.draft.asked).toMatchObject({ convention: 'typed', typed: { value: '121.6', unit: 'nm' } });
    expect(paper.flatMap(({ worked }) => worked.problems)).toEqual([]);
    await context.close();
  });

  it('says at the link what keeps it from holding, goes along the chain, and undoes', { timeout: 120_000 }, async () => {
    sittingId = newSitting('Paper 5, a chain');
    const lead = actorOf(bench.server, 'lead');
    const { context: server } = bench.server;
    const first = createItem(server, lead, sittingId, itemDraft('Cl', '3p')).id;
    const sigma = { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'sigma', convention: 'slater' } as const;
    const second = createItem(server, lead, sittingId, itemDraft('Cl', '3p', { asked: sigma, followThrough: { from: first, second: null, isTrivial: false }, methodMarks: [{ id: 'm', text: 'Groups written out', marks: '1' }] })).id;
    const { page, complaints, context } = await openPage(bench, 'lead', 'wide');
    await page.goto(`${bench.address}/sittings/${sittingId}/paper?item=${second}`);
    expect(await page.getByTestId('follows-2').innerText()).toBe('follows 1');

    // Own value 5.75 of item 1: sigma is 17 - 5.75 = 11.25. Until it is settled the mark waits.
    await page.getByTestId('spot-test-value').fill('11.25');
    await page.getByTestId('spot-waits').filter({ hasText: 'Would wait for item 1.' }).waitFor();
    await page.getByTestId('spot-followed').fill('5.75');
    await page.getByTestId('spot-told').filter({ hasText: 'follows rightly from your own value of an earlier question, 5.75' }).waitFor();
    await page.getByTestId('spot-method-0').click();
    await page.getByTestId('spot-told').filter({ hasText: /3 of 3.*Your working earns 1: Groups written out/ }).waitFor();
    await page.getByTestId('spot-followed').fill('5..7');
    await page.getByText('This is not a value.').waitFor();

    await page.getByTestId(`chain-${first}`).click();
    await head(page, /^Item 1, .* of Cl 3p$/);
    await choose(page, 'quantity', 'energy-ev');
    await savedLine(page);
    await page.getByTestId(`chain-${second}`).click();
    await page.getByTestId('follow-through').getByText('Nothing can be carried on from item 1 as it is now.').waitFor();
    await page.getByTestId(`chain-${first}`).click();
    await page.getByTestId('undo').click();
    await savedLine(page);
    await page.getByTestId(`item-row-${second}`).focus();
    await page.keyboard.press('Enter');
    await page.getByTestId('follow-through').getByText('Nothing can be carried on').waitFor({ state: 'detached' });
    await page.keyboard.press('Alt+ArrowUp');
    await page.getByTestId('follow-through').getByText('It follows from item 2, which comes after it.').waitFor();
    await page.getByTestId('remove-follow').click();
    await page.getByTestId('chain').waitFor({ state: 'detached' });
    await page.getByTestId('undo').click();
    await page.getByTestId('chain').waitFor();
    expect(unexpected(complaints)).toEqual([]);
    await context.close();
  });

  it('is built by touch, then read when it is locked, and vetted', { timeout: 240_000 }, async () => {
    sittingId = newSitting('Paper 6, by touch');
    const { page, complaints, context } = await openPage(bench, 'lead', 'phone');
    await page.goto(`${bench.address}/sittings/${sittingId}/paper`);
    const element = async (opener: string, symbol: string): Promise<void> => {
      await page.getByTestId(opener).tap();
      await page.getByTestId('find-element').fill(symbol);
      await page.getByTestId('element-picker').getByRole('button', { name: new RegExp(`, ${symbol},`) }).tap();
    };
    const back = () => page.getByRole('button', { name: 'Items', exact: true }).first().tap();
    for (const number of [1, 2, 3, 4]) {
      await page.getByTestId('add-item').tap();
      await head(page, new RegExp(`^Item ${number},`));
      if (number <= 2) {
        await element('element', 'F');
        await page.getByTestId('electron').selectOption('2p');
      }
      if (number === 2) {
        await page.getByTestId('quantity').selectOption('sigma');
        await page.getByTestId('add-follow').tap();
        await page.getByTestId('follow-trivial').tap();
        await page.getByTestId('add-method-mark').tap();
        await page.getByTestId('method-text-0').fill('Groups written out');
      }
      if (number === 3) {
        await page.getByTestId('kind').selectOption('order');
        for (const [index, symbol] of ['O', 'F'].entries()) await element(`option-${index}-element`, symbol);
        for (const symbol of ['N', 'C']) await element('add-option', symbol);
        await page.getByTestId('option-down-0').tap();
        await page.getByTestId('option-remove-3').tap();
        await page.getByTestId('add-part-mark').tap();
        await page.getByTestId('two-answers').selectOption('last');
        await page.getByTestId('last-counts').waitFor();
      }
      if (number === 4) {
        await page.getByTestId('quantity').selectOption('difference');
        await element('second-element', 'B');
      }
      await savedLine(page);
      expect(unexpected(complaints)).toEqual([]);
      await back();
    }
    const paper = await items(page);
    for (const { id, number } of paper) {
      await page.getByTestId(`item-row-${id}`).tap();
      await head(page, new RegExp(`^Item ${number},`));
      expect(await axeViolations(page), `item ${number}`).toEqual([]);
      await back();
    }
    saveLayout(bench.server.context, actorOf(bench.server, 'lead'), sittingId, 0, layoutFor(paper.map(({ id }) => id)));
    lockPaper(bench.server.context, actorOf(bench.server, 'lead'), sittingId);
    await page.reload();
    await page.getByTestId(`item-row-${paper[1]?.id ?? ''}`).tap();
    await page.getByText('Follows item 1, a step too short to be carried on.').waitFor();
    await page.getByText('Groups written out').first().waitFor();
    await page.getByTestId(`chain-${paper[0]?.id ?? ''}`).tap();
    await head(page, /^Item 1,/);
    expect(await axeViolations(page), 'locked').toEqual([]);
    await context.close();

    const second = await openPage(bench, 'external', 'wide');
    await second.page.goto(`${bench.address}/sittings/${sittingId}/vetting`);
    for (const [number, own, said] of [[2, '3.80', 'a step too short to be carried on'], [3, '3 2 1', '1 in place']] as const) {
      await second.page.getByTestId(`vet-${number}`).click();
      await second.page.getByTestId('own-value').fill(own);
      await second.page.getByTestId('uncover').click();
      await second.page.getByText(said).waitFor();
    }
    expect(second.complaints).toEqual([]);
    expect(await axeViolations(second.page), 'vetting').toEqual([]);
    await second.context.close();
  });
});
