import { absolute, compare, divide, equals, multiply, ratio, subtract, type Exact } from '../chemistry/exact';

const floorOf = ({ n, d }: Exact): bigint => (n >= 0n ? n / d : -((-n + d - 1n) / d));

const unitOf = (places: number): Exact => (places >= 0 ? ratio(1n, 10n ** BigInt(places)) : ratio(10n ** BigInt(-places)));

/**
 * Both values that round to a place count when the exact value lies half-way (ISO 80000-1, rules A and B, differ only there):
 * roundings of 4.55 to one decimal are 4.5 and 4.6, of 3.72 only 3.7. Places may be negative.
 */
export function roundings(value: Exact, places: number): Exact[] {
  const unit = unitOf(places);
  const scaled = divide(value, unit);
  const below = floorOf(scaled);
  const part = compare(subtract(scaled, ratio(below)), ratio(1n, 2n));
  const neighbours = part < 0 ? [below] : part > 0 ? [below + 1n] : [below, below + 1n];
  return neighbours.map((count) => multiply(ratio(count), unit));
}

/** Cut off toward zero: truncation of 4.57 to one decimal is 4.5, of -4.57 it is -4.5. */
export function truncation(value: Exact, places: number): Exact {
  const unit = unitOf(places);
  const scaled = divide(absolute(value), unit);
  const cut = multiply(ratio(floorOf(scaled)), unit);
  return value.n < 0n ? subtract(ratio(0n), cut) : cut;
}

/** Whether a value given to some places is the exact one rounded there, or cut off there where that is allowed. */
export function isRounding(given: Exact, exact: Exact, places: number, allowsTruncation: boolean): boolean {
  if (roundings(exact, places).some((rounded) => equals(rounded, given))) return true;
  return allowsTruncation && equals(truncation(exact, places), given);
}

/** The power of ten of the first significant figure: 1 for 6.10, 0.01 gives -2 as exponent. */
export function leadingExponent(value: Exact): number {
  const size = absolute(value);
  if (size.n === 0n) return 0;
  let exponent = size.n.toString().length - size.d.toString().length;
  if (compare(size, unitOf(-exponent)) < 0) exponent -= 1;
  return exponent;
}
