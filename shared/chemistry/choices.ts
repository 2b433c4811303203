import { compare } from './exact';
import type { Exact } from './exact';
import { found, refused } from './result';
import type { Result } from './result';
import type { ElectronAsked } from './target';
import { work } from './work';
import type { Worked } from './work';

/** Which has the greatest (least) value, or all of them in order. */
export type ChoiceKind = 'greatest' | 'least' | 'increasing' | 'decreasing';

export interface ChoiceAsked {
  readonly kind: ChoiceKind;
  readonly quantity: string;
  readonly convention: string;
  /** Two to nine, numbered from 1 as printed. */
  readonly options: readonly ElectronAsked[];
}

export interface WorkedChoice {
  /** The numbers as typed: `3`, or `3 1 2`. */
  readonly answer: string;
  /** One for each option, in printed order. */
  readonly worked: readonly Worked[];
}

const MOST = 9;

/**
 * The key of a choice or an order, by the same computation as a number. Rules: see work.
 * Of O 2p, F 2p and N 2p, numbered so, the increasing order of Z_eff by Slater's rules is "3 1 2".
 */
export function workChoice({ kind, quantity, convention, options }: ChoiceAsked): Result<WorkedChoice> {
  if (options.length < 2 || options.length > MOST) return refused('incomplete', `A choice has two to ${MOST} options.`);
  const worked: Worked[] = [];
  for (const [index, option] of options.entries()) {
    const result = work({ ...option, quantity, convention });
    if (!result.ok) return refused(result.problem.code, `Option ${index + 1}: ${result.problem.message}`);
    worked.push(result.value);
  }
  const sorted = worked.map(({ value }, index) => ({ value, number: index + 1 })).sort((a, b) => compare(a.value, b.value));
  const ordered = kind === 'greatest' || kind === 'decreasing' ? sorted.reverse() : sorted;
  const isOrder = kind === 'increasing' || kind === 'decreasing';
  const tie = firstTie(isOrder ? ordered : ordered.slice(0, 2));
  if (tie) return refused('incomplete', `Options ${tie} have the same value, so there is no one answer.`);
  return found({ answer: (isOrder ? ordered : ordered.slice(0, 1)).map(({ number }) => number).join(' '), worked });
}

function firstTie(ordered: readonly { readonly value: Exact; readonly number: number }[]): string | null {
  for (const [index, { value, number }] of ordered.entries()) {
    const next = ordered[index + 1];
    if (next && compare(value, next.value) === 0) return [number, next.number].sort().join(' and ');
  }
  return null;
}
