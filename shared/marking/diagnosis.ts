import { slipLetter } from '../chemistry/slips/letters';
import { slipsOf, type SlipValue } from '../chemistry/slips/slips-of';
import { meets } from './meeting';
import type { ReadValue } from './read-answer';
import type { Asked, ItemScheme } from './scheme';

export interface FittingSlip {
  readonly id: string;
  readonly letter: string;
  readonly name: string;
  readonly text: string;
  readonly feedback: string;
}

const worked = new WeakMap<Asked, readonly SlipValue[]>();

/** The slips of a question, worked once: they rest on nothing else. */
function slipsKnown(asked: Asked): readonly SlipValue[] {
  const known = worked.get(asked);
  if (known) return known;
  const fresh = slipsOf(asked);
  worked.set(asked, fresh);
  return fresh;
}

/**
 * Every slip that a value fits, with the roundings of the key, the commonest first, whether the scheme names it or not: a likely
 * explanation, never proof. 5.75 for Cl 3p fits "counts the electron itself"; 5.8 too, where one decimal is accepted.
 */
export function slipsThatFit(scheme: ItemScheme, read: ReadValue): FittingSlip[] {
  return slipsKnown(scheme.asked)
    .filter(({ value, figures, isSilent }) => !isSilent && meets(read, { value, decimals: scheme.key.decimals, figures: figures === null ? undefined : scheme.key.figures }, scheme.roundings) !== null)
    .map(({ id, name, text, feedback }) => ({ id, letter: slipLetter(id), name, text, feedback }));
}

/** A slip that fits, with the numbers of the candidate's other items that it explains too. */
export interface LikelySlip extends FittingSlip {
  readonly alsoOn: readonly number[];
}

/** Another item of the same candidate, and the slips that its value fits. */
export interface OtherItem {
  readonly number: number;
  readonly fits: readonly Pick<FittingSlip, 'id'>[];
}

/**
 * Slips that fit, strongest first: one that explains more of the same candidate's items is stronger, a tie goes to the commoner.
 * Ours, no source. A value that fits two is more likely the one that the candidate made on item 3 as well.
 */
export const strongestFirst = (fits: readonly FittingSlip[], others: readonly OtherItem[]): LikelySlip[] =>
  fits
    .map((slip) => ({ ...slip, alsoOn: others.filter((other) => other.fits.some(({ id }) => id === slip.id)).map(({ number }) => number) }))
    .sort((one, other) => other.alsoOn.length - one.alsoOn.length);
