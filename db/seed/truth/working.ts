import { add, compare, decimal, equals, exactDecimals, multiply, subtract, toDecimals, whole, zero } from '../../../shared/chemistry/exact';
import type { Exact } from '../../../shared/chemistry/exact';

/** So many electrons, each screening by so much: 8 at 0.85. */
export interface Term {
  readonly count: number;
  readonly factor: string;
}

/** How a candidate sets out a sum: term by term, in one sum, only the last step, or not at all. */
export const workingStyles = ['terms', 'sum', 'last-step', 'none'] as const;
export type WorkingStyle = (typeof workingStyles)[number];

export interface Sum {
  readonly quantity: 'zeff' | 'sigma';
  /** The atomic number. */
  readonly nuclear: number;
  readonly terms: readonly Term[];
}

/** The lines of the paper: four fit. */
const LINES = 4;

const product = ({ count, factor }: Term): Exact => multiply(whole(count), decimal(factor));

export const totalOf = (terms: readonly Term[]): Exact => terms.reduce((sum, term) => add(sum, product(term)), zero);

/** What the sum comes to: 17 less 6 at 0.35, 8 at 0.85 and 2 at 1 is 61/10. */
export const resultOf = ({ quantity, nuclear, terms }: Sum): Exact =>
  quantity === 'sigma' ? totalOf(terms) : subtract(whole(nuclear), totalOf(terms));

/** As one writes in passing: 6.80 is 6.8, and 2.00 is 2. */
const brief = (value: Exact): string => toDecimals(value, exactDecimals(value) ?? 2);

/** The working of a sum as lines of handwriting, the answer `text` at its end when the candidate writes it there. */
export function workingLines(sum: Sum, style: WorkingStyle, text: string, showsResult: boolean): readonly string[] {
  const terms = sum.terms.filter((term) => term.count > 0);
  const fitted = style === 'terms' && terms.length >= LINES ? 'sum' : style;
  const total = brief(totalOf(terms));
  const lastStep = sum.quantity === 'sigma' ? [] : [`${sum.nuclear} - ${total}${showsResult ? ` = ${text}` : ''}`];
  switch (fitted) {
    case 'none':
      return [];
    case 'last-step':
      return sum.quantity === 'sigma' ? [terms.map(factored).join(' + ')] : lastStep;
    case 'terms': {
      const lines = terms.map((term) => `${term.count} x ${term.factor} = ${brief(product(term))}`);
      return sum.quantity === 'sigma' && terms.length > 1
        ? [...lines, `${terms.map((term) => brief(product(term))).join(' + ')}${showsResult ? ` = ${text}` : ''}`]
        : [...lines, ...lastStep];
    }
    case 'sum': {
      if (terms.length < 2) return [`${terms.map(factored).join('')} = ${total}`, ...lastStep];
      return [terms.map(factored).join(' + '), `= ${terms.map((term) => brief(product(term))).join(' + ')} = ${total}`, ...lastStep];
    }
  }
}

const factored = ({ count, factor }: Term): string => (factor === '1' ? String(count) : `${count}x${factor}`);

/** Whether the terms lead to the value that was written, so that working may be shown with it. */
export const leadsTo = (sum: Sum, value: Exact): boolean => equals(resultOf(sum), value);

/** The last step that leads to a value of Z_eff when nothing is known of the rest; none where no screening would. */
export function lastStepTo(nuclear: number, value: Exact): readonly string[] {
  const screening = subtract(whole(nuclear), value);
  if (compare(screening, zero) <= 0 || compare(value, zero) <= 0) return [];
  return [`${nuclear} - ${brief(screening)}`];
}
