import { absolute, add, compare, fromFractionText, multiply, ratio, subtract, type Exact } from '../chemistry/exact';
import { leadingExponent } from './rounding';
import type { Band } from './scheme';

export interface BandRange {
  readonly from: Exact;
  readonly to: Exact;
}

const half = ratio(1n, 2n);

/** Half the width of a band in the unit of the key: 0.05 absolute, 5 % of |key|, half a unit of a place or of a figure. */
function halfWidth(band: Band, key: Exact): Exact {
  const width = fromFractionText(band.width);
  if (band.kind === 'absolute') return width;
  if (band.kind === 'relative') return multiply(absolute(key), width);
  const places = band.kind === 'decimal-places' ? Number(width.n) : Number(width.n) - 1 - leadingExponent(key);
  return multiply(half, places >= 0 ? ratio(1n, 10n ** BigInt(places)) : ratio(10n ** BigInt(-places)));
}

/** The closed interval of a band round the key: 0.05 round 6.10 is 6.05 to 6.15. */
export function bandRange(band: Band, key: Exact): BandRange {
  const reach = halfWidth(band, key);
  return { from: subtract(key, reach), to: add(key, reach) };
}

export const contains = ({ from, to }: BandRange, value: Exact): boolean => compare(from, value) <= 0 && compare(value, to) <= 0;

const widthOf = ({ from, to }: BandRange): Exact => subtract(to, from);

/** The innermost band that contains the value, or null. */
export function bandOf(bands: readonly Band[], key: Exact, value: Exact): Band | null {
  const around = bands
    .map((band) => ({ band, range: bandRange(band, key) }))
    .filter(({ range }) => contains(range, value))
    .sort((one, other) => compare(widthOf(one.range), widthOf(other.range)));
  return around[0]?.band ?? null;
}

export interface SchemeProblem {
  /** Where in the scheme, such as `bands.1.grains`. */
  readonly path: string;
  readonly message: string;
}

const widthProblem = (band: Band): string | null => {
  const width = fromFractionText(band.width);
  if (width.n <= 0n) return 'A band needs a width above 0.';
  if (band.kind === 'absolute' || band.kind === 'relative') return null;
  if (width.d !== 1n || width.n > 12n) return 'Places and figures are whole numbers up to 12.';
  return null;
};

/** What is wrong with bands: each needs a width; of two, the narrower must give more marks. */
export function bandProblems(bands: readonly Band[], key: Exact, maxGrains: number): SchemeProblem[] {
  const problems: SchemeProblem[] = [];
  bands.forEach((band, index) => {
    const wrong = widthProblem(band);
    if (wrong) problems.push({ path: `bands.${index}.width`, message: wrong });
    if (!Number.isInteger(band.grains) || band.grains <= 0 || band.grains > maxGrains) {
      problems.push({ path: `bands.${index}.grains`, message: 'A band gives more than 0 marks and no more than the item is worth.' });
    }
  });
  if (problems.length > 0) return problems;
  const byWidth = bands
    .map((band, index) => ({ band, index, width: widthOf(bandRange(band, key)) }))
    .sort((one, other) => compare(one.width, other.width));
  byWidth.forEach(({ band, index, width }, at) => {
    const narrower = byWidth[at - 1];
    if (!narrower) return;
    if (compare(narrower.width, width) === 0) problems.push({ path: `bands.${index}.width`, message: 'Two bands have the same width.' });
    else if (narrower.band.grains <= band.grains) problems.push({ path: `bands.${index}.grains`, message: 'The narrower band must give more marks than the wider one.' });
  });
  return problems;
}
