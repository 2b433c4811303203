import { valuesByOtherConventions } from '../../chemistry/other-conventions';
import { absolute, compare, exactDecimals, subtract, toDecimals, type Exact } from '../../chemistry/exact';
import { slipsOf, type SlipValue } from '../../chemistry/slips/slips-of';
import type { Asked } from '../scheme';

/** A number that an item has besides its key: what a slip comes to, or what another convention makes of the question. */
export interface WrongValue {
  readonly kind: 'slip' | 'convention';
  /** Of the slip or the convention, as stored. */
  readonly id: string;
  readonly name: string;
  readonly value: Exact;
  readonly text: string;
}

const withoutSteps = ({ id, name, value, text }: Pick<SlipValue, 'id' | 'name' | 'value' | 'text'>): WrongValue => ({ kind: 'slip', id, name, value, text });

/**
 * What the slips come to that the item can see, the commonest first; none unless it asks for Z_eff or sigma by Slater's rules
 * (Phys. Rev. 36, 57, 1930). Elementary charges. For Cl 3p the first is 5.75, "counts the electron itself".
 */
export const slipValues = (asked: Asked): WrongValue[] => slipsOf(asked).filter(({ isSilent }) => !isSilent).map(withoutSteps);

/**
 * What the other conventions make of the question, where they differ from the key, in the unit of the key. Sources: see
 * computedConventions. For Cl 3p by Slater's rules 6.1161 is one of them, from the SCF screening constants.
 */
export const conventionValues = (asked: Asked): WrongValue[] =>
  valuesByOtherConventions(asked).map(({ convention, name, value, text }) => ({ kind: 'convention', id: convention, name, value, text }));

/**
 * How far a value lies from the key, exact where four decimals say it. In the unit of the key; ours, no source.
 * 6.40 from 6.10 is "0.30 above", 5.75 is "0.35 below".
 */
export function distanceText(value: Exact, key: Exact): string {
  const gap = subtract(value, key);
  const text = toDecimals(absolute(gap), Math.max(2, Math.min(4, exactDecimals(gap) ?? 4)));
  return `${text} ${gap.n < 0n ? 'below' : 'above'}`;
}

/** Orders values by how far they lie from the key, the nearest first. Ours, no source: 6.40 before 5.75, seen from 6.10. */
export const nearestTo = (key: Exact) => (one: { readonly value: Exact }, other: { readonly value: Exact }): number =>
  compare(absolute(subtract(one.value, key)), absolute(subtract(other.value, key)));
