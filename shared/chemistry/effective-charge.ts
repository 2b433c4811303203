import { computedConventions } from './conventions';
import type { ComputedConvention } from './conventions';
import { outermost } from './configurations';
import { countedDerivation, figure } from './derivation';
import type { Derivation, Figure } from './derivation';
import { ionisationEnergiesEv } from './data/ionisation-energies';
import { screeningConstants } from './data/screening-constants';
import { decimal, decimalsForFigures, divide, multiply, squareRoot, subtract, toDecimals, toFigures, toFractionText, whole } from './exact';
import type { Exact } from './exact';
import { found, refused } from './result';
import type { Result } from './result';
import { screeningTerms, sigmaOf } from './slater';
import { speciesText } from './species';
import { isSameSubshell, subshellLabel } from './subshells';
import type { Target } from './target';
import { formatConfiguration } from './typed-configuration';

/** Figures of a value that is no short decimal. */
export const FIGURES = 4;

/** The Rydberg energy in eV, from hc R_infinity. Source: CODATA 2018, from memory. */
export const RYDBERG_EV = decimal('13.605693');

export interface EffectiveCharge {
  readonly sigma: Exact;
  readonly zeff: Exact;
  readonly decimals: number;
  /** Null where the value is a short decimal. */
  readonly figures: number | null;
  readonly derivation: Derivation;
}

/** A number printed with its figures: 1.8192 to 4 is "1.819". */
export const inFigures = (value: Exact): Figure => ({ fraction: toFractionText(value), text: toFigures(value, FIGURES) });

/** sigma and Z_eff in elementary charges under a convention; refused outside what the convention covers. Cl 3p: 10.90 and 6.10 by Slater's rules. */
export function effectiveCharge(target: Target, convention: ComputedConvention): Result<EffectiveCharge> {
  if (convention === 'scf') return fromScreeningConstant(target);
  if (convention === 'ionisation-energy') return fromIonisationEnergy(target);
  const { species, electron } = target;
  const terms = screeningTerms(species.configuration, electron, convention);
  const sigma = sigmaOf(terms);
  const zeff = subtract(whole(species.element.number), sigma);
  return found({ sigma, zeff, decimals: 2, figures: null, derivation: countedDerivation(species, electron, convention, terms) });
}

const SCF_DECIMALS = 4;
const SCF_LAST = 86;

/**
 * Z less a tabulated screening constant. Source: Clementi and Raimondi, J. Chem. Phys. 38, 2686 (1963); Clementi, Raimondi and
 * Reinhardt, J. Chem. Phys. 47, 1300 (1967). For 2p of carbon 6 − 2.8642 = 3.1358.
 */
function fromScreeningConstant(target: Target): Result<EffectiveCharge> {
  const { species, electron } = target;
  const { element, charge, isTyped } = species;
  if (charge !== 0 || isTyped) return outside('scf', 'The table is of neutral atoms in their ground state');
  if (element.number > SCF_LAST) return outside('scf', `The table ends at ${SCF_LAST}, and ${element.name.toLowerCase()} is ${element.number}`);
  const label = subshellLabel(electron);
  const constant = screeningConstants[element.number]?.[label];
  if (constant === undefined) return outside('scf', `The table has no ${label} constant for ${element.name.toLowerCase()}`);
  const sigma = decimal(constant);
  const zeff = subtract(whole(element.number), sigma);
  const step = `Z − σ = ${element.number} − ${constant} = ${toDecimals(zeff, SCF_DECIMALS)}`;
  return found({ sigma, zeff, decimals: SCF_DECIMALS, figures: null, derivation: derivationOf(target, 'scf', figure(sigma, SCF_DECIMALS), figure(zeff, SCF_DECIMALS), step) });
}

/**
 * Z_eff = n × √(E / 13.605693 eV) of the electron that is ionised. Source of E: NIST Atomic Spectra Database; the formula is the
 * hydrogen-like one, common practice. For 2p of carbon, 11.260288 eV: 1.819.
 */
function fromIonisationEnergy(target: Target): Result<EffectiveCharge> {
  const { species, electron } = target;
  const { element, charge, configuration, isTyped } = species;
  const name = speciesText(element.symbol, charge);
  if (isTyped) return outside('ionisation-energy', 'A measured ionisation energy is that of the ground state');
  const lost = outermost(configuration);
  if (!lost || !isSameSubshell(lost, electron)) {
    return outside('ionisation-energy', `The ionisation energy of ${name} is that of a ${lost ? subshellLabel(lost) : ''} electron and says nothing of ${subshellLabel(electron)}`);
  }
  const energy = charge < 0 ? undefined : ionisationEnergiesEv[element.number]?.[charge]?.[0];
  if (energy === undefined) return outside('ionisation-energy', `The table has no ionisation energy of ${name}`);
  const zeff = multiply(whole(electron.n), squareRoot(divide(decimal(energy), RYDBERG_EV)));
  const sigma = subtract(whole(element.number), zeff);
  const step = `${electron.n} × √(${energy} eV / 13.605693 eV) = ${toFigures(zeff, FIGURES)}`;
  const derivation = derivationOf(target, 'ionisation-energy', inFigures(sigma), inFigures(zeff), step);
  return found({ sigma, zeff, decimals: Math.max(0, decimalsForFigures(zeff, FIGURES)), figures: FIGURES, derivation });
}

const outside = <T>(convention: ComputedConvention, reason: string): Result<T> =>
  refused('outside-convention', `${reason}. ${computedConventions[convention].name}: ${lowerFirst(computedConventions[convention].range)}`);

const lowerFirst = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);

const derivationOf = ({ species, electron }: Target, convention: ComputedConvention, sigma: Figure, zeff: Figure, step: string): Derivation => ({
  convention,
  conventionName: computedConventions[convention].name,
  species: speciesText(species.element.symbol, species.charge),
  electron: subshellLabel(electron),
  configuration: formatConfiguration(species.configuration),
  groups: [],
  nuclearCharge: species.element.number,
  sigma,
  zeff,
  steps: [step],
  selfScreening: null,
  source: computedConventions[convention].source,
});
