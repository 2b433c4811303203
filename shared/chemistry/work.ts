import { computedConventions } from './conventions';
import { countedDerivation } from './derivation';
import type { Derivation } from './derivation';
import { subtract, whole } from './exact';
import type { Exact } from './exact';
import { found, refused } from './result';
import type { Result } from './result';
import { screeningTerms, sigmaOf } from './slater';
import type { CountingConvention } from './slater';
import { targetOf } from './target';
import type { ElectronAsked } from './target';
import { formatConfiguration } from './typed-configuration';

/** What fixes a computed value. */
export interface AskedInput extends ElectronAsked {
  readonly quantity: string;
  readonly convention: string;
}

export interface Worked {
  readonly value: Exact;
  /** Null where the convention has no screening constant. */
  readonly sigma: Exact | null;
  readonly zeff: Exact;
  readonly configuration: string;
  readonly derivation: Derivation;
  /** The decimals a key of this kind is stated with: 2 by Slater's rules. */
  readonly decimals: number;
  readonly source: string;
}

/**
 * The value of a computed item, with its derivation; charges in elementary charges.
 * Z_eff of a 3p electron of Cl by Slater's rules (Phys. Rev. 36, 57, 1930) is 61/10.
 */
export function work(asked: AskedInput): Result<Worked> {
  const target = targetOf(asked);
  if (!target.ok) return target;
  const { species, electron } = target.value;
  if (!isCounting(asked.convention)) return refused('outside-convention', `Nothing is computed under the convention “${asked.convention}”.`);
  const terms = screeningTerms(species.configuration, electron, asked.convention);
  const sigma = sigmaOf(terms);
  const zeff = subtract(whole(species.element.number), sigma);
  if (asked.quantity !== 'zeff' && asked.quantity !== 'sigma') return refused('outside-quantity', `Nothing is computed for the quantity “${asked.quantity}”.`);
  return found({
    value: asked.quantity === 'sigma' ? sigma : zeff,
    sigma,
    zeff,
    configuration: formatConfiguration(species.configuration),
    derivation: countedDerivation(species, electron, asked.convention, terms),
    decimals: 2,
    source: computedConventions[asked.convention].source,
  });
}

const counting: readonly string[] = ['slater', 'slater-035-in-1s', 'slater-d-at-1', 'core-count'] satisfies readonly CountingConvention[];
const isCounting = (convention: string): convention is CountingConvention => counting.includes(convention);
