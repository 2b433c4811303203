import { add, decimal, equals, subtract, toDecimals, whole } from '../exact';
import type { Exact } from '../exact';
import { capacity } from '../subshells';
import type { Occupation } from '../subshells';
import { counted, groupText, isOwn, ownCoefficient, speciesName } from './context';
import type { SlipContext } from './context';
import { bySum, changing, countingOwn, productText, withCoefficients } from './method';
import type { Slip } from './method';

/** Slips in the group of the asked electron. Each value follows from Slater's rules (Phys. Rev. 36, 57, 1930) with one step changed. */

const coefficientText = (context: SlipContext): string => toDecimals(ownCoefficient(context), 2);

const sameGroupRule = (context: SlipContext): string =>
  `In ${groupText(context.own)} each other electron screens ${coefficientText(context)}.`;

/** "of the 7 in (3s 3p), 6 screen" */
const thoseThatScreen = ({ own }: SlipContext): string => {
  if (own.electrons === 1) return `in ${groupText(own)} there is no other`;
  return `of the ${own.electrons} in ${groupText(own)}, ${own.counted} ${own.counted === 1 ? 'screens' : 'screen'}`;
};

const room = ({ own, electron }: SlipContext): number => {
  if (own.kind !== 'sp') return capacity(electron.l) - own.electrons;
  return (electron.n === 1 ? 2 : 8) - own.electrons;
};

/** Whether the shell of the asked electron is being filled at the end of a neutral atom of the p block. */
const isOuterPBlock = ({ element, charge, isTyped, kind, electron }: SlipContext): boolean =>
  element.block === 'p' && charge === 0 && !isTyped && kind === 'sp' && electron.n === element.period;

export const ownGroupSlips: readonly Slip[] = [
  {
    id: 'counts-itself',
    name: 'counts the electron itself',
    outcome: (context) => countingOwn(context, context.own.electrons),
    rule: (context) => `An electron does not screen itself: ${thoseThatScreen(context)}.`,
    leads: (context) => `With ${productText(context.own.electrons, ownCoefficient(context))}`,
  },
  {
    id: 'one-electron-too-many',
    name: 'one electron too many (the ion’s configuration)',
    outcome: (context) => (context.charge === 0 && room(context) > 0 ? countingOwn(context, context.own.counted + 1) : null),
    rule: (context) => `The neutral atom ${speciesName(context)} has ${counted(context.own.electrons)} in ${groupText(context.own)}.`,
    leads: (context) => `With ${context.own.electrons + 1} there, as in the ion with one electron more,`,
  },
  {
    id: 'same-group-035-in-1s',
    name: '0.35 inside 1s',
    outcome: (context) => (context.electron.n === 1 ? changing(context, (occupation) => isOwn(context, occupation), decimal('0.35')) : null),
    rule: () => 'Inside 1s an electron screens the other by 0.30; 0.35 belongs to the other groups.',
    leads: () => 'With 0.35',
  },
  {
    id: 'same-group-030',
    name: '0.30 in every group',
    outcome: (context) => (context.electron.n > 1 ? changing(context, (occupation) => isOwn(context, occupation), decimal('0.30')) : null),
    rule: (context) => `${sameGroupRule(context)} 0.30 belongs to 1s alone.`,
    leads: () => 'With 0.30',
  },
  {
    id: 'same-group-ignored',
    name: 'same group ignored',
    outcome: (context) => countingOwn(context, 0),
    rule: sameGroupRule,
    leads: () => 'Without them',
  },
  {
    id: 'same-group-085',
    name: '0.85 for the same group',
    outcome: (context) => changing(context, (occupation) => isOwn(context, occupation), decimal('0.85')),
    rule: sameGroupRule,
    leads: () => 'With 0.85',
  },
  {
    id: 'period-as-count',
    name: 'period number as the same-group count',
    outcome: (context) => (context.kind === 'sp' && context.electron.n > 1 ? countingOwn(context, context.element.period - 1) : null),
    rule: (context) => `The same group counts by its electrons: ${thoseThatScreen(context)}.`,
    leads: (context) => `With the period, ${context.element.period}, as the number in the group`,
  },
  {
    id: 'group-number-as-count',
    name: '18-column group number as the count',
    outcome: (context) => (isOuterPBlock(context) ? countingOwn(context, context.own.counted + 10) : null),
    rule: (context) => `The same group counts by its electrons: ${thoseThatScreen(context)}.`,
    leads: (context) => `With the group number, ${context.element.group ?? ''}, as the number in the shell`,
  },
  {
    id: 'bracket-slip',
    name: 'bracket slip',
    outcome: (context) => {
      const sigma = subtract(add(context.sigma, ownCoefficient(context)), whole(1));
      const { electrons, counted: others } = context.own;
      const differs = `${productText(electrons, ownCoefficient(context))} − 1 where the key has ${productText(others, ownCoefficient(context))}`;
      return { terms: null, nuclear: context.element.number, sigma, zeff: subtract(whole(context.element.number), sigma), differs };
    },
    rule: (context) => `The electron itself is taken off before multiplying: (${context.own.electrons} − 1) × ${coefficientText(context)}.`,
    leads: (context) => `With ${productText(context.own.electrons, ownCoefficient(context))} − 1`,
  },
  {
    id: 'coefficients-rounded',
    name: 'coefficients rounded first',
    outcome: (context) => {
      if (context.electron.n === 1) return null;
      const rounded = (occupation: Occupation): Exact => {
        if (isOwn(context, occupation)) return decimal('0.4');
        const coefficient = context.coefficientOf(occupation);
        return equals(coefficient, decimal('0.85')) ? decimal('0.9') : coefficient;
      };
      return bySum(context, withCoefficients(context, rounded));
    },
    rule: (context) => (context.kind === 'sp' ? 'The coefficients are 0.35 and 0.85, and only a result is rounded.' : 'The coefficient is 0.35, and only a result is rounded.'),
    leads: (context) => (context.kind === 'sp' ? 'With 0.4 and 0.9' : 'With 0.4'),
  },
];
