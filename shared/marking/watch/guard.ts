import { compare, equals, fromFractionText, subtract } from '../../chemistry/exact';
import { bandOf, bandRange } from '../bands';
import type { Band, ItemScheme } from '../scheme';
import { conventionValues, distanceText, nearestTo, slipValues, type WrongValue } from './wrong-values';

/** A wrong value that a band would pay. */
export interface PaidValue extends WrongValue {
  /** How far from the key: "0.02 above", "0.30 below". */
  readonly distance: string;
  readonly grains: number;
  /** What the scheme gives it by a rule of its own, less than the band does; null where it has none. */
  readonly ownGrains: number | null;
}

export interface BandGuard {
  readonly band: Band;
  /** Nearest first; empty where the band pays no known wrong value. */
  readonly pays: readonly PaidValue[];
}

/** The marks that a share or an alternative gives a wrong value; null where the scheme says nothing of it. */
function ownGrainsOf({ slips = [], alternatives }: ItemScheme, wrong: WrongValue): number | null {
  const shares = wrong.kind === 'slip' ? slips.filter(({ id }) => id === wrong.id) : [];
  const accepted = alternatives.filter(({ value }) => equals(fromFractionText(value), wrong.value));
  const grains = [...shares, ...accepted].map((rule) => rule.grains);
  return grains.length === 0 ? null : Math.max(...grains);
}

const widthOf = (band: Band, key: ReturnType<typeof fromFractionText>) => {
  const { from, to } = bandRange(band, key);
  return subtract(to, from);
};

/**
 * The tolerance guard: for each band, the narrowest first, the slips and other conventions' values that it would pay. The highest
 * mark wins, so a value with a smaller share of its own is named too; one with as much or more is paid on purpose and is not.
 * Ours, no source; marks in grains, distances in the unit of the key. 5 % round 6.10 of Cl 3p pays the SCF value 6.1161, 0.0161
 * above, and all inner electrons at 0.85, 6.40.
 */
export function guardOf(scheme: ItemScheme): BandGuard[] {
  const key = fromFractionText(scheme.key.value);
  const wrong = [...slipValues(scheme.asked), ...conventionValues(scheme.asked)].sort(nearestTo(key));
  return [...scheme.bands]
    .sort((one, other) => compare(widthOf(one, key), widthOf(other, key)))
    .map((band) => ({
      band,
      pays: wrong.flatMap((value): PaidValue[] => {
        const ownGrains = ownGrainsOf(scheme, value);
        if (bandOf(scheme.bands, key, value.value) !== band || (ownGrains ?? -1) >= band.grains) return [];
        return [{ ...value, distance: distanceText(value.value, key), grains: band.grains, ownGrains }];
      }),
    }));
}
