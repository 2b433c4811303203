import { decimal, whole, zero } from '../exact';
import type { Exact } from '../exact';
import { subshellLabel } from '../subshells';
import type { Occupation } from '../subshells';
import { counted, electronText, electronsWhere, isDeeper, isOwn, isShellBelow, ownCoefficient } from './context';
import type { SlipContext } from './context';
import { bySum, changing, withCoefficients } from './method';
import type { Outcome, Slip } from './method';

/** Slips in what the electrons further in count. Each value follows from Slater's rules (Phys. Rev. 36, 57, 1930) with one step changed. */

const below = (context: SlipContext): number => electronsWhere(context, (occupation) => isShellBelow(context, occupation));
const deep = (context: SlipContext): number => electronsWhere(context, (occupation) => isDeeper(context, occupation));
const left = ({ terms }: SlipContext): number => terms.reduce((sum, { place, electrons }) => (place === 'inner' ? sum + electrons : sum), 0);
const isLeft = ({ terms }: SlipContext, { n, l }: Occupation): boolean =>
  terms.some(({ place, subshells }) => place === 'inner' && subshells.some((occupation) => occupation.n === n && occupation.l === l));
const isBelowDf = (context: SlipContext, occupation: Occupation): boolean => isShellBelow(context, occupation) && occupation.l >= 2;
const isBelowSp = (context: SlipContext, occupation: Occupation): boolean => isShellBelow(context, occupation) && occupation.l < 2;

/** For an s or p electron above an occupied shell. */
const aboveShell = (context: SlipContext, outcome: () => Outcome): Outcome | null => (context.kind === 'sp' && below(context) > 0 ? outcome() : null);
/** For an s or p electron above a shell with d or f electrons. */
const aboveD = (context: SlipContext, outcome: () => Outcome): Outcome | null =>
  context.kind === 'sp' && electronsWhere(context, (occupation) => isBelowDf(context, occupation)) > 0 ? outcome() : null;

const screening = (count: number, coefficient: string): string => (count === 1 ? `screens ${coefficient}` : `screen ${coefficient} each`);
const shellBelowRule = (context: SlipContext): string =>
  `For ${electronText(context)} the ${counted(below(context))} of shell ${context.electron.n - 1}, one shell in, ${screening(below(context), '0.85')}.`;
const leftRule = (context: SlipContext): string => `For ${electronText(context)} every electron to the left in Slater’s order screens 1.00.`;
const innerRule = (context: SlipContext): string =>
  context.kind === 'sp' ? `For ${electronText(context)} only the shell one in screens 0.85; every deeper electron screens 1.00.` : leftRule(context);
const allRule = (context: SlipContext): string => {
  if (context.electron.n === 1) return 'Inside 1s an electron screens the other by 0.30.';
  return context.kind === 'sp'
    ? `For ${electronText(context)} the same group screens 0.35 and the shell one in 0.85; only deeper ones screen 1.00.`
    : `For ${electronText(context)} the same group screens 0.35; only electrons further to the left screen 1.00.`;
};
const dfText = (context: SlipContext): string =>
  context.configuration.filter((occupation) => isBelowDf(context, occupation)).map(subshellLabel).join(' and ');
const dfRule = (context: SlipContext): string => `For ${electronText(context)} the ${dfText(context)} electrons are one shell in, so each screens 0.85.`;

