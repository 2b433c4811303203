import axeSource from 'axe-core';
import type { Page } from 'playwright-core';

/** What axe finds on the page as it stands, by the rules of WCAG 2.2 A and AA. */
export async function axeViolations(page: Page): Promise<string[]> {
  await page.addScriptTag({ content: axeSource.source }).catch(() => undefined);
  const isThere = await page.evaluate(() => 'axe' in globalThis);
  if (!isThere) await page.evaluate(axeSource.source);
  return page.evaluate(async () => {
    const { axe } = globalThis as unknown as { axe: { run(options: object): Promise<{ violations: { id: string; nodes: { html: string }[] }[] }> } };
    const { violations } = await axe.run({ runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] });
    return violations.flatMap(({ id, nodes }) => nodes.map(({ html }) => `${id}: ${html}`));
  });
}
