import { total } from './moments';

/** What the numbers mean to each other: names, ranks, distances or ratios. */
export type Level = 'nominal' | 'ordinal' | 'interval' | 'ratio';

/** Values are those that stand beside another one; without two different ones there is no alpha. */
export interface KrippendorffAlpha {
  readonly units: number;
  readonly values: number;
  readonly alpha: number | null;
  readonly state: 'value' | 'no variation' | 'nothing';
}

/**
 * Krippendorff's alpha of any number of readers, a column for each in the order of the units, null where one did not read. Source:
 * K. Krippendorff, Computing Krippendorff's Alpha-Reliability (2011). Its example of four readers and twelve units: nominal 0.743.
 */
export function krippendorffAlpha(readers: readonly (readonly (number | null)[])[], level: Level): KrippendorffAlpha {
  const length = Math.max(0, ...readers.map((column) => column.length));
  const units = Array.from({ length }, (_, at) => readers.map((column) => column[at] ?? null).filter((value) => value !== null)).filter((unit) => unit.length > 1);
  const all = units.flat();
  const n = all.length;
  if (n === 0) return { units: 0, values: 0, alpha: null, state: 'nothing' };
  const distance = distances(level, countsOf(all));
  const within = total(units.map((unit) => disagreement(countsOf(unit), distance) / (unit.length - 1))) / n;
  const between = disagreement(countsOf(all), distance) / (n * (n - 1));
  if (between === 0) return { units: units.length, values: n, alpha: null, state: 'no variation' };
  return { units: units.length, values: n, alpha: 1 - within / between, state: 'value' };
}

type Counts = readonly (readonly [value: number, count: number])[];

function countsOf(values: readonly number[]): Counts {
  const counts = new Map<number, number>();
  for (const value of values) counts.set(value, (counts.get(value) ?? 0) + 1);
  return [...counts].sort(([one], [other]) => one - other);
}

/** Over all ordered pairs of different values. */
const disagreement = (counts: Counts, distance: (one: number, other: number) => number): number =>
  total(counts.flatMap(([one, count]) => counts.map(([other, times]) => (one === other ? 0 : count * times * distance(one, other)))));

/** The squared differences of the 2011 text; for ranks, how many values lie from one to the other, half of each end. */
function distances(level: Level, counts: Counts): (one: number, other: number) => number {
  if (level === 'nominal') return () => 1;
  if (level === 'interval') return (one, other) => (one - other) ** 2;
  if (level === 'ratio') return (one, other) => ((one - other) / (one + other)) ** 2;
  let below = 0;
  const ranks = new Map(counts.map(([value, count]) => [value, (below += count) - count / 2] as const));
  return (one, other) => ((ranks.get(one) ?? 0) - (ranks.get(other) ?? 0)) ** 2;
}