export const innerElectronSlips: readonly Slip[] = [
  {
    id: 'all-at-100',
    name: 'everything at 1.00',
    outcome: (context) => changing(context, (occupation) => isOwn(context, occupation) || isLeft(context, occupation), whole(1)),
    rule: allRule,
    leads: () => 'With 1.00 for all of them',
  },
  {
    id: 'shell-below-100',
    name: 'shell n-1 at 1.00',
    outcome: (context) => aboveShell(context, () => changing(context, (occupation) => isShellBelow(context, occupation), whole(1))),
    rule: shellBelowRule,
    leads: () => 'With 1.00',
  },
  {
    id: 'all-inner-085',
    name: 'all inner electrons at 0.85',
    outcome: (context) => (left(context) > 0 ? changing(context, (occupation) => isLeft(context, occupation), decimal('0.85')) : null),
    rule: innerRule,
    leads: () => 'With 0.85 for all of them',
  },
  {
    id: 'shell-below-035',
    name: 'shell n-1 at 0.35',
    outcome: (context) => aboveShell(context, () => changing(context, (occupation) => isShellBelow(context, occupation), decimal('0.35'))),
    rule: shellBelowRule,
    leads: () => 'With 0.35',
  },
  {
    id: 'coefficients-exchanged',
    name: '0.35 and 0.85 exchanged',
    outcome: (context) => aboveShell(context, () => bySum(context, withCoefficients(context, exchanged(context)))),
    rule: (context) => `For ${electronText(context)} the same group screens 0.35 and the shell one in 0.85.`,
    leads: () => 'With the two exchanged',
  },
  {
    id: 'shell-below-left-out',
    name: 'shell n-1 left out',
    outcome: (context) => aboveShell(context, () => changing(context, (occupation) => isShellBelow(context, occupation), zero)),
    rule: shellBelowRule,
    leads: () => 'Without them',
  },
  {
    id: 'deep-core-left-out',
    name: 'deep core left out',
    outcome: (context) => (context.kind === 'sp' && deep(context) > 0 ? changing(context, (occupation) => isDeeper(context, occupation), zero) : null),
    rule: (context) => `For ${electronText(context)} the ${counted(deep(context))} two or more shells in ${screening(deep(context), '1.00')}.`,
    leads: () => 'Without them',
  },
  {
    id: 'next-group-only',
    name: 'n-1 read as the next group only',
    outcome: (context) => aboveD(context, () => changing(context, (occupation) => isBelowSp(context, occupation), whole(1))),
    rule: (context) => `For ${electronText(context)} the whole of shell ${context.electron.n - 1} is one shell in, so its s and p electrons screen 0.85 as well.`,
    leads: () => 'With 1.00 for them',
  },
  {
    id: 'inner-d-at-100',
    name: '(n-1)d at 1.00',
    outcome: (context) => aboveD(context, () => changing(context, (occupation) => isBelowDf(context, occupation), whole(1))),
    rule: dfRule,
    leads: () => 'With 1.00',
  },
  {
    id: 'inner-d-left-out',
    name: '(n-1)d left out',
    outcome: (context) => aboveD(context, () => changing(context, (occupation) => isBelowDf(context, occupation), zero)),
    rule: dfRule,
    leads: () => 'Without them',
  },
  {
    id: 'inner-f-left-out',
    name: '4f electrons left out',
    outcome: (context) => {
      const isAbove4f = ['6s', '6p', '5d'].includes(subshellLabel(context.electron));
      return isAbove4f && electronsWhere(context, is4f) > 0 ? changing(context, is4f, zero) : null;
    },
    rule: (context) => {
      const count = electronsWhere(context, is4f);
      return `For ${electronText(context)} the ${counted(count, '4f electron')} ${screening(count, '1.00')}.`;
    },
    leads: (context) => (electronsWhere(context, is4f) === 1 ? 'With it left out' : 'Without them'),
  },
  {
    id: 'inner-octet-left-out',
    name: 'an inner shell of eight left out',
    outcome: octetLeftOut,
    rule: (context) => `Every shell further in counts, from 1s on; ${octetText(context)} screen as well.`,
    leads: () => 'Without them',
  },
];

const is4f = ({ n, l }: Occupation): boolean => n === 4 && l === 3;

const exchanged = (context: SlipContext) => (occupation: Occupation): Exact => {
  if (isOwn(context, occupation)) return decimal('0.85');
  return isShellBelow(context, occupation) ? ownCoefficient(context) : context.coefficientOf(occupation);
};

/** The shell of eight that is overlooked: shell n-1 where it holds just eight, otherwise 2s and 2p. */
const octetShell = (context: SlipContext): number => (below(context) === 8 ? context.electron.n - 1 : 2);

const octetText = (context: SlipContext): string => {
  const n = octetShell(context);
  return `the 8 of shell ${n}, at ${n === context.electron.n - 1 ? '0.85' : '1.00'} each,`;
};

function octetLeftOut(context: SlipContext): Outcome | null {
  if (context.kind !== 'sp') return null;
  const n = octetShell(context);
  const isOctet = (occupation: Occupation): boolean => occupation.n === n;
  return n < context.electron.n && electronsWhere(context, isOctet) === 8 ? changing(context, isOctet, zero) : null;
}

