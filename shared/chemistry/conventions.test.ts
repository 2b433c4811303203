import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { computedConventions } from './conventions';
import { screeningConstants } from './data/screening-constants';
import { elementByNumber, elements } from './elements';
import { absolute, add, compare, decimal, equals, subtract, toDecimals, toFigures, whole } from './exact';
import { valuesByOtherConventions } from './other-conventions';
import { work } from './work';
import type { AskedInput, Worked } from './work';

const ask = (symbol: string, electron: string, more: Partial<AskedInput> = {}): AskedInput => ({ symbol, charge: 0, electron, quantity: 'zeff', convention: 'slater', ...more });
const worked = (asked: AskedInput): Worked => {
  const result = work(asked);
  if (!result.ok) throw new Error(result.problem.message);
  return result.value;
};
const refusal = (asked: AskedInput): string => {
  const result = work(asked);
  return result.ok ? `worked: ${result.value.text}` : result.problem.message;
};

describe('SCF screening constants', () => {
  // E. Clementi and D. L. Raimondi, J. Chem. Phys. 38, 2686 (1963).
  it.each([['C', '3.136'], ['N', '3.834'], ['O', '4.453'], ['F', '5.100']])('give 2p of %s %s', (symbol, expected) => {
    const { value, decimals, figures } = worked(ask(symbol, '2p', { convention: 'scf' }));
    expect(toDecimals(value, 3)).toBe(expected);
    expect([decimals, figures]).toEqual([4, null]);
  });

  // The same and, for Rb and Cs, Clementi, Raimondi and Reinhardt, J. Chem. Phys. 47, 1300 (1967).
  it('grow down a group where Slater’s rules do not', () => {
    const outermost = [['Na', '3s'], ['K', '4s'], ['Rb', '5s'], ['Cs', '6s']] as const;
    expect(outermost.map(([symbol, electron]) => toDecimals(worked(ask(symbol, electron, { convention: 'scf' })).value, 2))).toEqual(['2.51', '3.50', '4.98', '6.36']);
    expect(outermost.map(([symbol, electron]) => worked(ask(symbol, electron)).text)).toEqual(['2.20', '2.20', '2.20', '2.20']);
  });

  it('of the whole table are sigma as published, and Z less sigma', () => {
    const lines = readFileSync(new URL('data/screening-constants.csv', import.meta.url), 'utf8').trim().split('\n').slice(1);
    let checked = 0;
    for (const line of lines) {
      const [number = '', n = '', letter = '', constant = ''] = line.split(',');
      const element = elementByNumber(Number(number));
      if (!element.ok) throw new Error(line);
      const result = work(ask(element.value.symbol, `${n}${letter}`, { convention: 'scf', quantity: 'sigma' }));
      if (!result.ok) {
        // The ground level of lanthanum is 5d1 6s2 (NIST Atomic Spectra Database); the table's has 4f.
        expect([element.value.symbol, `${n}${letter}`, result.problem.code]).toEqual(['La', '4f', 'empty-subshell']);
        continue;
      }
      expect(result.value.text).toBe(constant);
      expect(equals(add(result.value.zeff, decimal(constant)), whole(Number(number)))).toBe(true);
      checked += 1;
    }
    expect(checked).toBe(810);
  });

  it('are shown with their table, not with groups', () => {
    const { derivation } = worked(ask('C', '2p', { convention: 'scf' }));
    expect(derivation).toMatchObject({ groups: [], steps: ['Z − σ = 6 − 2.8642 = 3.1358'], selfScreening: null, sigma: { text: '2.8642' } });
    expect(derivation.source).toContain('J. Chem. Phys. 38, 2686 (1963)');
  });

  it('exist for every occupied subshell up to 86 but 5d of La, Ce and Gd', () => {
    const missing = elements.slice(0, 86).flatMap(({ number, symbol, configuration }) =>
      configuration.split(' ').map((text) => text.slice(0, 2)).filter((label) => screeningConstants[number]?.[label] === undefined).map((label) => `${symbol} ${label}`),
    );
    expect(missing).toEqual(['La 5d', 'Ce 5d', 'Gd 5d']);
    expect(refusal(ask('La', '5d', { convention: 'scf' }))).toMatch(/^The table has no 5d constant for lanthanum\./);
  });
});

