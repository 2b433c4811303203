import { figure, type Figure } from './interpretable';
import { correlation, hasVariation, moments, total } from './moments';

/** Marks of one script, item by item, in any unit; a blank is its mark, 0, and not yet read is null. */
export type Script = readonly (number | null)[];

/** Scripts with every item read: sums over items mean something for these only. */
const whole = (scripts: readonly Script[]): readonly (readonly number[])[] =>
  scripts.filter((script): script is readonly number[] => script.length > 0 && script.every((mark) => mark !== null));

const column = (scripts: readonly (readonly number[])[], item: number): number[] => scripts.map((script) => script[item] ?? 0);
const rest = (scripts: readonly (readonly number[])[], item: number): number[] => scripts.map((script) => total(script) - (script[item] ?? 0));

/**
 * Facility: mean mark over maximum mark, over those read. Source: R. L. Ebel, Essentials of Educational Measurement (1972), from
 * memory. A share; for marks 3, 0, 3 of 3 with one not yet read it is 2/3, n 3.
 */
export function facility(marks: Script, maximum: number): Figure {
  const read = marks.filter((mark): mark is number => mark !== null);
  return figure(read.length, read.length === 0 ? null : total(read) / read.length / maximum);
}

/**
 * Corrected item-total correlation: Pearson's r of the item with the total less the item, over scripts read whole. Source:
 * S. Henrysson, Psychometrika 28, 211 (1963), from memory. For item 1 of LSAT section 6 it is 0.1128.
 */
export function correctedItemTotal(scripts: readonly Script[], item: number): Figure {
  const read = whole(scripts);
  return figure(read.length, read.length === 0 ? null : correlation(column(read, item), rest(read, item)));
}

/**
 * Cronbach's alpha, k/(k - 1) (1 - sum of item variances / variance of totals), over scripts read whole. Source: L. J. Cronbach,
 * Psychometrika 16, 297 (1951). For LSAT section 6 it is 0.2950.
 */
export function alpha(scripts: readonly Script[]): Figure {
  const read = whole(scripts);
  return figure(read.length, alphaOf(read));
}

/** Cronbach's alpha of the paper without one item; same source. For LSAT section 6 without item 1 it is 0.2754. */
export function alphaIfDeleted(scripts: readonly Script[], item: number): Figure {
  const read = whole(scripts).map((script) => script.filter((_, at) => at !== item));
  return figure(read.length, alphaOf(read));
}

function alphaOf(read: readonly (readonly number[])[]): number | null {
  const k = read[0]?.length ?? 0;
  const totals = read.map(total);
  if (k < 2 || !hasVariation(totals)) return null;
  const variances = Array.from({ length: k }, (_, item) => moments(column(read, item))?.variance ?? 0);
  return alphaFromVariances(k, total(variances), moments(totals)?.variance ?? 0);
}

/**
 * Alpha from k items, the sum of their variances and the variance of the totals. Source: J. M. Bland and D. G. Altman, Br. Med. J.
 * 314, 572 (1997). For 10 items, 11.16 and 77.44 it is 0.95.
 */
export const alphaFromVariances = (k: number, sumOfVariances: number, varianceOfTotals: number): number =>
  (k / (k - 1)) * (1 - sumOfVariances / varianceOfTotals);

/**
 * Discrimination: facility among the upper 27 % by total less that among the lower 27 %. Scripts with the total at the edge share
 * the places left. Source: T. L. Kelley, J. Educ. Psychol. 30, 17 (1939). In a class of 40 with 9 and 3 of 11 right: 0.545.
 */
export function discrimination(scripts: readonly Script[], item: number, maximum: number): Figure {
  const read = whole(scripts);
  const scored = read.map((script) => ({ total: total(script), mark: script[item] ?? 0 }));
  const size = Math.round(0.27 * read.length);
  if (size === 0 || !hasVariation(scored.map((script) => script.total)) || !hasVariation(column(read, item))) return figure(read.length, null);
  const upper = meanOfFirst(size, scored, (one, other) => other.total - one.total);
  const lower = meanOfFirst(size, scored, (one, other) => one.total - other.total);
  return figure(read.length, (upper - lower) / maximum);
}

interface Scored {
  readonly total: number;
  readonly mark: number;
}

/** Mean mark of so many from the front; those with the total at the edge count in part, so that the order of scripts is nothing. */
function meanOfFirst(size: number, scored: readonly Scored[], order: (one: Scored, other: Scored) => number): number {
  const edge = [...scored].sort(order)[size - 1];
  if (!edge) return 0;
  const inside = scored.filter((one) => order(one, edge) < 0);
  const level = scored.filter((one) => one.total === edge.total);
  const share = (size - inside.length) / level.length;
  return (total(inside.map(({ mark }) => mark)) + share * total(level.map(({ mark }) => mark))) / size;
}
