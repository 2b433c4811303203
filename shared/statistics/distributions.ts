import { total } from './moments';

/** Natural logarithms of 0!, 1!, 2! and so on, kept as far as they were asked for. */
const logFactorials: number[] = [0, 0];

function logFactorial(n: number): number {
  for (let next = logFactorials.length; next <= n; next += 1) logFactorials.push((logFactorials[next - 1] ?? 0) + Math.log(next));
  return logFactorials[n] ?? 0;
}

/** Probability of k in n, each with chance p. Source: J. Bernoulli, Ars Conjectandi (1713). For 1 in 2 at 0.5 it is 0.5. */
export function binomialProbability(k: number, n: number, p: number): number {
  if (p <= 0) return k === 0 ? 1 : 0;
  if (p >= 1) return k === n ? 1 : 0;
  return Math.exp(logFactorial(n) - logFactorial(k) - logFactorial(n - k) + k * Math.log(p) + (n - k) * Math.log1p(-p));
}

/** Probability of at most k in n, each with chance p; a sum of the terms, no approximation. For 0 in 360 at 0.00829 it is 0.05. */
export function binomialAtMost(k: number, n: number, p: number): number {
  if (k >= n) return 1;
  return Math.min(1, total(Array.from({ length: Math.max(0, k + 1) }, (_, at) => binomialProbability(at, n, p))));
}

/** Logarithm of the gamma function, for x > 0. Source: C. Lanczos, SIAM J. Numer. Anal. B 1, 86 (1964), g = 7, n = 9, from memory. For 5 it is ln 24. */
export function logGamma(x: number): number {
  const parts = [676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059, 12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7];
  const series = parts.reduce((sum, part, at) => sum + part / (x + at), 0.99999999999980993);
  const base = x + 6.5;
  return 0.5 * Math.log(2 * Math.PI) + (x - 0.5) * Math.log(base) - base + Math.log(series);
}

/**
 * Share of the gamma distribution of this shape, scale 1, that lies below x: the lower incomplete gamma function, regularised.
 * By its power series: M. Abramowitz and I. A. Stegun, Handbook (1964), 6.5.29, from memory. For shape 1 it is 1 - exp(-x).
 */
export function gammaBelow(shape: number, x: number): number {
  if (x <= 0) return 0;
  if (x > shape + 12 * Math.sqrt(shape) + 60) return 1;
  let term = 1 / shape;
  let sum = term;
  for (let at = 1; term > sum * 1e-16; at += 1) {
    term *= x / (shape + at);
    sum += term;
  }
  return Math.min(1, Math.exp(shape * Math.log(x) - x - logGamma(shape)) * sum);
}

/**
 * Where a rising function on an interval reaches a level, by halving until it can be halved no more. Common practice, no source.
 * For x squared between 0 and 2 and the level 2 it is 1.41421356.
 */
export function whereItReaches(level: number, low: number, high: number, rising: (x: number) => number): number {
  let [from, to] = [low, high];
  for (let step = 0; step < 200; step += 1) {
    const middle = (from + to) / 2;
    if (middle === from || middle === to) break;
    if (rising(middle) < level) from = middle;
    else to = middle;
  }
  return (from + to) / 2;
}

/** The point with this share of the gamma distribution below it, in units of its scale. For shape 1 and 0.95 it is ln 20. */
export const gammaQuantile = (share: number, shape: number): number =>
  whereItReaches(share, 0, shape + 12 * Math.sqrt(shape) + 60, (x) => gammaBelow(shape, x));
