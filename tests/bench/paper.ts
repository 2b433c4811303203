import type { LinkedItem } from '../../shared/marking/links';
import { markPaper, type SettledAnswer, type VerdictMemo } from '../../shared/marking/mark-paper';
import { benchScheme, followingScheme } from './bench-scheme';
import { median, type BenchLine } from './figures';

const candidates = 2000;
const pairs = 10;
const rounds = 3;

/** Twenty items, every second one following from the one before it. */
function paper(): LinkedItem[] {
  const { scheme } = benchScheme();
  return Array.from({ length: pairs }, (_, pair): LinkedItem[] => [
    { id: `zeff-${pair}`, number: pair * 2 + 1, scheme },
    { id: `energy-${pair}`, number: pair * 2 + 2, scheme: followingScheme(`zeff-${pair}`) },
  ]).flat();
}

/** Half have the key; the rest one of thirty other values, and an energy that half of them work from it. */
function sheets(items: readonly LinkedItem[]): Map<string, SettledAnswer>[] {
  const given = (text: string): SettledAnswer => ({ given: { text }, struck: [] });
  return Array.from({ length: candidates }, (_, candidate) =>
    new Map(items.map(({ id }, index): [string, SettledAnswer] => {
      const n = candidate * 7 + (index >> 1);
      const isRight = n % 2 === 0;
      const own = `${4 + (n % 30) / 10}`;
      if (index % 2 === 0) return [id, given(isRight ? '6.10' : own)];
      return [id, given(isRight ? '-56.25' : `-${(n % 60) + 20}.5`)];
    })),
  );
}

/** Every verdict on a sitting of 2,000 candidates and 20 items, one call a candidate: with the memo as a ratio to the same without it. */
export function benchPaper(): BenchLine[] {
  const items = paper();
  const answers = sheets(items);
  const once = (memo: VerdictMemo | null): number => {
    const begun = process.hrtime.bigint();
    for (const sheet of answers) markPaper(items, sheet, memo);
    return Number(process.hrtime.bigint() - begun) / 1e6;
  };
  for (const sheet of answers.slice(0, 50)) markPaper(items, sheet, null);
  const figures = { memo: [] as number[], bare: [] as number[] };
  let distinct = 0;
  for (let round = 0; round < rounds; round += 1) {
    const memo: VerdictMemo = new Map();
    figures.memo.push(once(memo));
    // Long enough to need no second round.
    if (round === 0) figures.bare.push(once(null));
    distinct = memo.size;
  }
  const [withMemo, without] = [median(figures.memo), median(figures.bare)];
  return [{ name: 'a sitting marked with the memo / without it', ratio: withMemo / without, budget: { most: 1 }, detail: `${withMemo.toFixed(0)} ms to ${without.toFixed(0)} ms, ${candidates} candidates, ${items.length} items, ${distinct} distinct verdicts` }];
}
