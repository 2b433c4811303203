import { derivationGroup } from '../derivation';
import type { DerivationGroup } from '../derivation';
import { equals, toDecimals } from '../exact';
import type { Exact } from '../exact';
import { targetOf } from '../target';
import type { AskedInput } from '../work';
import { slipCatalogue } from './catalogue';
import { slipContext } from './context';
import { differenceText } from './method';
import type { Slip } from './method';

/** A wrong method applied to one item. */
export interface SlipValue {
  readonly id: string;
  readonly name: string;
  readonly value: Exact;
  /** As printed, two decimals: `5.75`. */
  readonly text: string;
  /** What differs: `7 × 0.35 where the key has 6 × 0.35`. */
  readonly oneLine: string;
  /** For the candidate: the rule, then what leads to the value. */
  readonly feedback: string;
  /** It gives the right number, so the item cannot see it. */
  readonly isSilent: boolean;
  /** The wrong sum in the form of a derivation, and what it is taken from; null where the method is no sum. */
  readonly terms: readonly DerivationGroup[] | null;
  readonly nuclearCharge: number;
}

/**
 * What each slip comes to on one item, in the order of the catalogue; for Z_eff and sigma by Slater's rules, and none for any
 * other item. Rules: J. C. Slater, Phys. Rev. 36, 57 (1930). Counting the electron itself gives 5.75 for 3p of chlorine.
 */
export function slipsOf(asked: AskedInput): readonly SlipValue[] {
  const { quantity, convention } = asked;
  const target = targetOf(asked);
  if (!target.ok || convention !== 'slater' || (quantity !== 'zeff' && quantity !== 'sigma')) return [];
  const context = slipContext(target.value);
  const key = quantity === 'zeff' ? context.key : context.sigma;
  return slipCatalogue.flatMap((slip) => {
    const outcome = slip.outcome(context);
    const value = outcome && (quantity === 'zeff' ? outcome.zeff : outcome.sigma);
    if (!value) return [];
    const text = toDecimals(value, 2);
    return {
      id: slip.id,
      name: slip.name,
      value,
      text,
      oneLine: outcome.differs ?? differenceText(outcome.terms ?? [], context.terms),
      feedback: `${slip.rule(context)} ${slip.leads(context, outcome)} it comes to ${text.replace('-', '−')}.`,
      isSilent: equals(value, key),
      terms: outcome.terms?.map(derivationGroup) ?? null,
      nuclearCharge: outcome.nuclear,
    };
  });
}

/** The slips that cannot be made on an item at all: an s electron of shell 1 has no shell below to count wrongly. Same rules. */
export function slipsWithoutOccasion(asked: AskedInput): readonly Pick<Slip, 'id' | 'name'>[] {
  const made = new Set(slipsOf(asked).map(({ id }) => id));
  return slipCatalogue.filter(({ id }) => !made.has(id)).map(({ id, name }) => ({ id, name }));
}
