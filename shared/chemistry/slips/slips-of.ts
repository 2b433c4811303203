import { derivationGroup } from '../derivation';
import type { DerivationGroup } from '../derivation';
import { carriedValue } from '../carried-on';
import { equals, toDecimals, toFigures } from '../exact';
import type { Exact } from '../exact';
import { targetOf } from '../target';
import { work } from '../work';
import type { AskedInput } from '../work';
import { slipCatalogue } from './catalogue';
import { slipContext } from './context';
import { differenceText } from './method';
import type { Outcome, Slip } from './method';

/** A wrong method applied to one item. */
export interface SlipValue {
  readonly id: string;
  readonly name: string;
  readonly value: Exact;
  /** As printed, two decimals: `5.75`; to the figures of the key where that is no short decimal. */
  readonly text: string;
  /** Null where the value is a short decimal. */
  readonly figures: number | null;
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

const ofCharge: readonly string[] = ['zeff', 'sigma'];

/** What a wrong Z_eff or sigma makes of the question; null where it leads nowhere. */
function wrongValue(asked: AskedInput, outcome: Outcome): Exact | null {
  if (asked.quantity === 'zeff') return outcome.zeff;
  if (asked.quantity === 'sigma') return outcome.sigma;
  return outcome.zeff && carriedValue(asked, { quantity: 'zeff', value: outcome.zeff });
}

const minus = (text: string): string => text.replace('-', '−');

/** The last sentence for the candidate: what it comes to, by way of Z_eff where that is not what is asked. */
function comesTo(asked: AskedInput, outcome: Outcome, text: string): string {
  if (ofCharge.includes(asked.quantity) || !outcome.zeff) return `it comes to ${minus(text)}`;
  return `Z_eff comes to ${minus(toDecimals(outcome.zeff, 2))}, and what is asked to ${minus(text)}`;
}

/**
 * What each slip comes to on one item, in the order of the catalogue; for Z_eff, sigma and what follows from them by Slater's
 * rules, and none for any other item. Rules: J. C. Slater, Phys. Rev. 36, 57 (1930). Counting the electron itself gives 5.75 for
 * Z_eff of 3p of chlorine, and −49.98 eV for its energy.
 */
export function slipsOf(asked: AskedInput): readonly SlipValue[] {
  const { quantity, convention } = asked;
  const target = targetOf(asked);
  // An electronegativity that counts the electron itself makes the commonest slip its rule.
  if (!target.ok || convention !== 'slater' || quantity === 'difference' || (quantity === 'electronegativity' && asked.countsItself)) return [];
  const worked = work(asked);
  if (!worked.ok) return [];
  const context = slipContext(target.value);
  const { value: key, figures } = worked.value;
  return slipCatalogue.flatMap((slip) => {
    const outcome = slip.outcome(context);
    const value = outcome && wrongValue(asked, outcome);
    if (!value) return [];
    const text = figures === null ? toDecimals(value, 2) : toFigures(value, figures);
    return {
      id: slip.id,
      name: slip.name,
      value,
      text,
      figures,
      oneLine: outcome.differs ?? differenceText(outcome.terms ?? [], context.terms),
      feedback: `${slip.rule(context)} ${slip.leads(context, outcome)} ${comesTo(asked, outcome, text)}.`,
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
