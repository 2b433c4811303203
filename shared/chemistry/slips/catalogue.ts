import { groupingSlips } from './grouping';
import { innerElectronSlips } from './inner-electrons';
import { lastStepSlips } from './last-step';
import type { Slip } from './method';
import { otherSpeciesSlips } from './other-species';
import { ownGroupSlips } from './own-group';

/** The commonest first, a judgement of ours, no source. What is not named comes after, by kind. */
const commonest: readonly string[] = [
  'counts-itself',
  'one-electron-too-many',
  'shell-below-100',
  'inner-d-at-100',
  'core-electrons-only',
  'neutral-atom-electrons',
  'filling-order',
  'sp-rule-on-d',
  'same-group-035-in-1s',
  'all-inner-085',
  'next-group-only',
  'same-group-ignored',
  'd-removed-before-s',
  'exception-ignored',
  'sigma-for-zeff',
  's-and-p-split',
  'coefficients-exchanged',
  'outer-at-035',
  'd-grouped-with-sp',
  'same-group-085',
  'inner-d-left-out',
  'nuclear-charge-changed',
  'charge-sign-reversed',
  'all-at-100',
];

const rank = ({ id }: Slip): number => (commonest.includes(id) ? commonest.indexOf(id) : commonest.length);

/** Every wrong method that leads to a value of its own, the commonest first. Our list, from common practice in marking; no source. */
export const slipCatalogue: readonly Slip[] = [...ownGroupSlips, ...innerElectronSlips, ...groupingSlips, ...lastStepSlips, ...otherSpeciesSlips].sort(
  (a, b) => rank(a) - rank(b),
);

/** The slip a scheme gives a share to: slipById('counts-itself') is "counts the electron itself". */
export const slipById = (id: string): Slip | null => slipCatalogue.find((slip) => slip.id === id) ?? null;
