import type { DerivationGroup } from '../../../shared/chemistry/derivation';
import { equals, exactDecimals, fromFractionText, toDecimals, zero } from '../../../shared/chemistry/exact';
import { slipsOf } from '../../../shared/chemistry/slips/slips-of';
import type { SlipValue } from '../../../shared/chemistry/slips/slips-of';
import { demoItems, keyText, oneDecimal, workedKey } from './demo-items';
import type { DemoItem } from './demo-items';
import type { ItemFacts, SlipFacts } from './truth';
import type { Term } from './working';

/** How common each slip is among the invented candidates: the demo's choice, no finding. Slips not named here are not made. */
const commonness: Readonly<Record<string, number>> = {
  'counts-itself': 26,
  'same-group-030': 5,
  'same-group-ignored': 5,
  'same-group-085': 3,
  'period-as-count': 1,
  'coefficients-rounded': 1,
  'all-at-100': 2,
  'shell-below-100': 10,
  'all-inner-085': 7,
  'coefficients-exchanged': 6,
  'shell-below-left-out': 2,
  'deep-core-left-out': 4,
  'inner-octet-left-out': 1,
  'next-group-only': 4,
  'inner-d-at-100': 11,
  'inner-d-left-out': 5,
  's-and-p-split': 5,
  'sp-rule-on-d': 12,
  'd-grouped-with-sp': 5,
  'filling-order': 12,
  'outer-at-035': 4,
  'core-electrons-only': 6,
  'sigma-for-zeff': 5,
  'zeff-for-sigma': 8,
  'sign-reversed': 1,
  'no-shielding': 0.5,
  'missing-bracket': 0.7,
  'mass-number': 0.6,
  'nuclear-charge-changed': 6,
  'charge-added': 3,
  'element-before': 0.6,
  'element-after': 0.6,
};

/** What must be known of the demo's items to invent answers to them: keys, slips and sums all come from the engine. */
export const demoFacts = (): readonly ItemFacts[] => demoItems.map(factsOf);

export function factsOf(item: DemoItem): ItemFacts {
  const { value, derivation } = workedKey(item);
  return {
    number: item.number,
    quantity: item.asked.quantity === 'sigma' ? 'sigma' : 'zeff',
    nuclear: derivation.nuclearCharge,
    key: keyText(item),
    terms: termsOf(derivation.groups),
    roundings: oneDecimal(value),
    slips: slipsOf(item.asked).flatMap(slipFacts),
  };
}

function slipFacts({ id, text, isSilent, terms, nuclearCharge }: SlipValue): readonly SlipFacts[] {
  const weight = commonness[id];
  if (weight === undefined || isSilent) return [];
  return [{ slip: id, text, weight, ...(terms ? { terms: termsOf(terms), nuclear: nuclearCharge } : {}) }];
}

/** The sum as it is written down: the electron's own group first, then inwards, electrons that count alike together. */
export function termsOf(groups: readonly DerivationGroup[]): readonly Term[] {
  const counts = new Map<string, number>();
  for (const { counted, coefficient } of [...groups].reverse()) {
    const factor = fromFractionText(coefficient.fraction);
    if (counted === 0 || equals(factor, zero)) continue;
    const written = toDecimals(factor, exactDecimals(factor) ?? 2);
    counts.set(written, (counts.get(written) ?? 0) + counted);
  }
  return [...counts].map(([factor, count]) => ({ factor, count }));
}
