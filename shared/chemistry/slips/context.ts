import type { ChemicalElement } from '../elements';
import { decimal, subtract, whole, zero } from '../exact';
import type { Exact } from '../exact';
import { kindOf, screeningTerms, sigmaOf } from '../slater';
import type { GroupKind, ScreeningTerm } from '../slater';
import { isSameSubshell, subshellLabel } from '../subshells';
import type { Configuration, Occupation, Subshell } from '../subshells';
import { speciesText } from '../species';
import type { Target } from '../target';

/** What a wrong method starts from: the species, the asked electron, and the key by Slater's rules. */
export interface SlipContext {
  readonly element: ChemicalElement;
  readonly charge: number;
  readonly configuration: Configuration;
  readonly isTyped: boolean;
  readonly electron: Subshell;
  readonly kind: GroupKind;
  /** The key's terms, sigma and Z_eff. */
  readonly terms: readonly ScreeningTerm[];
  readonly sigma: Exact;
  readonly key: Exact;
  /** The group of the asked electron, itself included. */
  readonly own: ScreeningTerm;
  /** What a subshell's electrons count by the rules; 0 for those further out. */
  readonly coefficientOf: (occupation: Occupation) => Exact;
}

/** The context of an item by Slater's rules (Phys. Rev. 36, 57, 1930). For 3p of chlorine: own group (3s 3p)7, key 61/10. */
export function slipContext({ species, electron }: Target): SlipContext {
  const { element, charge, configuration, isTyped } = species;
  const terms = screeningTerms(configuration, electron, 'slater');
  const own = terms.find(({ place }) => place === 'same');
  if (!own) throw new RangeError(`No ${subshellLabel(electron)} electron.`);
  const sigma = sigmaOf(terms);
  const coefficientOf = (occupation: Occupation): Exact =>
    terms.find(({ subshells }) => subshells.some((other) => isSameSubshell(other, occupation)))?.coefficient ?? zero;
  return { element, charge, configuration, isTyped, electron, kind: kindOf(electron), terms, sigma, key: subtract(whole(element.number), sigma), own, coefficientOf };
}

export const isOwn = ({ electron, kind }: SlipContext, occupation: Subshell): boolean => occupation.n === electron.n && kindOf(occupation) === kind;

export const isShellBelow = ({ electron }: SlipContext, { n }: Subshell): boolean => n === electron.n - 1;

export const isDeeper = ({ electron }: SlipContext, { n }: Subshell): boolean => n < electron.n - 1;

/** Electrons of the subshells that satisfy a condition: those of shell 2 in chlorine are 8. */
export const electronsWhere = ({ configuration }: SlipContext, holds: (occupation: Occupation) => boolean): number =>
  configuration.reduce((sum, occupation) => (holds(occupation) ? sum + occupation.count : sum), 0);

/** What the group itself counts an electron by: 0.30 in 1s, otherwise 0.35. */
export const ownCoefficient = ({ electron }: SlipContext): Exact => decimal(electron.n === 1 ? '0.30' : '0.35');

export const groupText = ({ subshells }: Pick<ScreeningTerm, 'subshells'>): string => `(${subshells.map(subshellLabel).join(' ')})`;

export const electronText = ({ electron }: SlipContext): string => `a ${subshellLabel(electron)} electron`;

export const speciesName = ({ element, charge }: SlipContext): string => speciesText(element.symbol, charge);

export const counted = (count: number, noun = 'electron'): string => `${count} ${count === 1 ? noun : `${noun}s`}`;
