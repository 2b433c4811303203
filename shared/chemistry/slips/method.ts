import { compare, equals, subtract, toDecimals, whole, zero } from '../exact';
import type { Exact } from '../exact';
import { kindOf, sigmaOf } from '../slater';
import type { ScreeningTerm } from '../slater';
import { isSameSubshell, subshellLabel } from '../subshells';
import type { Occupation } from '../subshells';
import type { SlipContext } from './context';

/** What a wrong method comes to. */
export interface Outcome {
  /** The wrong sum, term by term; null where the method is no sum. */
  readonly terms: readonly ScreeningTerm[] | null;
  /** What stands in the place of Z. */
  readonly nuclear: number;
  /** The wrong screening constant; null where the method leaves it right or has none. */
  readonly sigma: Exact | null;
  /** The wrong effective charge; null where the slip is one of asking for sigma. */
  readonly zeff: Exact | null;
  /** What differs from the key, where comparing the terms does not say it. */
  readonly differs?: string;
}

export interface Slip {
  /** Stored with a share of the marks: never renamed. */
  readonly id: string;
  /** As the lead and the reader see it. */
  readonly name: string;
  /** What the wrong method comes to; null where it has no occasion. */
  readonly outcome: (context: SlipContext) => Outcome | null;
  /** The rule that the key follows, for the candidate: a sentence. */
  readonly rule: (context: SlipContext) => string;
  /** What leads to the other value, as the beginning of a sentence: "With 7 × 0.35". */
  readonly leads: (context: SlipContext, outcome: Outcome) => string;
}

/** A sum that came out otherwise, taken from Z. */
export function bySum(context: SlipContext, terms: readonly ScreeningTerm[]): Outcome {
  const sigma = sigmaOf(terms);
  const nuclear = context.element.number;
  return { terms, nuclear, sigma, zeff: subtract(whole(nuclear), sigma) };
}

/** The key's sum, but something else done with it. */
export const byLastStep = (context: SlipContext, zeff: Exact, sigma: Exact | null, differs: string): Outcome => ({
  terms: null,
  nuclear: context.element.number,
  sigma,
  zeff,
  differs,
});

/** The key's sum taken from something that is not Z. */
export const fromNuclear = (context: SlipContext, nuclear: number): Outcome => ({
  terms: context.terms,
  nuclear,
  sigma: null,
  zeff: subtract(whole(nuclear), context.sigma),
  differs: `${nuclear} in place of ${context.element.number}`,
});

/**
 * The electrons of every group with coefficients of our choosing; a group whose electrons no longer count alike is split.
 * The asked electron is left out of its part.
 */
export function withCoefficients(context: SlipContext, coefficientOf: (occupation: Occupation) => Exact): readonly ScreeningTerm[] {
  return context.terms.flatMap((term) => {
    const parts: ScreeningTerm[] = [];
    for (const occupation of term.subshells) {
      const coefficient = coefficientOf(occupation);
      const last = parts.at(-1);
      if (last && equals(last.coefficient, coefficient)) {
        parts[parts.length - 1] = { ...last, subshells: [...last.subshells, occupation], electrons: last.electrons + occupation.count };
      } else {
        parts.push({ ...term, subshells: [occupation], electrons: occupation.count, coefficient });
      }
    }
    return parts.map((part) => ({ ...part, counted: part.electrons - (holdsAsked(context, part) ? 1 : 0) }));
  });
}

const holdsAsked = ({ electron }: SlipContext, { subshells }: ScreeningTerm): boolean => subshells.some((occupation) => isSameSubshell(occupation, electron));

/** The rules with another coefficient for some of the electrons. */
export const changing = (context: SlipContext, holds: (occupation: Occupation) => boolean, coefficient: Exact): Outcome =>
  bySum(context, withCoefficients(context, (occupation) => (holds(occupation) ? coefficient : context.coefficientOf(occupation))));

/** The key's sum with another count for the own group. */
export const countingOwn = (context: SlipContext, count: number): Outcome =>
  bySum(context, context.terms.map((term) => (term.place === 'same' ? { ...term, counted: count } : term)));

/** How a count and its coefficient are written: "7 × 0.35". */
export const productText = (count: number, coefficient: Exact): string => `${count} × ${toDecimals(coefficient, 2)}`;

/** What a wrong sum has where the key has something else: "7 × 0.35 where the key has 6 × 0.35". */
export function differenceText(wrong: readonly ScreeningTerm[], key: readonly ScreeningTerm[]): string {
  const theirs = atoms(wrong);
  const ours = atoms(key);
  const onlyIn = (these: readonly Atom[], others: readonly Atom[]): string =>
    sumText(these.filter((atom) => !others.some((other) => other.label === atom.label && other.count === atom.count && equals(other.coefficient, atom.coefficient))));
  const extra = onlyIn(theirs, ours);
  const missing = onlyIn(ours, theirs);
  if (extra === '' && missing === '') return 'the same sum as the key';
  if (missing === '') return `${extra} more than the key`;
  return `${extra === '' ? 'nothing' : extra} where the key has ${missing}`;
}

interface Atom {
  readonly label: string;
  readonly count: number;
  readonly coefficient: Exact;
}

/** Terms that contribute, named by the group they belong to. */
const atoms = (terms: readonly ScreeningTerm[]): readonly Atom[] =>
  terms
    .filter(({ counted, coefficient }) => counted > 0 && compare(coefficient, zero) > 0)
    .map(({ n, kind, subshells, counted, coefficient }) => ({ label: subshells.length > 1 ? `${n}${kind}` : subshells.map(labelOf).join(''), count: counted, coefficient }));

const labelOf = (occupation: Occupation): string => (kindOf(occupation) === 'sp' ? `${occupation.n}sp` : subshellLabel(occupation));

function sumText(parts: readonly Atom[]): string {
  const merged: Atom[] = [];
  for (const atom of parts) {
    const at = merged.findIndex(({ coefficient }) => equals(coefficient, atom.coefficient));
    const same = merged[at];
    if (same) merged[at] = { ...same, count: same.count + atom.count };
    else merged.push(atom);
  }
  return merged.map(({ count, coefficient }) => productText(count, coefficient)).join(' + ');
}
