import { exactDecimals, fromFractionText } from '../chemistry/exact';
import type { CompleteScheme, ItemScheme, Key } from './scheme';

/** Figures of a key that is no short decimal and states none. */
const DEFAULT_FIGURES = 4;

const completeKey = (key: Key): Key => (key.figures === undefined && exactDecimals(fromFractionText(key.value)) === null ? { ...key, figures: DEFAULT_FIGURES } : key);

/** Schemes never change, so one that was completed stays so. */
const completed = new WeakMap<ItemScheme, CompleteScheme>();

/**
 * A scheme with every part said, whenever it was stored: what it does not name is none. Our rule, no source; marks in grains.
 * A scheme of a Cl 3p item that has no `methodMarks` has the empty list of them, and no follow-through.
 */
export function completeScheme(scheme: ItemScheme): CompleteScheme {
  const known = completed.get(scheme);
  if (known) return known;
  const fresh = complete(scheme);
  completed.set(scheme, fresh);
  return fresh;
}

const complete = (scheme: ItemScheme): CompleteScheme => ({
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
