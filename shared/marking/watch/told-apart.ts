import { equals, fromFractionText, toDecimals, type Exact } from '../../chemistry/exact';
import { roundings, truncation } from '../rounding';
import type { ItemScheme } from '../scheme';
import { distanceText, slipValues } from './wrong-values';

/** A slip that an accepted rounding cannot be told from: both are written alike at so many decimals. */
export interface NotToldApart {
  readonly id: string;
  readonly name: string;
  readonly text: string;
  /** What both are written as. */
  readonly rounded: string;
  readonly decimals: number;
  readonly distance: string;
}

/**
 * Slips that share an accepted rounding with the key, each at the most decimals where it does; with truncation accepted, what is
 * cut off counts as well. Roundings: ISO 80000-1, both neighbours on a tie. 3.75 and 3.80 of Fe 4s are both 3.8 at one decimal.
 */
export function toldApart(scheme: ItemScheme): NotToldApart[] {
  const { downToDecimals, truncation: cuts } = scheme.roundings;
  if (downToDecimals === null) return [];
  const key = fromFractionText(scheme.key.value);
  const written = (value: Exact, decimals: number): Exact[] => [...roundings(value, decimals), ...(cuts ? [truncation(value, decimals)] : [])];
  return slipValues(scheme.asked).flatMap(({ id, name, text, value }): NotToldApart[] => {
    for (let decimals = scheme.key.decimals - 1; decimals >= downToDecimals; decimals -= 1) {
      const theirs = written(value, decimals);
      const alike = written(key, decimals).find((ours) => theirs.some((other) => equals(ours, other)));
      if (alike) return [{ id, name, text, rounded: toDecimals(alike, decimals), decimals, distance: distanceText(value, key) }];
    }
    return [];
  });
}
