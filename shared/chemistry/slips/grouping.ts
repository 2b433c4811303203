import { decimal, whole, zero } from '../exact';
import type { Exact } from '../exact';
import { subshellLabel } from '../subshells';
import type { Occupation } from '../subshells';
import { electronText, electronsWhere, groupText, isDeeper, isShellBelow } from './context';
import type { SlipContext } from './context';
import { bySum, withCoefficients } from './method';
import type { Outcome, Slip } from './method';

/** Slips in which electrons belong together. Each value follows from Slater's rules (Phys. Rev. 36, 57, 1930) with one step changed. */

const inShell = (context: SlipContext, l: number): number => electronsWhere(context, (occupation) => occupation.n === context.electron.n && occupation.l === l);
const isSpOfShell = ({ electron }: SlipContext, { n, l }: Occupation): boolean => n === electron.n && l < 2;
const isOneFurther = ({ electron }: SlipContext, { n, l }: Occupation): boolean => n === electron.n + 1 && l === 0;
const isOuter = ({ terms }: SlipContext, { n, l }: Occupation): boolean =>
  terms.some(({ place, subshells }) => place === 'outer' && subshells.some((occupation) => occupation.n === n && occupation.l === l));

const outer = (context: SlipContext): number => electronsWhere(context, (occupation) => isOuter(context, occupation));

const summing = (context: SlipContext, coefficientOf: (occupation: Occupation) => Exact): Outcome => bySum(context, withCoefficients(context, coefficientOf));

const spRule = (context: SlipContext, occupation: Occupation): Exact => {
  if (isShellBelow(context, occupation)) return decimal('0.85');
  return isDeeper(context, occupation) ? whole(1) : zero;
};

const furtherOut = ({ electron }: SlipContext): string => subshellLabel({ n: electron.n + 1, l: 0 });
const dOfShell = ({ electron }: SlipContext): string => subshellLabel({ n: electron.n, l: 2 });
const spOfShell = ({ electron }: SlipContext): string => `(${subshellLabel({ n: electron.n, l: 0 })} ${subshellLabel({ n: electron.n, l: 1 })})`;

export const groupingSlips: readonly Slip[] = [
  {
    id: 'sp-rule-on-d',
    name: 's, p rule on a d electron',
    outcome: (context) =>
      context.kind === 'd'
        ? summing(context, (occupation) => (isSpOfShell(context, occupation) ? decimal('0.85') : context.coefficientOf(occupation)))
        : null,
    rule: (context) => `For ${electronText(context)} everything to the left in Slater’s order screens 1.00, ${spOfShell(context)} as well.`,
    leads: (context) => `With 0.85 for ${spOfShell(context)}, which is the rule for s and p electrons,`,
  },
  {
    id: 'd-grouped-with-sp',
    name: 'nd grouped with ns, np',
    outcome: (context) => {
      if (context.kind === 'f' || (context.kind === 'sp' && inShell(context, 2) === 0)) return null;
      const isTogether = ({ n, l }: Occupation): boolean => n === context.electron.n && l <= 2;
      return summing(context, (occupation) => (isTogether(occupation) ? decimal('0.35') : spRule(context, occupation)));
    },
    rule: (context) => `${dOfShell(context)} is a group of its own, apart from ${spOfShell(context)} and to the right of it.`,
    leads: () => 'With all of them as one group',
  },
  {
    id: 'filling-order',
    name: 'filling order read as Slater order',
    outcome: (context) => {
      const isBefore = (occupation: Occupation): boolean => isOneFurther(context, occupation);
      return context.kind === 'd' && electronsWhere(context, isBefore) > 0
        ? summing(context, (occupation) => (isBefore(occupation) ? whole(1) : context.coefficientOf(occupation)))
        : null;
    },
    rule: (context) => `In Slater’s order ${furtherOut(context)} stands to the right of ${groupText(context.own)}, so its electrons do not screen, whatever the order of filling.`,
    leads: () => 'With 1.00 for each of them',
  },
  {
    id: 'outer-at-035',
    name: 'outer electrons at 0.35',
    outcome: (context) =>
      outer(context) > 0 ? summing(context, (occupation) => (isOuter(context, occupation) ? decimal('0.35') : context.coefficientOf(occupation))) : null,
    rule: (context) => `Electrons to the right of ${groupText(context.own)} in Slater’s order do not screen; ${outerCount(outer(context))}.`,
    leads: () => 'With 0.35 for each of them',
  },
  {
    id: 's-and-p-split',
    name: 'ns and np split',
    outcome: (context) => {
      if (context.kind !== 'sp') return null;
      const isS = context.electron.l === 0;
      if (isS && inShell(context, 1) === 0) return null;
      const other = isS ? zero : decimal('0.85');
      return summing(context, (occupation) =>
        isSpOfShell(context, occupation) && occupation.l !== context.electron.l ? other : context.coefficientOf(occupation),
      );
    },
    rule: (context) => `${spOfShell(context)} is one group, in which each other electron screens 0.35.`,
    leads: (context) =>
      context.electron.l === 0
        ? `With the ${subshellLabel({ n: context.electron.n, l: 1 })} electrons left out`
        : `With 0.85 for the ${subshellLabel({ n: context.electron.n, l: 0 })} electrons`,
  },
];

const outerCount = (count: number): string => (count === 1 ? 'there is 1 of them' : `there are ${count} of them`);
