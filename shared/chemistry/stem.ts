import { computedConventions } from './conventions';
import { withArticle } from './species';
import type { AskedInput } from './work';

const numberWords = ['no', 'one', 'two', 'three', 'four', 'five', 'six'];

const decimalsText = (decimals: number): string =>
  decimals === 0 ? 'to the nearest whole number' : `to ${numberWords[decimals] ?? decimals} ${decimals === 1 ? 'decimal' : 'decimals'}`;

const quantityText: Readonly<Record<string, string>> = {
  zeff: 'Z_eff',
  sigma: 'the screening constant σ',
};

/**
 * The wording proposed for an item: convention, quantity, electron, species and figures, plain text. Ours, no source.
 * "By Slater’s rules, find Z_eff for a 3p electron of a Cl atom, to two decimals."
 */
export function proposedStem({ symbol, charge, electron, quantity, convention, configuration }: AskedInput, decimals: number): string {
  const opening = isComputed(convention) ? `${computedConventions[convention].opening}, find` : 'Find';
  const typed = configuration === undefined || configuration.trim() === '' ? '' : ` with the configuration ${configuration.trim()}`;
  return `${opening} ${quantityText[quantity] ?? 'the value'} for a ${electron} electron of ${withArticle(symbol, charge)}${typed}, ${decimalsText(decimals)}.`;
}

const isComputed = (convention: string): convention is keyof typeof computedConventions => Object.hasOwn(computedConventions, convention);
