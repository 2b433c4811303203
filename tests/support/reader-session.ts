import type { Page, Response } from 'playwright-core';

/** Names of fields that no answer to a reader may have: what decides a mark, the mark, and which reading of a pair this is. */
const forbidden = /^(key|keys|band|bands|slip|slips|alternative|alternatives|rounding|roundings|grains|maxGrains|mark|marks|score|scores|verdict|rule|ruling|why|sigma|zeff|derivation|canonical|isFirst|isSecond|pair|purpose|concordant|discordant)$/i;

/** Paths of forbidden fields in a value, such as `leases.0.key`. A loose page says why it is loose: that is no mark's reason. */
function leaksIn(value: unknown, path: string): string[] {
  if (Array.isArray(value)) return value.flatMap((one, index) => leaksIn(one, `${path}.${index}`));
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([name, part]) => {
    const here = `${path}.${name}`;
    const isEmpty = part === null;
    const isPageReason = name === 'why' && /\/(batches|uploads|page-images|loose-pages)/.test(path);
    return [...(forbidden.test(name) && !isEmpty && !isPageReason ? [here] : []), ...leaksIn(part, here)];
  });
}

/** Hears every JSON answer of the interface from now on; what it gives back tells the addresses asked and what leaked. */
export function listenToResponses(page: Page): () => Promise<{ addresses: string[]; leaks: string[] }> {
  const bodies: Promise<readonly [string, unknown]>[] = [];
  page.on('response', (response: Response) => {
    const { pathname } = new URL(response.url());
    if (!pathname.startsWith('/api/') || !(response.headers()['content-type'] ?? '').includes('json')) return;
    bodies.push(response.json().then((body: unknown) => [pathname, body] as const, () => [pathname, null] as const));
  });
  return async () => {
    const heard = await Promise.all(bodies);
    return { addresses: [...new Set(heard.map(([address]) => address))], leaks: heard.flatMap(([address, body]) => leaksIn(body, address)) };
  };
}