describe('the ionisation energy', () => {
  // A one-electron species has no screening; the rest, under 0.1 %, is the reduced mass and relativity. Energies: NIST Atomic Spectra Database.
  it.each([['H', 0, 1], ['He', 1, 2], ['Li', 2, 3]])('gives 1s of %s with charge %i the whole Z, %i', (symbol, charge, Z) => {
    const { zeff } = worked(ask(symbol, '1s', { charge, convention: 'ionisation-energy' }));
    expect(compare(absolute(subtract(zeff, whole(Z))), decimal(String(Z / 1000)))).toBeLessThan(0);
  });

  it('is that of the electron which is lost first, with four figures', () => {
    // 2 × √(11.260288 / 13.605693) and the like, worked apart in binary floats.
    expect(worked(ask('C', '2p', { convention: 'ionisation-energy' }))).toMatchObject({ text: '1.819', figures: 4, decimals: 3 });
    expect(worked(ask('Fe', '4s', { convention: 'ionisation-energy' })).text).toBe('3.048');
    expect(refusal(ask('Fe', '3d', { convention: 'ionisation-energy' }))).toMatch(/^The ionisation energy of Fe is that of a 4s electron and says nothing of 3d\./);
    expect(refusal(ask('Fe', '3d', { charge: 2, convention: 'ionisation-energy' }))).toBe('worked: 4.503');
  });
});

describe('quantities that follow from Z_eff', () => {
  it('orbital energy: J. C. Slater, Phys. Rev. 36, 57 (1930), with the Rydberg energy for hydrogen', () => {
    expect(worked(ask('H', '1s', { quantity: 'energy-ev' }))).toMatchObject({ text: '-13.61', unit: 'eV', figures: 4 });
    expect(worked(ask('H', '1s', { quantity: 'energy-kj-mol' }))).toMatchObject({ text: '-1313', unit: 'kJ/mol' });
    // −13.605693 × (6.10/3)² and × (3.75/3.7)², worked apart in binary floats.
    expect(worked(ask('Cl', '3p', { quantity: 'energy-ev' })).text).toBe('-56.25');
    expect(worked(ask('Fe', '4s', { quantity: 'energy-ev' })).text).toBe('-13.98');
    expect(worked(ask('U', '1s', { quantity: 'energy-ev' }))).toMatchObject({ text: '-114400', decimals: 0 });
    expect(worked(ask('Cl', '3p', { quantity: 'energy-ev' })).derivation.steps).toEqual(['−13.605693 eV × (6.10 / 3)² = −56.25 eV']);
  });

  it('radius of maximum density: one bohr for hydrogen', () => {
    expect(worked(ask('H', '1s', { quantity: 'radius-pm' }))).toMatchObject({ text: '52.92', unit: 'pm' });
    expect(worked(ask('Cl', '3p', { quantity: 'radius-pm' })).text).toBe('78.08');
  });

  // A. L. Allred and E. G. Rochow, J. Inorg. Nucl. Chem. 5, 264 (1958): Cl 2.83, C 2.50, F 4.10 (with the radii used then, from memory), every electron counted.
  it.each([['Cl', '3p', '0.994', '2.83'], ['C', '2p', '0.77', '2.50'], ['F', '2p', '0.72', '4.10']])('electronegativity of %s', (symbol, electron, radiusAngstrom, expected) => {
    const { value } = worked(ask(symbol, electron, { quantity: 'electronegativity', radiusAngstrom, countsItself: true }));
    expect(toDecimals(value, 2)).toBe(expected);
  });

  it('electronegativity without the electron itself is higher', () => {
    const asked = ask('Cl', '3p', { quantity: 'electronegativity', radiusAngstrom: '0.99' });
    expect(toFigures(worked({ ...asked, countsItself: false }).value, 4)).toBe('2.978');
    expect(toFigures(worked({ ...asked, countsItself: true }).value, 4)).toBe('2.850');
  });

  it('a difference of two, with both derivations', () => {
    const result = worked(ask('Cl', '3p', { quantity: 'difference', other: { symbol: 'S', charge: 0, electron: '3p' } }));
    expect(result).toMatchObject({ text: '0.65', decimals: 2, derivation: { zeff: { text: '6.10' }, steps: ['6.10 − 5.45 = 0.65'] }, otherDerivation: { zeff: { text: '5.45' } } });
    expect(worked(ask('S', '3p', { quantity: 'difference', other: { symbol: 'Cl', charge: 0, electron: '3p' } })).text).toBe('-0.65');
  });
});

