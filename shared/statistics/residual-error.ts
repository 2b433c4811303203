import { gammaQuantile } from './distributions';
import { atMost, clopperPearson, errorStatement, type ErrorStatement, type Interval } from './intervals';
import { total } from './moments';

/** Readings of one item with full marks that nothing asked to double. */
export interface Stratum {
  readonly item: string;
  /** The share of them that is re-read by chance, as the policy has it. */
  readonly share: number;
  /** All of them, re-read or not. */
  readonly fullMark: number;
  /** Read a second time by chance alone. */
  readonly reRead: number;
  /** Of these, settled to another value; they are put right. */
  readonly wrong: number;
}

/** How the figure was come by: no sample, one share for all, or shares that differ. */
export type Measure = 'nothing re-read' | 'simple random sample' | 'stratified by share';

export interface ResidualError {
  readonly measure: Measure;
  readonly fullMark: number;
  readonly reRead: number;
  readonly wrong: number;
  /** What the sample says, in the form that is shown: "0 wrong in 360 re-read: at most 0.83 %"; for one share only. */
  readonly statement: ErrorStatement | null;
  /** Share of full-mark readings that were wrong as first typed. */
  readonly asTyped: Estimate;
  /** Share of full-mark readings that still are: what the sample found is put right. */
  readonly left: Estimate;
  /** Items that no re-read value stands for: no figure here speaks of them. */
  readonly unmeasured: readonly string[];
}

/** A share with its two-sided 95 % interval and its one-sided 95 % bound. */
export interface Estimate extends Interval {
  readonly estimate: number;
  readonly atMost: number;
}

const unknown: Estimate = { estimate: 0, low: 0, high: 1, atMost: 1 };

/**
 * The error left among full-mark readings read once, from those re-read by chance. One sampling share: Clopper and Pearson,
 * Biometrika 26, 404 (1934); shares that differ: items of one share together, weighted by their readings, with the gamma interval of
 * M. P. Fay and E. J. Feuer, Statist. Med. 16, 791 (1997), from memory. Both keep to the safe side; that two readers took one value
 * for another alike is seen by neither. 0 wrong in 360 of 3,600: 0 to 1.02 %, at most 0.83 %.
 */
export function residualError(items: readonly Stratum[]): ResidualError {
  const groups = [...new Set(items.map(({ share }) => share))].map((share) => together(items.filter((item) => item.share === share)));
  const measured = groups.filter(({ reRead }) => reRead > 0);
  const counts = together(items);
  if (measured.length === 0) return { measure: 'nothing re-read', fullMark: counts.fullMark, reRead: 0, wrong: 0, statement: null, asTyped: unknown, left: unknown, unmeasured: named(groups) };
  const isSimple = groups.length === 1;
  const asTyped = isSimple ? simple(counts) : stratified(measured);
  return {
    measure: isSimple ? 'simple random sample' : 'stratified by share',
    fullMark: counts.fullMark,
    reRead: counts.reRead,
    wrong: counts.wrong,
    statement: isSimple ? errorStatement(counts.wrong, counts.reRead) : null,
    asTyped,
    left: afterCorrection(asTyped, measured),
    unmeasured: named(groups),
  };
}

type Counts = Pick<Stratum, 'fullMark' | 'reRead' | 'wrong'>;
const sum = (strata: readonly Counts[], what: keyof Counts): number => total(strata.map((stratum) => stratum[what]));

interface Group extends Counts {
  readonly items: readonly string[];
}

const together = (items: readonly Stratum[]): Group => ({
  items: items.filter(({ fullMark }) => fullMark > 0).map(({ item }) => item),
  fullMark: sum(items, 'fullMark'),
  reRead: sum(items, 'reRead'),
  wrong: sum(items, 'wrong'),
});

const named = (groups: readonly Group[]): readonly string[] => groups.filter(({ reRead }) => reRead === 0).flatMap(({ items }) => items);

const simple = ({ reRead, wrong }: Counts): Estimate => ({ estimate: wrong / reRead, ...clopperPearson(wrong, reRead), atMost: atMost(wrong, reRead) });

/** Fay and Feuer: a sum of weighted counts, its upper limit as if one more error stood where an error weighs most. */
function stratified(strata: readonly Counts[]): Estimate {
  const readings = sum(strata, 'fullMark');
  const weighted = strata.map(({ fullMark, reRead, wrong }) => ({ weight: fullMark / readings / reRead, wrong }));
  const estimate = total(weighted.map(({ weight, wrong }) => weight * wrong));
  const variance = total(weighted.map(({ weight, wrong }) => weight * weight * wrong));
  const most = Math.max(...weighted.map(({ weight }) => weight));
  const upper = (confidence: number): number => gammaLimit(confidence, estimate + most, variance + most * most);
  return { estimate, low: estimate === 0 ? 0 : gammaLimit(0.025, estimate, variance), high: Math.min(1, upper(0.975)), atMost: Math.min(1, upper(0.95)) };
}

const gammaLimit = (share: number, mean: number, variance: number): number => (variance / mean) * gammaQuantile(share, (mean * mean) / variance);

/** Errors that the sample found are put right, and no more can be left than was not re-read. */
function afterCorrection({ estimate, low, high, atMost: bound }: Estimate, strata: readonly Counts[]): Estimate {
  const readings = sum(strata, 'fullMark');
  const found = sum(strata, 'wrong') / readings;
  const unread = 1 - sum(strata, 'reRead') / readings;
  const left = (share: number): number => Math.max(0, Math.min(unread, share - found));
  return { estimate: left(estimate), low: left(low), high: left(high), atMost: left(bound) };
}
