import { found, refused } from './result';
import type { Result } from './result';

/** n from 1 to 7; l as the quantum number: 0 s, 1 p, 2 d, 3 f. */
export interface Subshell {
  readonly n: number;
  readonly l: number;
}

export interface Occupation extends Subshell {
  readonly count: number;
}

/** Occupied subshells only, in order of n, then l. */
export type Configuration = readonly Occupation[];

const letters = ['s', 'p', 'd', 'f'] as const;

/** How a subshell is written: subshellLabel({ n: 3, l: 1 }) is "3p". Common practice, no source. */
export const subshellLabel = ({ n, l }: Subshell): string => `${n}${letters[l] ?? ''}`;

/** The most electrons a subshell holds, 2(2l + 1): capacity(2) is 10. Follows from the Pauli principle. */
export const capacity = (l: number): number => 4 * l + 2;

export const isSameSubshell = (a: Subshell, b: Subshell): boolean => a.n === b.n && a.l === b.l;

export const byShellThenLetter = (a: Subshell, b: Subshell): number => a.n - b.n || a.l - b.l;

/** Reads a subshell such as "3p": parseSubshell('3p') is n = 3, l = 1; "2d" is refused, for l is below n. */
export function parseSubshell(text: string): Result<Subshell> {
  const match = /^([1-7])([spdf])$/.exec(text.trim());
  const l = letters.findIndex((letter) => letter === match?.[2]);
  if (!match || l < 0) return refused('electron-not-understood', text.trim() === '' ? 'No electron is named.' : `“${text}” names no subshell from 1s to 7f.`, 0);
  const n = Number(match[1]);
  return l < n ? found({ n, l }) : refused('no-such-subshell', `There is no ${subshellLabel({ n, l })} subshell.`, 0);
}
