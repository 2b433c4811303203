import { slipsOf, slipsWithoutOccasion } from '../../chemistry/slips/slips-of';
import type { ItemScheme } from '../scheme';

interface NamedOnly {
  readonly id: string;
  readonly name: string;
}

export interface SilentSlips {
  /** They give the right number: the item cannot see them. */
  readonly rightNumber: readonly (NamedOnly & { readonly text: string })[];
  /** They cannot be made on this item at all. */
  readonly noOccasion: readonly NamedOnly[];
}

/**
 * The slips that an item cannot see; nothing is said of an item on which none is worked. Ours, no source; values in elementary
 * charges. On Be 2s no shell is deeper than the one below, so all inner electrons at 0.85 gives the right 1.95.
 */
export function silentSlips({ asked }: Pick<ItemScheme, 'asked'>): SilentSlips {
  const made = slipsOf(asked);
  if (made.length === 0) return { rightNumber: [], noOccasion: [] };
  return {
    rightNumber: made.filter(({ isSilent }) => isSilent).map(({ id, name, text }) => ({ id, name, text })),
    noOccasion: slipsWithoutOccasion(asked),
  };
}
