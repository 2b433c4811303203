import { cationOf, countIn, groundConfiguration, outermost, speciesOf, withElectrons } from '../configurations';
import { elementByNumber } from '../elements';
import { add, subtract, whole } from '../exact';
import { regularFilling } from '../regular-filling';
import { screeningTerms, sigmaOf, slaterGroups } from '../slater';
import { speciesText } from '../species';
import { subshellLabel } from '../subshells';
import type { Configuration, Occupation } from '../subshells';
import { formatConfiguration } from '../typed-configuration';
import { electronText, groupText, speciesName } from './context';
import type { SlipContext } from './context';
import { bySum, byLastStep, fromNuclear } from './method';
import type { Outcome, Slip } from './method';

/**
 * Slips in the configuration, the charge, and values of a neighbour. Each value follows from Slater's rules
 * (Phys. Rev. 36, 57, 1930) on what was mistaken for the species or the electron.
 */

/** The rules on another configuration; null where the asked electron is not in it, or where it is no other. */
function onConfiguration(context: SlipContext, other: Configuration | null): Outcome | null {
  if (!other || countIn(other, context.electron) === 0) return null;
  if (formatConfiguration(other) === formatConfiguration(context.configuration)) return null;
  return bySum(context, screeningTerms(other, context.electron, 'slater'));
}

const ion = (context: SlipContext): boolean => context.charge !== 0;
const chargeSize = ({ charge }: SlipContext): string => String(Math.abs(charge));
const electronsOfIon = (context: SlipContext): string =>
  `${speciesName(context)} has ${context.element.number - context.charge} electrons, ${chargeSize(context)} ${context.charge > 0 ? 'fewer' : 'more'} than the atom.`;
const nuclearRule = (context: SlipContext): string => `A charge changes the number of electrons, never Z, which stays ${context.element.number}.`;

function reversedCharge({ element, charge }: SlipContext): Configuration | null {
  if (charge < 0) {
    const cation = cationOf(element, groundConfiguration(element), -charge);
    return cation.ok && element.number + charge > 0 ? cation.value : null;
  }
  const isoelectronic = elementByNumber(element.number + charge);
  return isoelectronic.ok ? groundConfiguration(isoelectronic.value) : null;
}

/** Electrons taken from np, then (n-1)d, and only then ns. */
function dBeforeS({ element, charge }: SlipContext): Configuration | null {
  const n = element.period;
  let left = groundConfiguration(element);
  if (charge <= 0 || countIn(left, { n: n - 1, l: 2 }) === 0 || countIn(left, { n, l: 0 }) === 0) return null;
  const order = [{ n, l: 1 }, { n: n - 1, l: 2 }, { n, l: 0 }];
  for (let removed = 0; removed < charge; removed += 1) {
    const next = order.find((subshell) => countIn(left, subshell) > 0) ?? outermost(left);
    if (!next) return null;
    left = withElectrons(left, next, -1);
  }
  return left;
}

function withoutExceptions({ element, charge, isTyped }: SlipContext): Configuration | null {
  if (isTyped) return null;
  if (charge <= 0) return regularFilling(element.number - charge);
  const cation = cationOf(element, regularFilling(element.number), charge);
  return cation.ok ? cation.value : null;
}

const groupsOf = ({ configuration }: SlipContext): readonly (readonly Occupation[])[] => slaterGroups(configuration).map(({ subshells }) => subshells);

/** The group `step` places further right (or left) in Slater's order. */
function neighbouringGroup(context: SlipContext, step: number): readonly Occupation[] | null {
  const at = context.terms.findIndex(({ place }) => place === 'same');
  return groupsOf(context)[at + step] ?? null;
}

function onNeighbouringGroup(context: SlipContext, step: number): Outcome | null {
  const [electron] = neighbouringGroup(context, step) ?? [];
  return electron ? bySum(context, screeningTerms(context.configuration, electron, 'slater')) : null;
}

const groupName = (context: SlipContext, step: number): string => groupText({ subshells: neighbouringGroup(context, step) ?? [] });

