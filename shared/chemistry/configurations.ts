import { elementBySymbol } from './elements';
import type { ChemicalElement } from './elements';
import { found, refused } from './result';
import type { Result } from './result';
import { speciesText } from './species';
import { byShellThenLetter, capacity, isSameSubshell, subshellLabel } from './subshells';
import type { Configuration, Occupation, Subshell } from './subshells';
import { parseConfiguration } from './typed-configuration';

export interface SpeciesAsked {
  readonly symbol: string;
  readonly charge: number;
  /** Typed by hand; overrides the ground state and the taught rules for ions. */
  readonly configuration?: string | undefined;
}

export interface Species {
  readonly element: ChemicalElement;
  readonly charge: number;
  readonly configuration: Configuration;
  readonly isTyped: boolean;
}

export const electronsIn = (configuration: Configuration): number => configuration.reduce((sum, { count }) => sum + count, 0);

/** How many electrons a subshell holds: 5 in the 3p of chlorine, 0 where it is empty. */
export const countIn = (configuration: Configuration, subshell: Subshell): number =>
  configuration.find((occupation) => isSameSubshell(occupation, subshell))?.count ?? 0;

/** The same configuration with more (or, negative, fewer) electrons in one subshell. */
export function withElectrons(configuration: Configuration, { n, l }: Subshell, more: number): Configuration {
  const count = countIn(configuration, { n, l }) + more;
  const others = configuration.filter((occupation) => !isSameSubshell(occupation, { n, l }));
  return count > 0 ? [...others, { n, l, count }].sort(byShellThenLetter) : others;
}

/** The subshell of highest n, and within it of highest l: for iron 4s. Null for a bare nucleus. */
export const outermost = (configuration: Configuration): Occupation | null => [...configuration].sort(byShellThenLetter).at(-1) ?? null;

/** The neutral atom in its ground level, exceptions included. Source: NIST Atomic Spectra Database. Chromium is 3d5 4s1. */
export function groundConfiguration(element: ChemicalElement): Configuration {
  const parsed = parseConfiguration(element.configuration);
  if (!parsed.ok) throw new RangeError(`The table's configuration of ${element.symbol} cannot be read.`);
  return parsed.value;
}

/**
 * Element, charge and configuration of an atom or ion. Cations lose the electrons of highest n first, within it of highest l;
 * anions fill the open outer shell (the rules as taught; common practice, no source). Fe²⁺ is 1s2 2s2 2p6 3s2 3p6 3d6.
 */
export function speciesOf({ symbol, charge, configuration }: SpeciesAsked): Result<Species> {
  const element = elementBySymbol(symbol);
  if (!element.ok) return element;
  const inRange = checkCharge(element.value, charge);
  if (!inRange.ok) return inRange;
  const isTyped = configuration !== undefined && configuration.trim() !== '';
  const occupied = isTyped ? typedFor(element.value, charge, configuration) : ionOf(element.value, charge);
  return occupied.ok ? found({ element: element.value, charge, configuration: occupied.value, isTyped }) : occupied;
}

/** The subshells that hold an electron, for pickers: Ne has 1s, 2s, 2p. Same sources as speciesOf. */
export function occupiedElectrons(symbol: string, charge: number, configuration?: string): Result<readonly string[]> {
  const species = speciesOf({ symbol, charge, configuration });
  return species.ok ? found(species.value.configuration.map(subshellLabel)) : species;
}

function checkCharge({ name, number, symbol }: ChemicalElement, charge: number): Result<number> {
  if (!Number.isInteger(charge)) return refused('charge-not-whole', 'A charge is a whole number.');
  if (charge > number) return refused('too-many-removed', `${name} has ${electronCount(number)}, so ${charge} can’t be removed.`);
  if (charge === number) return refused('no-electron-left', `${speciesText(symbol, charge)} is a bare nucleus: no electron is left.`);
  return found(charge);
}

function typedFor({ number, symbol }: ChemicalElement, charge: number, text: string): Result<Configuration> {
  const parsed = parseConfiguration(text);
  if (!parsed.ok) return parsed;
  const typed = electronsIn(parsed.value);
  const due = number - charge;
  if (typed === due) return parsed;
  return refused('electron-count', `This configuration has ${electronCount(typed)}; ${speciesText(symbol, charge)} has ${due}.`);
}

function ionOf(element: ChemicalElement, charge: number): Result<Configuration> {
  const ground = groundConfiguration(element);
  return charge < 0 ? anionOf(element, ground, charge) : cationOf(element, ground, charge);
}

/** A neutral configuration with electrons taken from the highest n, and within it the highest l. See speciesOf. */
export function cationOf(element: ChemicalElement, ground: Configuration, charge: number): Result<Configuration> {
  let left = ground;
  for (let removed = 0; removed < charge; removed += 1) {
    const next = outermost(left);
    if (!next) break;
    // NOTE: Eu³⁺ is 4f6 5s2 5p6; the taught rule would break into 5p6. It was never meant for the f block beyond ns and (n-1)d.
    if (element.block === 'f' && next.l === 1 && next.n < element.period) {
      const ion = speciesText(element.symbol, charge);
      return refused('configuration-needed', `The rule for cations does not reach ${ion}, which would lose ${subshellLabel(next)} electrons. Type its configuration.`);
    }
    left = withElectrons(left, next, -1);
  }
  return found(left);
}

function anionOf(element: ChemicalElement, ground: Configuration, charge: number): Result<Configuration> {
  const ion = speciesText(element.symbol, charge);
  // NOTE: Fe⁻ is 3d7 4s2, not 4s2 4p1: while d or f electrons are being filled, only an open ns is beyond doubt.
  const isInner = element.block === 'd' || element.block === 'f';
  const n = element.period;
  let left = -charge;
  let filled = ground;
  for (const l of n === 1 || isInner ? [0] : [0, 1]) {
    const held = countIn(filled, { n, l });
    const taken = isInner && held === 0 ? 0 : Math.min(left, capacity(l) - held);
    filled = withElectrons(filled, { n, l }, taken);
    left -= taken;
  }
  if (left === 0) return found(filled);
  if (isInner) return refused('configuration-needed', `Where the next electron of ${ion} goes is not settled by the rule for anions. Type its configuration.`);
  const room = -charge - left;
  const state = room === 0 ? 'is full' : `has room for ${room} more`;
  return refused('anion-beyond-shell', `The outer shell of ${element.name.toLowerCase()} ${state}, so there is no ${ion}.`);
}

const electronCount = (count: number): string => `${count} ${count === 1 ? 'electron' : 'electrons'}`;
