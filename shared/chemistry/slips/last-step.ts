import { add, decimal, negate, subtract, toDecimals, whole, zero } from '../exact';
import type { Exact } from '../exact';
import { contributionOf } from '../slater';
import { counted, electronText, electronsWhere, speciesName } from './context';
import type { SlipContext } from './context';
import { byLastStep, bySum, fromNuclear, withCoefficients } from './method';
import type { Slip } from './method';

/** Slips in what is taken from what. The key is by Slater's rules (Phys. Rev. 36, 57, 1930). */

const two = (value: Exact): string => toDecimals(value, 2).replace('-', '−');
const subtraction = ({ element, sigma }: SlipContext): string => `${element.number} − ${two(sigma)}`;
const definition = (context: SlipContext): string => `Z_eff is what is left of Z after the screening: ${subtraction(context)}.`;
const rulesApply = (): string => 'By Slater’s rules each electron screens by its coefficient, not all alike.';

/** The relative atomic mass, rounded to a whole number. */
const massNumber = ({ element }: SlipContext): number => Number(toDecimals(decimal(element.atomicMass), 0));

const others = (context: SlipContext): number => context.element.number - context.charge - 1;

const coreElectrons = (context: SlipContext): number => electronsWhere(context, ({ n }) => n < context.electron.n);

export const lastStepSlips: readonly Slip[] = [
  {
    id: 'core-electrons-only',
    name: 'Z minus the core electrons',
    outcome: (context) => bySum(context, withCoefficients(context, ({ n }) => (n < context.electron.n ? whole(1) : zero))),
    rule: rulesApply,
    leads: (context) => `With ${counted(coreElectrons(context), 'core electron')} at 1.00 and nothing else`,
  },
  {
    id: 'all-other-electrons',
    name: 'Z minus all other electrons',
    outcome: (context) => bySum(context, withCoefficients(context, () => whole(1))),
    rule: rulesApply,
    leads: (context) => `With 1.00 for ${counted(others(context), 'other electron')}`,
  },
  {
    id: 'charge-of-species',
    name: 'charge of the species',
    outcome: (context) => byLastStep(context, whole(context.charge), null, `the charge, ${String(context.charge).replace('-', '−')}`),
    rule: (context) => `Z_eff is the charge that ${electronText(context)} meets inside ${speciesName(context)}: ${subtraction(context)}.`,
    leads: () => 'Taken as the charge of the whole species',
  },
  {
    id: 'sigma-for-zeff',
    name: 'sigma instead of Z_eff',
    outcome: (context) => byLastStep(context, context.sigma, null, `${two(context.sigma)}, not taken from ${context.element.number}`),
    rule: definition,
    leads: () => 'With the screening itself',
  },
  {
    id: 'zeff-for-sigma',
    name: 'Z_eff instead of sigma',
    outcome: (context) => ({ ...byLastStep(context, context.key, context.key, `${subtraction(context)}`), zeff: null }),
    rule: () => 'The screening constant is the sum of the contributions, before it is taken from Z.',
    leads: () => 'Taken from Z',
  },
  {
    id: 'sign-reversed',
    name: 'sign reversed',
    outcome: (context) => byLastStep(context, negate(context.key), negate(context.sigma), 'the sign'),
    rule: (context) => `The screening counts as positive and is taken from Z: ${subtraction(context)}.`,
    leads: () => 'The other way round',
  },
  {
    id: 'no-shielding',
    name: 'no shielding',
    outcome: (context) => byLastStep(context, whole(context.element.number), null, `nothing taken from ${context.element.number}`),
    rule: definition,
    leads: () => 'Without the screening',
  },
  {
    id: 'mass-number',
    name: 'mass number used for Z',
    outcome: (context) => fromNuclear(context, massNumber(context)),
    rule: (context) => `Z is the atomic number, ${context.element.number}; the mass number plays no part.`,
    leads: (context) => `With ${massNumber(context)} in its place`,
  },
  {
    id: 'missing-bracket',
    name: 'missing bracket',
    outcome: (context) => {
      const own = contributionOf(context.own);
      const inner = subtract(context.sigma, own);
      const differs = `${context.element.number} − ${two(own)} + ${two(inner)}`;
      return byLastStep(context, add(subtract(whole(context.element.number), own), inner), null, differs);
    },
    rule: (context) => `The whole sum is taken from Z: ${subtraction(context)}.`,
    leads: (context) => `With only the first term taken off and ${two(subtract(context.sigma, contributionOf(context.own)))} added`,
  },
];
