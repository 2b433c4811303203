/** An exact rational number: reduced, the denominator positive. Keys, readings and bands are never binary floats. */
export interface Exact {
  readonly n: bigint;
  readonly d: bigint;
}

const gcd = (a: bigint, b: bigint): bigint => (b === 0n ? (a < 0n ? -a : a) : gcd(b, a % b));

/** The fraction n/d, reduced. Throws a RangeError for d = 0. ratio(55n, 10n) is 11/2. */
export function ratio(n: bigint, d = 1n): Exact {
  if (d === 0n) throw new RangeError('A fraction has no value when its denominator is 0.');
  const common = gcd(n, d) || 1n;
  const sign = d < 0n ? -1n : 1n;
  return { n: (sign * n) / common, d: (sign * d) / common };
}

export const zero = ratio(0n);

export const whole = (value: number): Exact => ratio(BigInt(value));

/** A plain decimal literal of our own tables or computations, such as decimal('-0.35') = -7/20. Not for typed answers. */
export function decimal(literal: string): Exact {
  const match = /^([+-]?)(\d+)(?:\.(\d+))?(?:e([+-]?\d{1,3}))?$/i.exec(literal);
  if (!match) throw new RangeError(`Not a decimal literal: ${literal}`);
  const [, sign, units = '0', places = '', power = '0'] = match;
  const digits = BigInt(units + places) * (sign === '-' ? -1n : 1n);
  const exponent = Number(power) - places.length;
  return exponent >= 0 ? ratio(digits * 10n ** BigInt(exponent)) : ratio(digits, 10n ** BigInt(-exponent));
}

export const add = (a: Exact, b: Exact): Exact => ratio(a.n * b.d + b.n * a.d, a.d * b.d);
export const subtract = (a: Exact, b: Exact): Exact => ratio(a.n * b.d - b.n * a.d, a.d * b.d);
export const multiply = (a: Exact, b: Exact): Exact => ratio(a.n * b.n, a.d * b.d);
export const divide = (a: Exact, b: Exact): Exact => ratio(a.n * b.d, a.d * b.n);
export const negate = (a: Exact): Exact => ({ n: -a.n, d: a.d });
export const absolute = (a: Exact): Exact => ({ n: a.n < 0n ? -a.n : a.n, d: a.d });

/** Negative, zero or positive as a is below, equal to or above b. */
export function compare(a: Exact, b: Exact): number {
  const difference = a.n * b.d - b.n * a.d;
  return difference < 0n ? -1 : difference > 0n ? 1 : 0;
}

export const equals = (a: Exact, b: Exact): boolean => a.n === b.n && a.d === b.d;

/** The stored form: `61/10`, or `6` when whole. */
export const toFractionText = (a: Exact): string => (a.d === 1n ? String(a.n) : `${a.n}/${a.d}`);

/** Reads what toFractionText wrote. */
export function fromFractionText(text: string): Exact {
  const [n = '', d = '1'] = text.split('/');
  return ratio(BigInt(n), BigInt(d));
}

/** For ordering rows and placing points on a drawing only; it never decides a mark. */
export const toApproximate = (a: Exact): number => {
  const scaled = (a.n * 10n ** 15n) / a.d;
  return Number(scaled) / 1e15;
};

/** Half away from zero (ISO 80000-1, rule B) to a number of decimals, as printed: toDecimals(91/20, 1) is "4.6". */
export function toDecimals(a: Exact, places: number): string {
  const scale = 10n ** BigInt(places);
  const twice = absolute(a).n * scale * 2n;
  const rounded = (twice + a.d) / (a.d * 2n);
  const digits = rounded.toString().padStart(places + 1, '0');
  const cut = digits.length - places;
  const body = places === 0 ? digits : `${digits.slice(0, cut)}.${digits.slice(cut)}`;
  return a.n < 0n && rounded !== 0n ? `-${body}` : body;
}

/** The decimals needed to write the value exactly, or null when no finite decimal does: 3.75 needs 2, 1/3 has none. */
export function exactDecimals(a: Exact): number | null {
  let rest = a.d;
  let twos = 0;
  let fives = 0;
  while (rest % 2n === 0n) {
    rest /= 2n;
    twos += 1;
  }
  while (rest % 5n === 0n) {
    rest /= 5n;
    fives += 1;
  }
  return rest === 1n ? Math.max(twos, fives) : null;
}

/** The greatest whole number whose square is no more than the value (Newton's method). */
function wholeRoot(value: bigint): bigint {
  if (value < 2n) return value;
  let guess = 1n << BigInt(Math.ceil(value.toString(2).length / 2));
  for (;;) {
    const next = (guess + value / guess) >> 1n;
    if (next >= guess) return guess;
    guess = next;
  }
}

/** Decimals to which a root that is no fraction is cut off. */
const ROOT_PLACES = 30n;

/** The square root: exact where it is a fraction, otherwise cut off after 30 decimals. squareRoot(9/4) is 3/2. */
export function squareRoot(a: Exact): Exact {
  if (a.n < 0n) throw new RangeError('A negative number has no real root.');
  const n = wholeRoot(a.n);
  const d = wholeRoot(a.d);
  if (n * n === a.n && d * d === a.d) return ratio(n, d);
  return ratio(wholeRoot((a.n * 10n ** (2n * ROOT_PLACES)) / a.d), 10n ** ROOT_PLACES);
}

/** The decimals that show so many significant figures, below 0 where not all units are shown: 13.605 to 4 figures has 2, 54321 has -1. */
export function decimalsForFigures(a: Exact, figures: number): number {
  const size = absolute(a);
  if (size.n === 0n) return figures - 1;
  let places = figures - 1;
  const low = 10n ** BigInt(figures - 1);
  const rounded = (at: number): bigint => {
    const scaled = at >= 0 ? ratio(size.n * 10n ** BigInt(at), size.d) : ratio(size.n, size.d * 10n ** BigInt(-at));
    return (2n * scaled.n + scaled.d) / (2n * scaled.d);
  };
  while (rounded(places) < low) places += 1;
  while (rounded(places) >= low * 10n) places -= 1;
  return places;
}

/** Rounded to significant figures, half away from zero: toFigures(9.9996, 4) is "10.00", toFigures(54321, 4) is "54320". */
export function toFigures(a: Exact, figures: number): string {
  const places = decimalsForFigures(a, figures);
  if (places >= 0) return toDecimals(a, places);
  const unit = 10n ** BigInt(-places);
  return toDecimals(multiply(decimal(toDecimals(ratio(a.n, a.d * unit), 0)), ratio(unit)), 0);
}
