import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { groundConfiguration, electronsIn } from './configurations';
import { ionisationEnergiesEv } from './data/ionisation-energies';
import { screeningConstants } from './data/screening-constants';
import { elementByNumber, elementBySymbol, elements } from './elements';
import { formatConfiguration } from './typed-configuration';

const linesOf = (file: string): string[][] =>
  readFileSync(new URL(`data/${file}`, import.meta.url), 'utf8').trim().split('\n').slice(1).map((line) => line.split(','));

describe('elements', () => {
  it('are all 118, in order, found by symbol and by number', () => {
    expect(elements).toHaveLength(118);
    for (const [index, element] of elements.entries()) {
      expect(element.number).toBe(index + 1);
      expect(elementByNumber(index + 1)).toEqual({ ok: true, value: element });
      expect(elementBySymbol(element.symbol)).toEqual({ ok: true, value: element });
    }
    expect(elementBySymbol('Fe')).toMatchObject({ value: { number: 26, name: 'Iron' } });
  });

  it('hold as many electrons as protons, in configurations that read back as written', () => {
    for (const element of elements) {
      const configuration = groundConfiguration(element);
      expect(electronsIn(configuration)).toBe(element.number);
      expect(formatConfiguration(configuration)).toBe(element.configuration);
    }
  });

  // Ground levels of the NIST Atomic Spectra Database, from memory.
  it.each([
    ['Cr', '3d5 4s1'],
    ['Cu', '3d10 4s1'],
    ['Mo', '4d5 5s1'],
    ['Pd', '4p6 4d10'],
    ['La', '5p6 5d1 6s2'],
    ['Au', '5d10 6s1'],
  ])('%s ends in %s', (symbol, ending) => {
    expect(elementBySymbol(symbol)).toMatchObject({ value: { configuration: expect.stringMatching(new RegExp(`${ending}$`)) as string } });
  });

  it('have the names IUPAC recommends', () => {
    expect([13, 16, 55].map((number) => elementByNumber(number))).toMatchObject([{ value: { name: 'Aluminium' } }, { value: { name: 'Sulfur' } }, { value: { name: 'Caesium' } }]);
  });

  it('stand in the block of the subshell that is filled: helium, 1s2, in s', () => {
    expect([2, 5, 26, 58].map((number) => elementByNumber(number))).toMatchObject([{ value: { block: 's' } }, { value: { block: 'p' } }, { value: { block: 'd' } }, { value: { block: 'f' } }]);
  });

  describe('edge cases', () => {
    it('an unknown symbol or number is refused by name', () => {
      expect(elementBySymbol('Xx')).toEqual({ ok: false, problem: { code: 'unknown-element', message: 'No element has the symbol “Xx”.' } });
      expect(elementBySymbol('FE').ok).toBe(false);
      expect(elementBySymbol('')).toMatchObject({ problem: { message: 'No element is named.' } });
      expect(elementByNumber(0).ok).toBe(false);
      expect(elementByNumber(119)).toMatchObject({ problem: { message: 'No element has the atomic number 119.' } });
    });
  });
});

describe('the tables', () => {
  it('hold every published figure as published', () => {
    const constants = linesOf('screening-constants.csv');
    expect(constants).toHaveLength(811);
    for (const [number = '', n = '', letter = '', sigma] of constants) expect(screeningConstants[Number(number)]?.[n + letter]).toBe(sigma);
    const energies = linesOf('ionisation-energies.csv');
    expect(energies).toHaveLength(804);
    for (const [number, charge, energy, uncertainty] of energies) expect(ionisationEnergiesEv[Number(number)]?.[Number(charge)]).toEqual([energy, uncertainty]);
    for (const [number, symbol] of linesOf('elements.csv')) expect(elements[Number(number) - 1]?.symbol).toBe(symbol);
  });
});
