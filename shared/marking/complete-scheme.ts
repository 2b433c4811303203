import { exactDecimals, fromFractionText } from '../chemistry/exact';
import type { CompleteScheme, ItemScheme, Key } from './scheme';

/** Figures of a key that is no short decimal and states none. */
const DEFAULT_FIGURES = 4;

const completeKey = (key: Key): Key => (key.figures === undefined && exactDecimals(fromFractionText(key.value)) === null ? { ...key, figures: DEFAULT_FIGURES } : key);

/**
 * A scheme with every part said, whenever it was stored: what it does not name is none. Our rule, no source; marks in grains.
 * A scheme of a Cl 3p item that has no `methodMarks` has the empty list of them, and no follow-through.
 */
export const completeScheme = (scheme: ItemScheme): CompleteScheme => ({
  ...scheme,
  key: completeKey(scheme.key),
  unitRule: scheme.unitRule ?? null,
  signRule: scheme.signRule ?? null,
  slips: scheme.slips ?? [],
  followThrough: scheme.followThrough ?? null,
  methodMarks: scheme.methodMarks ?? [],
  printed: scheme.printed ?? null,
  withdrawn: scheme.withdrawn ?? 'none',
});
