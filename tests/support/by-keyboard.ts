import type { Page } from 'playwright-core';

const inHand = (page: Page): Promise<string | null> => page.evaluate(() => document.activeElement?.getAttribute('data-testid') ?? null);

/** Tab until the control is in hand: no pointer is used. */
export async function walkTo(page: Page, testId: string): Promise<void> {
  for (let step = 0; step < 240; step += 1) {
    if ((await inHand(page)) === testId) return;
    await page.keyboard.press('Tab');
  }
  throw new Error(`${testId} was not reached by Tab.`);
}

/** Puts a text into a field that was walked to, in place of what stood there. */
export async function typeInto(page: Page, testId: string, text: string): Promise<void> {
  await walkTo(page, testId);
  await page.keyboard.press('Control+A');
  await page.keyboard.type(text);
}

/** Chooses in a picker of the browser by its arrow keys. */
export async function choose(page: Page, testId: string, value: string): Promise<void> {
  await walkTo(page, testId);
  const steps = await page.evaluate((wanted) => {
    const list = document.activeElement as HTMLSelectElement;
    return Array.from(list.options).findIndex((option) => option.value === wanted) - list.selectedIndex;
  }, value);
  for (let step = 0; step < Math.abs(steps); step += 1) await page.keyboard.press(steps > 0 ? 'ArrowDown' : 'ArrowUp');
}

/** Opens the picker of elements with Enter, finds one by typing and takes it. */
export async function pickElement(page: Page, opener: string, symbol: string): Promise<void> {
  await walkTo(page, opener);
  await page.keyboard.press('Enter');
  await page.getByTestId('find-element').waitFor();
  await page.keyboard.type(symbol);
  await page.keyboard.press('Enter');
  await page.getByTestId('element-picker').waitFor({ state: 'detached' });
}
