import { computedConventions, isComputed } from './conventions';
import { speciesText, withArticle } from './species';
import type { ChoiceAsked, ChoiceKind } from './choices';
import type { ElectronAsked } from './target';
import type { AskedInput } from './work';

const numberWords = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine'];
const counted = (count: number, noun: string): string => `${numberWords[count] ?? count} ${count === 1 ? noun : `${noun}s`}`;

const precision = (decimals: number, figures: number | null): string => {
  if (figures !== null) return `to ${counted(figures, 'significant figure')}`;
  return decimals === 0 ? 'to the nearest whole number' : `to ${counted(decimals, 'decimal')}`;
};

/** One electron in words, with its configuration where one was typed: "a 2p electron of an O atom". Ours, no source; no units. */
export const electronText = ({ symbol, charge, electron, configuration }: ElectronAsked): string => {
  const typed = configuration === undefined || configuration.trim() === '' ? '' : ` with the configuration ${configuration.trim()}`;
  return `a ${electron} electron of ${withArticle(symbol, charge)}${typed}`;
};

const quantityNames: Readonly<Record<string, string>> = {
  zeff: 'Z_eff',
  sigma: 'the screening constant σ',
  'energy-ev': 'the orbital energy in eV',
  'energy-kj-mol': 'the orbital energy in kJ/mol',
  'radius-pm': 'the radius of maximum density in pm',
};

const quantityOf = ({ quantity }: Pick<AskedInput, 'quantity'>): string => quantityNames[quantity] ?? 'the value';

function wanted(asked: AskedInput): string {
  const { quantity, other, symbol, charge, radiusAngstrom, countsItself } = asked;
  if (quantity === 'difference' && other) return `Z_eff for ${electronText(asked)} less Z_eff for ${electronText(other)}`;
  if (quantity === 'electronegativity') {
    const itself = countsItself === undefined ? '' : `, the electron itself ${countsItself ? 'counted' : 'not counted'}`;
    return `the Allred-Rochow electronegativity of ${speciesText(symbol, charge)} from Z_eff for a ${asked.electron} electron${itself}, with r = ${radiusAngstrom ?? ''} Å`;
  }
  return `${quantityOf(asked)} for ${electronText(asked)}`;
}

/**
 * The wording proposed for an item: convention, quantity, electron, species and figures, plain text. Ours, no source.
 * "By Slater’s rules, find Z_eff for a 3p electron of a Cl atom, to two decimals."
 */
export const proposedStem = (asked: AskedInput, decimals: number, figures: number | null = null): string =>
  `${opening(asked.convention, 'find', 'Find')} ${wanted(asked)}, ${precision(decimals, figures)}.`;

const questions: Readonly<Record<ChoiceKind, (quantity: string) => string>> = {
  greatest: (quantity) => `which of these has the greatest value of ${quantity}? Write its number.`,
  least: (quantity) => `which of these has the least value of ${quantity}? Write its number.`,
  increasing: (quantity) => `put these in order of increasing ${quantity}. Write their numbers.`,
  decreasing: (quantity) => `put these in order of decreasing ${quantity}. Write their numbers.`,
};

/** The same for a choice or an order, the options numbered: "By Slater’s rules, which of these has the greatest value of Z_eff? Write its number. 1: a 2p electron of an O atom; 2: a 2p electron of an F atom." */
export function proposedChoiceStem({ kind, quantity, convention, options }: ChoiceAsked): string {
  const question = questions[kind](quantityOf({ quantity }).replace(/^the /, ''));
  const listed = options.map((option, index) => `${index + 1}: ${electronText(option)}`).join('; ');
  const capital = question.charAt(0).toUpperCase() + question.slice(1);
  return `${opening(convention, question, capital)} ${listed}.`;
}

/** With the convention in front where it is known. */
const opening = (convention: string, rest: string, alone: string): string =>
  isComputed(convention) ? `${computedConventions[convention].opening}, ${rest}` : alone;
