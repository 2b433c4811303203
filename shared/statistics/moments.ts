/** What a column of numbers comes to; `sd` is null for fewer than two of them. */
export interface Moments {
  readonly n: number;
  readonly mean: number;
  readonly variance: number | null;
  readonly sd: number | null;
}

/**
 * Mean and standard deviation with n - 1, in the unit of the values. They are taken from the first value on, and the second pass
 * corrects the first, so that large values close together keep their figures. Source: T. F. Chan, G. H. Golub and R. J. LeVeque,
 * Am. Statist. 37, 242 (1983), from memory. Of 10000001, 10000003, 10000002: mean 10000002, s 1.
 */
export function moments(values: readonly number[]): Moments | null {
  const origin = values[0];
  if (origin === undefined) return null;
  const n = values.length;
  const shifted = values.map((value) => value - origin);
  const offset = total(shifted) / n;
  const deviations = shifted.map((value) => value - offset);
  const drift = total(deviations);
  const squares = total(deviations.map((deviation) => deviation * deviation)) - (drift * drift) / n;
  const variance = n < 2 ? null : Math.max(0, squares) / (n - 1);
  return { n, mean: origin + offset, variance, sd: variance === null ? null : Math.sqrt(variance) };
}

/** Whether two of the values differ. Ours, no source: of 2, 2, 3 true; of 2, 2 or nothing false. */
export const hasVariation = (values: readonly number[]): boolean => values.some((value) => value !== values[0]);

/**
 * Pearson's correlation of two columns of one length; null where a column has no variation, neither 0 nor NaN.
 * Source: K. Pearson, Phil. Trans. A 187, 253 (1896), from memory. Of 1, 2, 3 with 2, 4, 6 it is 1.
 */
export function correlation(xs: readonly number[], ys: readonly number[]): number | null {
  const x = moments(xs);
  const y = moments(ys);
  if (xs.length !== ys.length) throw new RangeError('The two columns differ in length.');
  if (!x?.sd || !y?.sd || !hasVariation(xs) || !hasVariation(ys)) return null;
  const { sd: sdX, mean: meanX } = x;
  const { sd: sdY, mean: meanY } = y;
  const together = total(xs.map((value, at) => ((value - meanX) / sdX) * (((ys[at] ?? meanY) - meanY) / sdY)));
  return Math.max(-1, Math.min(1, together / (xs.length - 1)));
}

/**
 * A sum that carries along what rounding cuts off. Source: A. Neumaier, Z. Angew. Math. Mech. 54, 39 (1974), from memory.
 * Of 1, 1e100, 1, -1e100 it is 2, where adding in turn gives 0.
 */
export function total(values: readonly number[]): number {
  let sum = 0;
  let lost = 0;
  for (const value of values) {
    const next = sum + value;
    lost += Math.abs(sum) >= Math.abs(value) ? sum - next + value : value - next + sum;
    sum = next;
  }
  return sum + lost;
}
