import { speciesOf } from './configurations';
import type { Species, SpeciesAsked } from './configurations';
import { computedConventions } from './conventions';
import { countedDerivation } from './derivation';
import type { Derivation } from './derivation';
import { subtract, whole } from './exact';
import type { Exact } from './exact';
import { found, refused } from './result';
import type { Result } from './result';
import { screeningTerms, sigmaOf } from './slater';
import type { CountingConvention } from './slater';
import { speciesText } from './species';
import { isSameSubshell, parseSubshell, subshellLabel } from './subshells';
import type { Subshell } from './subshells';
import { formatConfiguration } from './typed-configuration';

/** What fixes a computed value. */
export interface AskedInput extends SpeciesAsked {
  /** Such as `3p`. */
  readonly electron: string;
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

export interface Target {
  readonly species: Species;
  readonly electron: Subshell;
}

/** Species and electron of an item; refused where the subshell is empty: iron has no 4p electron in its ground state. */
export function targetOf(asked: Pick<AskedInput, 'symbol' | 'charge' | 'configuration' | 'electron'>): Result<Target> {
  const species = speciesOf(asked);
  if (!species.ok) return species;
  const electron = parseSubshell(asked.electron);
  if (!electron.ok) return electron;
  const { element, charge, configuration, isTyped } = species.value;
  if (configuration.some((occupation) => isSameSubshell(occupation, electron.value))) return found({ species: species.value, electron: electron.value });
  const label = subshellLabel(electron.value);
  if (isTyped) return refused('empty-subshell', `The configuration ${formatConfiguration(configuration)} has no ${label} electron.`);
  const name = charge === 0 ? element.name : speciesText(element.symbol, charge);
  return refused('empty-subshell', `${name} has no ${label} electron in its ground state.`);
}

const counting: readonly string[] = ['slater', 'slater-035-in-1s', 'slater-d-at-1', 'core-count'] satisfies readonly CountingConvention[];
const isCounting = (convention: string): convention is CountingConvention => counting.includes(convention);
