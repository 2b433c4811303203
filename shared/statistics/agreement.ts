import { wilson, type Interval } from './intervals';
import { total } from './moments';

/** How often two readings are the same, with Wilson's 95 % interval; nothing read twice has no rate. */
export interface MatchRate {
  readonly n: number;
  readonly same: number;
  readonly rate: number | null;
  readonly interval: Interval | null;
}

/** Exact-match rate of pairs. Interval: E. B. Wilson, J. Am. Statist. Assoc. 22, 209 (1927). For 0 of 20: 0, up to 0.1611. */
export function matchRate(same: number, n: number): MatchRate {
  return n === 0 ? { n, same, rate: null, interval: null } : { n, same, rate: same / n, interval: wilson(same, n) };
}

/** Kappa never stands alone: raw agreement and n come with it. It is null where only one category was used. */
export interface Kappa {
  readonly n: number;
  readonly agreement: number | null;
  readonly kappa: number | null;
  readonly state: 'value' | 'one category' | 'nothing';
}

const unweighted = (row: number, column: number): number => (row === column ? 0 : 1);

/**
 * Cohen's kappa of a square table of counts, one reader down and one across. Weights of disagreement, 0 on the diagonal, make it the
 * weighted one. Sources: J. Cohen, Educ. Psychol. Meas. 20, 37 (1960); Psychol. Bull. 70, 213 (1968). For 25 3 5 / 6 32 8 / 1 0 20: 0.654.
 */
export function cohenKappa(table: readonly (readonly number[])[], weight: (row: number, column: number) => number = unweighted): Kappa {
  const n = total(table.flat());
  if (n === 0) return { n, agreement: null, kappa: null, state: 'nothing' };
  const rows = table.map(total);
  const columns = table.map((_, at) => total(table.map((row) => row[at] ?? 0)));
  const agreement = total(table.map((row, at) => row[at] ?? 0)) / n;
  const observed = total(table.flatMap((row, down) => row.map((count, across) => weight(down, across) * count))) / n;
  const expected = total(rows.flatMap((row, down) => columns.map((column, across) => weight(down, across) * row * column))) / (n * n);
  if (expected === 0) return { n, agreement, kappa: null, state: 'one category' };
  return { n, agreement, kappa: 1 - observed / expected, state: 'value' };
}

/** The table of pairs of categories, in the order of first appearance. Ours, no source: of (a, a), (a, b) it is 1 1 / 0 0. */
export function tableOfPairs(pairs: readonly (readonly [string, string])[]): number[][] {
  const names = [...new Set(pairs.flat())];
  const table = names.map(() => names.map(() => 0));
  for (const [first, second] of pairs) {
    const row = table[names.indexOf(first)];
    const at = names.indexOf(second);
    if (row) row[at] = (row[at] ?? 0) + 1;
  }
  return table;
}

/**
 * Kendall's tau-b, ties counted on each variable; null where one has no variation. Source: M. G. Kendall, Biometrika 33, 239 (1945),
 * from memory. For 12 2 1 12 2 and 1 4 7 1 0 it is -0.4714.
 */
export function kendallTauB(xs: readonly number[], ys: readonly number[]): number | null {
  if (xs.length !== ys.length) throw new RangeError('The two columns differ in length.');
  let [balance, untiedX, untiedY] = [0, 0, 0];
  xs.forEach((x, at) => {
    for (let before = 0; before < at; before += 1) {
      const across = Math.sign(x - (xs[before] ?? x));
      const up = Math.sign((ys[at] ?? 0) - (ys[before] ?? 0));
      balance += across * up;
      untiedX += Math.abs(across);
      untiedY += Math.abs(up);
    }
  });
  return untiedX === 0 || untiedY === 0 ? null : balance / Math.sqrt(untiedX * untiedY);
}
