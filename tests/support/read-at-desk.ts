import type { Page } from 'playwright-core';
import type { Code } from '../../shared/marking/scheme';
import type { WrittenPaper } from './written-paper';

const rare = ['crossed-out', 'two-answers', 'elsewhere', 'wrong-page'] as const;
const letters: Readonly<Partial<Record<Code, string>>> = { blank: 'b', 'cannot-read': 'x', 'ask-the-lead': 's' };
const longestWaitMs = 15_000;
const padNames: Readonly<Record<string, string>> = { '.': 'point', '-': 'minus', '−': 'minus' };

interface OnDesk {
  readonly candidate: string;
  readonly item: number;
}

/** What stands on the desk at one moment: an answer, the end of an item, or neither yet. */
const look = (page: Page): Promise<OnDesk | 'end' | null> =>
  page.evaluate(() => {
    const textOf = (id: string): string | null => document.querySelector(`[data-testid="${id}"]`)?.textContent ?? null;
    if (textOf('next-item') !== null || (document.body.textContent ?? '').includes('Nothing is left to read here')) return 'end';
    const candidate = textOf('desk-candidate');
    const item = Number(/Item (\d+)/.exec(document.querySelector('[role="heading"], h1')?.textContent ?? '')?.[1]);
    return candidate === null || Number.isNaN(item) ? null : { candidate, item };
  });

/** The next answer, once it is another than before; null when the item is read. */
async function nextAnswer(page: Page, before: OnDesk | null): Promise<OnDesk | null> {
  for (const until = Date.now() + longestWaitMs; ; ) {
    const now = await look(page);
    if (Date.now() > until) throw new Error(`No other answer came after ${JSON.stringify(before)}; the desk shows ${JSON.stringify(now)}.`);
    if (now === 'end') return null;
    if (now !== null && (now.candidate !== before?.candidate || now.item !== before.item)) return now;
    await page.waitForTimeout(20);
  }
}

type Give = (page: Page, reading: ReturnType<WrittenPaper['readingOf']>) => Promise<void>;

async function readAll(page: Page, paper: WrittenPaper, most: number, give: Give, goOn: (page: Page) => Promise<void>): Promise<number> {
  let read = 0;
  let before: OnDesk | null = null;
  while (read < most) {
    const here = await nextAnswer(page, before);
    if (here === null) {
      if ((await page.getByTestId('next-item').count()) === 0) break;
      await goOn(page);
      await page.getByTestId('desk-candidate').waitFor();
      before = null;
      continue;
    }
    await give(page, paper.readingOf(here.candidate, here.item));
    before = here;
    read += 1;
  }
  await page.waitForFunction(() => document.querySelector('[data-testid="desk-said"]')?.textContent?.startsWith('Recorded') ?? false);
  await page.waitForTimeout(500);
  return read;
}

/** Reads by keyboard alone, the way on to the next item included. */
export const readWithKeys = (page: Page, paper: WrittenPaper, most: number): Promise<number> =>
  readAll(
    page,
    paper,
    most,
    async (at, reading) => {
      if ('text' in reading) {
        await at.keyboard.type(reading.text);
        await at.keyboard.press('Enter');
        return;
      }
      const letter = letters[reading.code];
      if (letter !== undefined) await at.keyboard.press(letter);
      else {
        await at.keyboard.press('w');
        await at.keyboard.press(String(rare.findIndex((code) => code === reading.code) + 1));
        await at.keyboard.press('Enter');
      }
    },
    async (at) => {
      for (let tabs = 0; tabs < 40; tabs += 1) {
        if (await at.evaluate(() => document.activeElement?.getAttribute('data-testid') === 'next-item')) break;
        await at.keyboard.press('Tab');
      }
      await at.keyboard.press('Enter');
    },
  );

/** Reads by touch: the pad, and the sheet of codes over it. */
export const readWithPad = (page: Page, paper: WrittenPaper, most: number): Promise<number> =>
  readAll(
    page,
    paper,
    most,
    async (at, reading) => {
      if ('text' in reading) {
        for (const sign of reading.text) {
          if (sign === ',' || sign === '/') {
            await at.getByRole('button', { name: 'Other signs' }).tap();
            await at.getByRole('button', { name: sign, exact: true }).tap();
          } else await at.getByRole('group', { name: 'Keypad' }).getByRole('button', { name: padNames[sign] ?? sign, exact: true }).tap();
        }
        await at.getByTestId('record').tap();
        return;
      }
      if (reading.code === 'blank') await at.getByTestId('code-blank').tap();
      else {
        await at.getByTestId('other').tap();
        await at.getByTestId(`code-${reading.code}`).tap();
      }
    },
    (at) => at.getByTestId('next-item').tap(),
  );
