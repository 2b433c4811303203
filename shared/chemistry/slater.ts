import { add, decimal, multiply, whole, zero } from './exact';
import type { Exact } from './exact';
import type { Configuration, Occupation, Subshell } from './subshells';

/** ns and np are one group; nd and nf each stand alone (Slater 1930). */
export type GroupKind = 'sp' | 'd' | 'f';

export interface SlaterGroup {
  readonly n: number;
  readonly kind: GroupKind;
  readonly subshells: readonly Occupation[];
  readonly electrons: number;
}

export const kindOf = ({ l }: Subshell): GroupKind => (l === 3 ? 'f' : l === 2 ? 'd' : 'sp');

/**
 * The occupied groups in Slater's order, (1s)(2s 2p)(3s 3p)(3d)(4s 4p)(4d)(4f)(5s 5p) and on.
 * Source: J. C. Slater, Phys. Rev. 36, 57 (1930). Iron has (1s)2 (2s 2p)8 (3s 3p)8 (3d)6 (4s 4p)2.
 */
export function slaterGroups(configuration: Configuration): readonly SlaterGroup[] {
  const groups = new Map<string, SlaterGroup>();
  for (const occupation of configuration) {
    const kind = kindOf(occupation);
    const name = `${occupation.n}${kind}`;
    const group = groups.get(name) ?? { n: occupation.n, kind, subshells: [], electrons: 0 };
    groups.set(name, { ...group, subshells: [...group.subshells, occupation], electrons: group.electrons + occupation.count });
  }
  return [...groups.values()].sort((a, b) => a.n - b.n || kindOrder[a.kind] - kindOrder[b.kind]);
}

const kindOrder: Readonly<Record<GroupKind, number>> = { sp: 0, d: 1, f: 2 };

/** Where electrons stand as seen from the asked one: further left, in its own group, or further right in Slater's order. */
export type Place = 'inner' | 'same' | 'outer';

/** Electrons that screen alike: a group, or the part of a group that has its own coefficient. */
export interface ScreeningTerm {
  readonly n: number;
  readonly kind: GroupKind;
  readonly subshells: readonly Occupation[];
  readonly electrons: number;
  /** Those that screen: all of them, but for the asked electron, which does not screen itself. */
  readonly counted: number;
  readonly coefficient: Exact;
  readonly place: Place;
}

/** The conventions that are a count of electrons, each with a coefficient. */
export type CountingConvention = 'slater' | 'slater-035-in-1s' | 'slater-d-at-1' | 'core-count';

const none = zero;
const one = whole(1);
const sameGroup = decimal('0.35');
const sameInFirst = decimal('0.30');
const oneShellIn = decimal('0.85');

function coefficientOf(convention: CountingConvention, electron: Subshell, group: SlaterGroup, place: Place): Exact {
  if (convention === 'core-count') return group.n < electron.n ? one : none;
  if (place === 'outer') return none;
  if (place === 'same') return electron.n === 1 && convention !== 'slater-035-in-1s' ? sameInFirst : sameGroup;
  if (electron.l >= 2 || group.n < electron.n - 1) return one;
  return convention === 'slater-d-at-1' && group.kind !== 'sp' ? one : oneShellIn;
}

/**
 * Each group with its coefficient, as one electron meets it. Source: J. C. Slater, Phys. Rev. 36, 57 (1930); the variants and the
 * core count are common practice in teaching, no source. For 3p of chlorine: 2 at 1.00, 8 at 0.85, 6 at 0.35.
 */
export function screeningTerms(configuration: Configuration, electron: Subshell, convention: CountingConvention): readonly ScreeningTerm[] {
  const groups = slaterGroups(configuration);
  const own = groups.findIndex((group) => group.n === electron.n && group.kind === kindOf(electron));
  return groups.map((group, index) => {
    const place: Place = index < own ? 'inner' : index > own ? 'outer' : 'same';
    return {
      ...group,
      counted: place === 'same' ? group.electrons - 1 : group.electrons,
      coefficient: coefficientOf(convention, electron, group, place),
      place,
    };
  });
}

export const contributionOf = ({ counted, coefficient }: Pick<ScreeningTerm, 'counted' | 'coefficient'>): Exact => multiply(whole(counted), coefficient);

/** The screening constant, in elementary charges: the sum over the terms. Slater 1930; for 3p of chlorine 10.90. */
export const sigmaOf = (terms: readonly ScreeningTerm[]): Exact => terms.reduce((sum, term) => add(sum, contributionOf(term)), zero);