function onNeighbouringElement(context: SlipContext, step: number): Outcome | null {
  const neighbour = elementByNumber(context.element.number + step);
  if (!neighbour.ok || context.isTyped) return null;
  const species = speciesOf({ symbol: neighbour.value.symbol, charge: context.charge });
  if (!species.ok || countIn(species.value.configuration, context.electron) === 0) return null;
  const terms = screeningTerms(species.value.configuration, context.electron, 'slater');
  const sigma = sigmaOf(terms);
  const nuclear = neighbour.value.number;
  return { terms, nuclear, sigma, zeff: subtract(whole(nuclear), sigma), differs: `${speciesText(neighbour.value.symbol, context.charge)} in place of ${speciesName(context)}` };
}

const neighbourName = (context: SlipContext, step: number): string => {
  const neighbour = elementByNumber(context.element.number + step);
  return neighbour.ok ? speciesText(neighbour.value.symbol, context.charge) : '';
};

const groupSlip = (id: string, step: number): Slip => ({
  id,
  name: 'value of the neighbouring group',
  outcome: (context) => onNeighbouringGroup(context, step),
  rule: (context) => `Asked is ${electronText(context)}, in ${groupText(context.own)}.`,
  leads: (context) => `For ${groupName(context, step)}`,
});

const elementSlip = (id: string, step: number): Slip => ({
  id,
  name: 'neighbouring element',
  outcome: (context) => onNeighbouringElement(context, step),
  rule: (context) => `Asked is ${speciesName(context)}, Z = ${context.element.number}.`,
  leads: (context) => `For ${neighbourName(context, step)}`,
});

export const otherSpeciesSlips: readonly Slip[] = [
  {
    id: 'neutral-atom-electrons',
    name: 'neutral-atom electrons for an ion',
    outcome: (context) => (ion(context) ? onConfiguration(context, groundConfiguration(context.element)) : null),
    rule: electronsOfIon,
    leads: () => 'With the electrons of the neutral atom',
  },
  {
    id: 'nuclear-charge-changed',
    name: 'Z changed with the charge',
    outcome: (context) => (ion(context) ? fromNuclear(context, context.element.number - context.charge) : null),
    rule: nuclearRule,
    leads: (context) => `With ${context.element.number - context.charge} for Z`,
  },
  {
    id: 'charge-sign-reversed',
    name: 'charge sign reversed',
    outcome: (context) => (ion(context) ? onConfiguration(context, reversedCharge(context)) : null),
    rule: electronsOfIon,
    leads: (context) => `With ${context.element.number + context.charge} electrons`,
  },
  {
    id: 'charge-added',
    name: 'charge added at the end',
    outcome: (context) => {
      if (!ion(context)) return null;
      const sign = context.charge > 0 ? '+' : '−';
      return byLastStep(context, add(context.key, whole(context.charge)), null, `${sign} ${chargeSize(context)} at the end`);
    },
    rule: (context) => `${nuclearRule(context)} Nothing is added after Z − σ.`,
    leads: (context) => `With the charge, ${context.charge > 0 ? '+' : '−'}${chargeSize(context)}, added`,
  },
  {
    id: 'd-removed-before-s',
    name: 'd removed before s',
    outcome: (context) => onConfiguration(context, dBeforeS(context)),
    rule: (context) => `A cation loses the electrons of highest n first, so ${subshellLabel({ n: context.element.period, l: 0 })} goes before ${subshellLabel({ n: context.element.period - 1, l: 2 })}.`,
    leads: (context) => `With the ${subshellLabel({ n: context.element.period, l: 0 })} electrons kept`,
  },
  {
    id: 'exception-ignored',
    name: 'exceptional configuration ignored',
    outcome: (context) => onConfiguration(context, withoutExceptions(context)),
    rule: (context) => `${speciesName(context)} is an exception to the order of filling: ${formatConfiguration(context.configuration)}.`,
    leads: () => 'With the regular filling',
  },
  groupSlip('group-inward', -1),
  groupSlip('group-outward', 1),
  elementSlip('element-before', -1),
  elementSlip('element-after', 1),
];
