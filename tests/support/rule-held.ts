import type { Page } from 'playwright-core';
import { demoItems } from '../../db/seed/truth/demo-items';
import { GRAINS_PER_MARK } from '../../shared/marking/grains';
import { itemsRead, type WrittenPaper } from './written-paper';

interface Shown {
  readonly candidate: string;
  readonly item: number;
}

/** The answer in the side sheet at this moment; null when no sheet is open. */
const inSheet = (page: Page): Promise<Shown | 'coming' | null> =>
  page.evaluate(() => {
    const sheet = document.querySelector('[data-testid="answer-sheet"]');
    if (!sheet) return null;
    const match = /(W\d+), item (\d+)/.exec(sheet?.querySelector('h2, [role="heading"]')?.textContent ?? '');
    return match ? { candidate: match[1] ?? '', item: Number(match[2]) } : 'coming';
  });

async function anotherThan(page: Page, before: Shown | null): Promise<Shown | null> {
  for (const until = Date.now() + 15_000; Date.now() < until; ) {
    const now = await inSheet(page);
    if (now === null && before) return null;
    if (now !== null && now !== 'coming' && (now.candidate !== before?.candidate || now.item !== before.item)) return now;
    await page.waitForTimeout(30);
  }
  throw new Error(`The sheet stayed at ${JSON.stringify(before)}.`);
}

/** What remains a code though a person looks: the scheme leaves its mark to the lead. */
const staysCode = new Set(['crossed-out', 'two-answers', 'elsewhere']);

/** Rules on every answer that waits: a value where one can be read after all, else no marks, with a reason. */
export async function ruleAll(page: Page, paper: WrittenPaper): Promise<void> {
  await page.locator('[data-testid^="row-"]').first().click();
  for (let shown = await anotherThan(page, null); shown !== null; shown = await anotherThan(page, shown)) {
    const written = paper.answerOf(shown.candidate, shown.item);
    await page.getByTestId('third-reading').waitFor();
    if (staysCode.has(written.kind)) {
      await page.getByTestId('third-other').click();
      await page.getByTestId(`third-${written.kind}`).click();
      await page.getByTestId('ruled-marks').fill('0');
    } else {
      await page.getByTestId('third-reading').fill(written.text);
      await page.getByTestId('record-third').click();
    }
    await page.getByTestId('ruling-reason').fill('Looked at the page again.');
    await page.getByTestId('rule').click();
  }
}

/** Marks by candidate and item, and the total, as the truth has them: right and rightly rounded values in full, all else nothing. */
export function marksByTruth(paper: WrittenPaper): Record<string, string[]> {
  const rows = paper.truth.map(({ candidate }): [string, string[]] => {
    const marks = demoItems.slice(0, itemsRead).map(({ number, maxGrains }) => {
      const { origin, kind } = paper.answerOf(candidate, number);
      const isRight = (origin === 'key' || origin === 'rounding') && !staysCode.has(kind) && kind !== 'blank';
      return isRight ? maxGrains / GRAINS_PER_MARK : 0;
    });
    return [candidate, [...marks, marks.reduce((sum, mark) => sum + mark, 0)].map(String)];
  });
  return Object.fromEntries(rows);
}

/** The same from an exported file, read as plain comma separated text. */
export function marksInFile(csv: string): Record<string, string[]> {
  const [head = [], ...rows] = csv.replace(/^\uFEFF/, '').trim().split(/\r?\n/).map((line) => line.split(','));
  const wanted = head.flatMap((name, at) => (/^item \d+ mark$/.test(name) || name === 'total' ? [at] : []));
  return Object.fromEntries(rows.map((row) => [row[0] ?? '', wanted.map((at) => row[at] ?? '')]));
}
