import { valuesByOtherConventions } from '../chemistry/other-conventions';
import { absolute, compare, equals, exactDecimals, fromFractionText, subtract, toDecimals, type Exact } from '../chemistry/exact';
import { slipsOf } from '../chemistry/slips/slips-of';
import { bandOf } from './bands';
import { roundings } from './rounding';
import type { ItemScheme } from './scheme';

/** A wrong value that a band would pay. */
export interface GuardFinding {
  readonly kind: 'slip' | 'convention';
  readonly name: string;
  readonly text: string;
  readonly band: string;
  readonly grains: number;
  /** How far from the key, exact where a decimal says it: "0.02 above", "0.30 below". */
  readonly distance: string;
}

/** A slip that an accepted rounding cannot be told from: both are written alike at so many decimals. */
export interface Untold {
  readonly name: string;
  readonly text: string;
  readonly rounded: string;
  readonly decimals: number;
}

const distanceText = (value: Exact, key: Exact): string => {
  const gap = subtract(value, key);
  const text = toDecimals(absolute(gap), Math.max(2, Math.min(4, exactDecimals(gap) ?? 4)));
  return `${text} ${gap.n < 0n ? 'below' : 'above'}`;
};

/**
 * The tolerance guard: slips and other conventions' values that the bands of a scheme would pay, nearest first; none without a
 * band. 5 % round 6.10 pays the SCF value 6.1161 of Cl 3p and all inner electrons at 0.85, 6.40.
 */
export function guardOf(scheme: ItemScheme): GuardFinding[] {
  const key = fromFractionText(scheme.key.value);
  const shared = new Set((scheme.slips ?? []).map(({ id }) => id));
  const accepted = scheme.alternatives.map(({ value }) => fromFractionText(value));
  const wrong = [
    ...slipsOf(scheme.asked)
      .filter(({ isSilent, id }) => !isSilent && !shared.has(id))
      .map(({ name, text, value }) => ({ kind: 'slip' as const, name, text, value })),
    ...valuesByOtherConventions(scheme.asked)
      .filter(({ value }) => !accepted.some((known) => equals(known, value)))
      .map(({ name, text, value }) => ({ kind: 'convention' as const, name, text, value })),
  ];
  return wrong
    .flatMap(({ value, ...rest }) => {
      const band = bandOf(scheme.bands, key, value);
      return band ? [{ ...rest, band: band.name, grains: band.grains, distance: distanceText(value, key), gap: absolute(subtract(value, key)) }] : [];
    })
    .sort((one, other) => compare(one.gap, other.gap))
    .map(({ gap: _gap, ...finding }) => finding);
}

/** Slips that share an accepted rounding with the key: 3.75 and 3.80 of Fe 4s are both 3.8 at one decimal. */
export function untoldSlips(scheme: ItemScheme): Untold[] {
  const { downToDecimals } = scheme.roundings;
  if (downToDecimals === null) return [];
  const key = fromFractionText(scheme.key.value);
  return slipsOf(scheme.asked)
    .filter(({ isSilent }) => !isSilent)
    .flatMap(({ name, text, value }): Untold[] => {
      for (let decimals = scheme.key.decimals - 1; decimals >= downToDecimals; decimals -= 1) {
        const alike = roundings(key, decimals).find((rounded) => roundings(value, decimals).some((other) => equals(rounded, other)));
        if (alike) return [{ name, text, rounded: toDecimals(alike, decimals), decimals }];
      }
      return [];
    });
}
