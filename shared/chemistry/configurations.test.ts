import { describe, expect, it } from 'vitest';
import { occupiedElectrons, speciesOf } from './configurations';
import { formatConfiguration, parseConfiguration } from './typed-configuration';

const configurationOf = (symbol: string, charge: number, configuration?: string): string => {
  const species = speciesOf({ symbol, charge, configuration });
  return species.ok ? formatConfiguration(species.value.configuration) : species.problem.message;
};

describe('ions by the taught rules (common practice, no source)', () => {
  it.each([
    ['Fe', 2, '1s2 2s2 2p6 3s2 3p6 3d6'],
    ['Fe', 3, '1s2 2s2 2p6 3s2 3p6 3d5'],
    ['Cu', 2, '1s2 2s2 2p6 3s2 3p6 3d9'],
    ['Cr', 3, '1s2 2s2 2p6 3s2 3p6 3d3'],
    ['Zn', 1, '1s2 2s2 2p6 3s2 3p6 3d10 4s1'],
    ['Ga', 1, '1s2 2s2 2p6 3s2 3p6 3d10 4s2'],
    ['Ga', 3, '1s2 2s2 2p6 3s2 3p6 3d10'],
    ['Pd', 2, '1s2 2s2 2p6 3s2 3p6 3d10 4s2 4p6 4d8'],
    ['Na', 1, '1s2 2s2 2p6'],
    ['Gd', 3, '1s2 2s2 2p6 3s2 3p6 3d10 4s2 4p6 4d10 4f7 5s2 5p6'],
    ['Th', 4, '1s2 2s2 2p6 3s2 3p6 3d10 4s2 4p6 4d10 4f14 5s2 5p6 5d10 6s2 6p6'],
    ['Rn', 85, '1s1'],
  ])('%s with charge %i is %s', (symbol, charge, expected) => expect(configurationOf(symbol, charge)).toBe(expected));

  it.each([
    ['Cl', -1, '1s2 2s2 2p6 3s2 3p6'],
    ['O', -2, '1s2 2s2 2p6'],
    ['N', -3, '1s2 2s2 2p6'],
    ['C', -4, '1s2 2s2 2p6'],
    ['H', -1, '1s2'],
    ['Na', -1, '1s2 2s2 2p6 3s2'],
    ['I', -1, '1s2 2s2 2p6 3s2 3p6 3d10 4s2 4p6 4d10 5s2 5p6'],
    ['Cu', -1, '1s2 2s2 2p6 3s2 3p6 3d10 4s2'],
  ])('%s with charge %i is %s', (symbol, charge, expected) => expect(configurationOf(symbol, charge)).toBe(expected));

  it('a typed configuration overrides them', () => {
    expect(configurationOf('Ne', 0, '1s2 2s2 2p5 3s1')).toBe('1s2 2s2 2p5 3s1');
    expect(configurationOf('Eu', 3, '[Xe] 4f6')).toBe('1s2 2s2 2p6 3s2 3p6 3d10 4s2 4p6 4d10 4f6 5s2 5p6');
    expect(configurationOf('Fe', -1, '[Ar] 3d7 4s2')).toContain('3d7 4s2');
    expect(configurationOf('Fe', 0, '  ')).toContain('3d6 4s2');
  });

  it('the occupied subshells are listed for a picker', () => {
    expect(occupiedElectrons('Ne', 0)).toEqual({ ok: true, value: ['1s', '2s', '2p'] });
    expect(occupiedElectrons('Fe', 2)).toEqual({ ok: true, value: ['1s', '2s', '2p', '3s', '3p', '3d'] });
    expect(occupiedElectrons('Ne', 0, '1s2 2s2 2p5 3p1')).toEqual({ ok: true, value: ['1s', '2s', '2p', '3p'] });
    expect(occupiedElectrons('Ne', 10).ok).toBe(false);
  });

  describe('edge cases', () => {
    it.each([
      ['Na', 12, 'Sodium has 11 electrons, so 12 can’t be removed.'],
      ['H', 1, 'H⁺ is a bare nucleus: no electron is left.'],
      ['H', 2, 'Hydrogen has 1 electron, so 2 can’t be removed.'],
      ['Na', 0.5, 'A charge is a whole number.'],
      ['Na', Number.NaN, 'A charge is a whole number.'],
      ['Na', Number.POSITIVE_INFINITY, 'A charge is a whole number.'],
      ['F', -2, 'The outer shell of fluorine has room for 1 more, so there is no F²⁻.'],
      ['He', -1, 'The outer shell of helium is full, so there is no He⁻.'],
      ['Ne', -1, 'The outer shell of neon is full, so there is no Ne⁻.'],
      ['Fe', -1, 'Where the next electron of Fe⁻ goes is not settled by the rule for anions. Type its configuration.'],
      ['Pd', -1, 'Where the next electron of Pd⁻ goes is not settled by the rule for anions. Type its configuration.'],
      ['Eu', 3, 'The rule for cations does not reach Eu³⁺, which would lose 5p electrons. Type its configuration.'],
    ])('%s with charge %d is refused: %s', (symbol, charge, message) => expect(configurationOf(symbol, charge)).toBe(message));

    it('a typed configuration must have the electrons of the species', () => {
      expect(configurationOf('Cl', -1, '1s2 2s2 2p6 3s2 3p5')).toBe('This configuration has 17 electrons; Cl⁻ has 18.');
    });
  });
});

describe('a typed configuration', () => {
  it.each([
    ['1s2 2s2 2p5 3s1', '1s2 2s2 2p5 3s1'],
    ['  1s2   2s1 ', '1s2 2s1'],
    ['[Ar] 3d5 4s1', '1s2 2s2 2p6 3s2 3p6 3d5 4s1'],
    ['[Ar]4s2 3d6', '1s2 2s2 2p6 3s2 3p6 3d6 4s2'],
    ['1s²2s²2p⁶', '1s2 2s2 2p6'],
    ['[He]', '1s2'],
    ['[Kr] 4d¹⁰ 5s²', '1s2 2s2 2p6 3s2 3p6 3d10 4s2 4p6 4d10 5s2'],
  ])('%s is read as %s', (text, expected) => {
    const parsed = parseConfiguration(text);
    expect(parsed.ok && formatConfiguration(parsed.value)).toBe(expected);
  });

  describe('edge cases', () => {
    it.each([
      ['', 'A configuration is needed, such as 1s2 2s2 2p5.', 0],
      ['1s2 2s', '“2s” is not understood. Write subshell and count, with a space between terms: 2s2 2p5.', 4],
      ['1s22s2', '“1s22s2” is not understood. Write subshell and count, with a space between terms: 2s2 2p5.', 0],
      ['1s2 2d1', 'There is no 2d subshell.', 4],
      ['1s2 2p7', 'A 2p subshell holds 6 electrons at most, not 7.', 4],
      ['1s2 2s0', 'An empty subshell is left out: 2s0.', 4],
      ['1s2 1s1', '1s stands twice in this configuration.', 4],
      ['[Ne] 2p1', '2p stands twice in this configuration.', 5],
      ['[Na] 3s1', 'Only a noble gas stands in brackets, and “Na” is none.', 0],
      ['1s2 [He]', '“[He]” is not understood. Write subshell and count, with a space between terms: 2s2 2p5.', 4],
      ['8s1', '“8s” names no subshell from 1s to 7f.', 0],
      ['1s2 2g1', '“2g” names no subshell from 1s to 7f.', 4],
    ])('“%s” is refused: %s', (text, message, at) => expect(parseConfiguration(text)).toMatchObject({ problem: { message, at } }));
  });
});
