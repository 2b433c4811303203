import { binomialAtMost, whereItReaches } from './distributions';

/** Both limits of a share, between 0 and 1. */
export interface Interval {
  readonly low: number;
  readonly high: number;
}

/** The deviation that leaves 2.5 % of the normal distribution above it. */
const Z_975 = 1.959963984540054;

function checked(wrong: number, n: number): void {
  if (!Number.isInteger(wrong) || !Number.isInteger(n) || n < 1 || wrong < 0 || wrong > n) throw new RangeError(`${wrong} of ${n} is no share.`);
}

/**
 * Wilson's 95 % interval of a share, clamped to 0 and 1. Source: E. B. Wilson, J. Am. Statist. Assoc. 22, 209 (1927).
 * For 81 of 263 it is 0.2553 to 0.3662.
 */
export function wilson(count: number, n: number, z: number = Z_975): Interval {
  checked(count, n);
  const share = count / n;
  const square = (z * z) / n;
  const centre = share + square / 2;
  const spread = z * Math.sqrt((share * (1 - share)) / n + square / (4 * n));
  return {
    low: count === 0 ? 0 : Math.max(0, (centre - spread) / (1 + square)),
    high: count === n ? 1 : Math.min(1, (centre + spread) / (1 + square)),
  };
}

/**
 * The exact upper bound of a share: a larger one would give so few with a chance below 1 - confidence. Source: C. J. Clopper and
 * E. S. Pearson, Biometrika 26, 404 (1934). For 0 of 360, one-sided 95 %: 0.00829.
 */
export function atMost(count: number, n: number, confidence = 0.95): number {
  checked(count, n);
  if (count === n) return 1;
  if (count === 0) return -Math.expm1(Math.log(1 - confidence) / n);
  return whereItReaches(confidence, 0, 1, (p) => 1 - binomialAtMost(count, n, p));
}

/** The exact lower bound of a share, the mirror image of the upper one; same source. For 360 of 360, one-sided 95 %: 0.99171. */
export const atLeast = (count: number, n: number, confidence = 0.95): number => 1 - atMost(n - count, n, confidence);

/**
 * The exact interval of a share with at most half of what the confidence leaves on either side. Source: Clopper and Pearson 1934.
 * For 0 of 20 at 95 % it is 0 to 0.1684.
 */
export function clopperPearson(count: number, n: number, confidence = 0.95): Interval {
  const oneSided = (1 + confidence) / 2;
  return { low: atLeast(count, n, oneSided), high: atMost(count, n, oneSided) };
}

/**
 * How many must be looked at, all without error, to say with this confidence that fewer than a share are wrong: ceil(ln 0.05 /
 * ln(1 - p)) at 95 %. Source: follows from Clopper and Pearson 1934 with no errors. For 1 % it is 299.
 */
export function sampleForZeroErrors(share: number, confidence = 0.95): number {
  if (!(share > 0 && share < 1)) throw new RangeError('The share lies between 0 and 1.');
  return Math.ceil(Math.log1p(-confidence) / Math.log1p(-share));
}

/** What may be said of re-read values: never that there are no errors. */
export interface ErrorStatement {
  readonly wrong: number;
  readonly reRead: number;
  /** One-sided 95 % bound of the share that is wrong; 1 when nothing was re-read. */
  readonly atMost: number;
  /** The bound in per cent as it is printed, rounded up so that it stays a bound. */
  readonly percent: string;
  readonly confidence: 'one-sided 95 %';
}

/**
 * The sentence on errors, as data. Ours on Clopper and Pearson 1934: 0 wrong in 360 re-read values is "at most 0.83 %, one-sided
 * 95 %".
 */
export function errorStatement(wrong: number, reRead: number): ErrorStatement {
  const bound = reRead === 0 ? 1 : atMost(wrong, reRead);
  return { wrong, reRead, atMost: bound, percent: inPercent(bound), confidence: 'one-sided 95 %' };
}

/** Two figures, rounded up. */
function inPercent(share: number): string {
  const percent = 100 * share;
  const places = percent >= 10 ? 0 : percent >= 1 ? 1 : Math.min(4, 1 - Math.floor(Math.log10(Math.max(percent, 1e-4))));
  const unit = 10 ** places;
  return (Math.ceil(percent * unit - 1e-9) / unit).toFixed(places);
}
