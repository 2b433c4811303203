import { elementRows } from './data/elements';
import type { ElementRow } from './data/elements';
import { found, refused } from './result';
import type { Result } from './result';

export type ChemicalElement = ElementRow;

/** All 118, in order of atomic number; sources stand beside the table. */
export const elements: readonly ChemicalElement[] = elementRows;

const bySymbol = new Map(elementRows.map((element) => [element.symbol, element]));

/** The element of a symbol, capitals as printed. Source: IUPAC names and symbols. elementBySymbol('Fe') is iron, number 26. */
export function elementBySymbol(symbol: string): Result<ChemicalElement> {
  const element = bySymbol.get(symbol);
  return element ? found(element) : refused('unknown-element', symbol === '' ? 'No element is named.' : `No element has the symbol “${symbol}”.`);
}

/** The element of an atomic number, 1 to 118. Source: IUPAC. elementByNumber(26) is iron. */
export function elementByNumber(number: number): Result<ChemicalElement> {
  const element = elementRows[number - 1];
  return element ? found(element) : refused('unknown-element', `No element has the atomic number ${number}.`);
}
