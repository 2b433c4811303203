import { GRAINS_PER_MARK } from '../marking/grains';
import type { ScaleData } from '../marking/scale';
import type { ScaleProps } from '../ui/scale-props';

const marks = (grains: number): number => grains / GRAINS_PER_MARK;

/** What the scale of an item shows of its scheme: ends, graduations, key, roundings, alternatives, bands. */
export function drawnScale(data: ScaleData, keyText: string): Omit<ScaleProps, 'fit'> {
  return {
    lo: data.lo,
    hi: data.hi,
    major: data.major,
    minor: data.minor,
    decimals: data.decimals,
    of: marks(data.maxGrains),
    keyAt: data.key.at,
    keyText,
    roundings: data.roundings,
    alternatives: data.alternatives.map(({ at, label, grains }) => ({ at, label, marks: marks(grains) })),
    slips: data.slips.map(({ at, letter, name, text, grains }) => ({ at, letter, name, text, marks: marks(grains) })),
    bands: data.bands.map(({ name, from, to, grains }) => ({ name, from, to, marks: marks(grains) })),
  };
}
