import { equals, exactDecimals, type Exact } from '../chemistry/exact';
import type { ReadValue } from './read-answer';
import { isRounding, leadingExponent } from './rounding';
import type { RoundingPolicy } from './scheme';

export interface Target {
  readonly value: Exact;
  readonly decimals: number;
  /** Stated for a value that is no short decimal. */
  readonly figures?: number | undefined;
}

export type Met = 'exactly' | 'rounded' | null;

/**
 * Whether a value meets a target: exactly, with at least the decimals the target states, or as an accepted rounding to the
 * fewer decimals given. 6.100 meets 6.10 exactly, 6.1 rounded, 15/4 meets 3.75 exactly; 3.8 meets 3.75 rounded, 3.80 not at all.
 */
export function meets(read: ReadValue, target: Target, policy: RoundingPolicy): Met {
  if (target.figures !== undefined) return meetsFigures(read, target.value, target.figures, policy);
  const isFraction = read.figures === null;
  if (equals(read.value, target.value) && (isFraction || read.decimals >= target.decimals)) return 'exactly';
  if (isFraction || policy.downToDecimals === null || read.decimals < policy.downToDecimals) return null;
  const isShort = exactDecimals(target.value) !== null;
  if (isShort && read.decimals >= target.decimals) return null;
  return isRounding(read.value, target.value, read.decimals, policy.truncation) ? 'rounded' : null;
}

/**
 * A value that no short decimal says is met by its roundings only: to the figures given, from the fewest that count up; both
 * neighbours on a tie. -56.25 and -56.3 meet an energy of -56.2547 eV stated to four figures, where three are enough; -56 does not.
 */
function meetsFigures(read: ReadValue, exact: Exact, figures: number, policy: RoundingPolicy): Met {
  const fewest = policy.downToFigures ?? figures;
  if (read.figures === null || read.figures < fewest) return null;
  const places = read.figures - 1 - leadingExponent(exact);
  return isRounding(read.value, exact, places, policy.truncation) ? 'rounded' : null;
}