describe('a refusal outside the range', () => {
  it.each([
    [ask('Fe', '3d', { charge: 2, convention: 'scf' }), 'The table is of neutral atoms in their ground state. SCF screening constants: neutral atoms in their ground state, Z up to 86.'],
    [ask('U', '7s', { convention: 'scf' }), 'The table ends at 86, and uranium is 92. SCF screening constants: neutral atoms in their ground state, Z up to 86.'],
    [ask('Ne', '3s', { convention: 'scf', configuration: '1s2 2s2 2p5 3s1' }), 'The table is of neutral atoms in their ground state. SCF screening constants: neutral atoms in their ground state, Z up to 86.'],
    [ask('Cl', '3p', { charge: -1, convention: 'ionisation-energy' }), 'The table has no ionisation energy of Cl⁻. From the ionisation energy: the outermost electron of atoms and cations with a measured ionisation energy, Z up to 104.'],
    [ask('Og', '7p', { convention: 'ionisation-energy' }), 'The table has no ionisation energy of Og. From the ionisation energy: the outermost electron of atoms and cations with a measured ionisation energy, Z up to 104.'],
    [ask('Fr', '7s', { quantity: 'energy-ev' }), 'Slater gives n* for shells 1 to 6 only, not for n = 7.'],
    [ask('Fr', '7s', { quantity: 'radius-pm' }), 'Slater gives n* for shells 1 to 6 only, not for n = 7.'],
    [ask('Cl', '3p', { quantity: 'energy-ev', convention: 'scf' }), 'An orbital energy is worked out from Slater’s rules only, not under SCF screening constants.'],
    [ask('Cl', '3p', { quantity: 'electronegativity', countsItself: true }), 'The radius r is needed, in ångström, such as 0.99.'],
    [ask('Cl', '3p', { quantity: 'electronegativity', radiusAngstrom: '0.00', countsItself: true }), 'The radius r is needed, in ångström, such as 0.99.'],
    [ask('Cl', '3p', { quantity: 'electronegativity', radiusAngstrom: '0.99' }), 'Say whether the electron counts itself.'],
    [ask('Cl', '3p', { quantity: 'difference' }), 'A difference needs a second electron.'],
    [ask('Cl', '3p', { quantity: 'difference', other: { symbol: 'S', charge: 0, electron: '4p' } }), 'Sulfur has no 4p electron in its ground state.'],
    [ask('Cl', '3p', { quantity: 'hardness' }), 'Nothing is worked out for the quantity “hardness”.'],
    [ask('Cl', '3p', { convention: 'typed' }), 'Under this convention the value is typed, not worked out.'],
    [ask('Cl', '3p', { convention: 'toString' }), 'Under this convention the value is typed, not worked out.'],
  ])('%o: %s', (asked, message) => expect(refusal(asked)).toBe(message));
});

describe('the other conventions of an item', () => {
  it('are those that cover it and differ', () => {
    expect(valuesByOtherConventions(ask('Cl', '3p')).map(({ convention, text }) => [convention, text])).toEqual([
      ['core-count', '7.00'], ['scf', '6.1161'], ['ionisation-energy', '2.929'],
    ]);
    expect(valuesByOtherConventions(ask('Fe', '4s')).map(({ convention, text }) => [convention, text])).toEqual([
      ['slater-d-at-1', '2.85'], ['core-count', '2.00'], ['scf', '5.4340'], ['ionisation-energy', '3.048'],
    ]);
    expect(valuesByOtherConventions(ask('Fe', '3d', { charge: 2 })).map(({ convention }) => convention)).toEqual(['core-count', 'ionisation-energy']);
  });

  it('each name their source and range', () => {
    for (const { name, source, range, says } of Object.values(computedConventions)) for (const text of [name, source, range, says]) expect(text).not.toBe('');
  });
});
