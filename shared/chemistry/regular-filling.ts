import { byShellThenLetter, capacity } from './subshells';
import type { Configuration, Subshell } from './subshells';

/** Subshells by n + l, then n: 1s 2s 2p 3s 3p 4s 3d and on, to 7p. */
const fillingOrder: readonly Subshell[] = [1, 2, 3, 4, 5, 6, 7]
  .flatMap((n) => [0, 1, 2, 3].filter((l) => l < n).map((l) => ({ n, l })))
  .sort((a, b) => a.n + a.l - b.n - b.l || a.n - b.n)
  .slice(0, 19);

/**
 * The configuration that filling by n + l gives, without the exceptions. Source: E. Madelung's rule, from memory.
 * regularFilling(24) ends in 3d4 4s2, where chromium is 3d5 4s1.
 */
export function regularFilling(electrons: number): Configuration {
  let left = electrons;
  return fillingOrder
    .flatMap((subshell) => {
      const count = Math.min(left, capacity(subshell.l));
      left -= count;
      return count > 0 ? [{ ...subshell, count }] : [];
    })
    .sort(byShellThenLetter);
}
