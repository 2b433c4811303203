import { computedConventions } from './conventions';
import { subtract, toDecimals, toFractionText, whole } from './exact';
import type { Exact } from './exact';
import type { Species } from './configurations';
import { contributionOf, sigmaOf } from './slater';
import type { CountingConvention, Place, ScreeningTerm } from './slater';
import { speciesText } from './species';
import { subshellLabel } from './subshells';
import type { Subshell } from './subshells';
import { formatConfiguration } from './typed-configuration';

/** A number twice: exact, and as it is printed. */
export interface Figure {
  /** `61/10` */
  readonly fraction: string;
  /** `6.10` */
  readonly text: string;
}

/** One column of the drawing: a group, or the part of a group whose electrons share a coefficient. */
export interface DerivationGroup {
  /** Such as 2s with 2 electrons and 2p with 6, which stand together as (2s 2p)8. */
  readonly subshells: readonly { readonly label: string; readonly electrons: number }[];
  readonly electrons: number;
  /** The electrons that screen; one fewer than there are in the group of the asked electron. */
  readonly counted: number;
  readonly coefficient: Figure;
  readonly contribution: Figure;
  readonly place: Place;
  readonly isAsked: boolean;
}

/** A worked value as data, the same on screen, in feedback and in print. Plain strings and numbers, so it can be stored. */
export interface Derivation {
  readonly convention: string;
  readonly conventionName: string;
  /** `Fe²⁺` */
  readonly species: string;
  readonly electron: string;
  readonly configuration: string;
  /** In Slater's order; empty where the convention counts no electrons. */
  readonly groups: readonly DerivationGroup[];
  readonly nuclearCharge: number;
  readonly sigma: Figure;
  readonly zeff: Figure;
  /** Lines between or after, such as an energy from Z_eff; empty for Z_eff and sigma by Slater's rules. */
  readonly steps: readonly string[];
  /** Null where no electrons are counted. */
  readonly selfScreening: string | null;
  readonly source: string;
}

/** A number as it is stored and printed: figure(61/10, 2) is 61/10 and "6.10". */
export const figure = (value: Exact, decimals: number): Figure => ({ fraction: toFractionText(value), text: toDecimals(value, decimals) });

/** Coefficients and products of Slater's rules are multiples of 0.05. */
const DECIMALS = 2;

/**
 * How sigma and Z_eff come about by a count of electrons, group by group. Source of the rules: see screeningTerms.
 * For 3p of chlorine: 2 × 1.00 + 8 × 0.85 + 6 × 0.35 = 10.90, 17 − 10.90 = 6.10.
 */
export function countedDerivation(species: Species, electron: Subshell, convention: CountingConvention, terms: readonly ScreeningTerm[]): Derivation {
  const sigma = sigmaOf(terms);
  const { number, symbol } = species.element;
  const { name, source } = computedConventions[convention];
  return {
    convention,
    conventionName: name,
    species: speciesText(symbol, species.charge),
    electron: subshellLabel(electron),
    configuration: formatConfiguration(species.configuration),
    groups: terms.map(derivationGroup),
    nuclearCharge: number,
    sigma: figure(sigma, DECIMALS),
    zeff: figure(subtract(whole(number), sigma), DECIMALS),
    steps: [],
    selfScreening: convention === 'core-count' ? coreSentence(electron) : selfScreeningSentence(terms),
    source,
  };
}

/** One term as data; also for the terms of a wrong method. Six electrons of (3s 3p)7 at 0.35 contribute "2.10". */
export const derivationGroup = (term: ScreeningTerm): DerivationGroup => ({
  subshells: term.subshells.map((occupation) => ({ label: subshellLabel(occupation), electrons: occupation.count })),
  electrons: term.electrons,
  counted: term.counted,
  coefficient: figure(term.coefficient, DECIMALS),
  contribution: figure(contributionOf(term), DECIMALS),
  place: term.place,
  isAsked: term.place === 'same',
});

function selfScreeningSentence(terms: readonly ScreeningTerm[]): string | null {
  const own = terms.find(({ place }) => place === 'same');
  if (!own) return null;
  const label = `(${own.subshells.map(subshellLabel).join(' ')})`;
  return own.electrons === 1
    ? `An electron does not screen itself, and this one is alone in ${label}, so its group counts nothing.`
    : `An electron does not screen itself, so ${own.counted} of the ${own.electrons} electrons in ${label} count.`;
}

const coreSentence = ({ n }: Subshell): string =>
  n === 1 ? 'No shell lies below the first, so nothing screens.' : `Only electrons in shells below n = ${n} count; the electron itself is not one of them.`;
