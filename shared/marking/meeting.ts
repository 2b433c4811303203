import { equals, exactDecimals, type Exact } from '../chemistry/exact';
import type { ReadValue } from './read-answer';
import { isRounding } from './rounding';
import type { RoundingPolicy } from './scheme';

export interface Target {
  readonly value: Exact;
  readonly decimals: number;
}

export type Met = 'exactly' | 'rounded' | null;

/**
 * Whether a value meets a target: exactly, with at least the decimals the target states, or as an accepted rounding to the
 * fewer decimals given. 6.100 meets 6.10 exactly, 6.1 rounded, 15/4 meets 3.75 exactly; 3.8 meets 3.75 rounded, 3.80 not at all.
 */
export function meets(read: ReadValue, target: Target, policy: RoundingPolicy): Met {
  const isFraction = read.figures === null;
  if (equals(read.value, target.value) && (isFraction || read.decimals >= target.decimals)) return 'exactly';
  if (isFraction || policy.downToDecimals === null || read.decimals < policy.downToDecimals) return null;
  const isShort = exactDecimals(target.value) !== null;
  if (isShort && read.decimals >= target.decimals) return null;
  return isRounding(read.value, target.value, read.decimals, policy.truncation) ? 'rounded' : null;
}
