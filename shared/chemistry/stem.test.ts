import { describe, expect, it } from 'vitest';
import { withArticle } from './species';
import { proposedStem } from './stem';

describe('the proposed stem', () => {
  it('prints convention, electron, species and figures', () => {
    const asked = { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'zeff', convention: 'slater' };
    expect(proposedStem(asked, 2)).toBe('By Slater’s rules, find Z_eff for a 3p electron of a Cl atom, to two decimals.');
    expect(proposedStem({ ...asked, charge: -1 }, 1)).toBe('By Slater’s rules, find Z_eff for a 3p electron of a Cl⁻ ion, to one decimal.');
    expect(proposedStem({ ...asked, quantity: 'sigma', symbol: 'Fe', charge: 2, electron: '3d' }, 2)).toBe(
      'By Slater’s rules, find the screening constant σ for a 3d electron of an Fe²⁺ ion, to two decimals.',
    );
    expect(proposedStem({ ...asked, symbol: 'Ne', electron: '3s', configuration: '1s2 2s2 2p5 3s1' }, 2)).toBe(
      'By Slater’s rules, find Z_eff for a 3s electron of an Ne atom with the configuration 1s2 2s2 2p5 3s1, to two decimals.',
    );
  });

  it('names every quantity with its unit and figures', () => {
    const asked = { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'energy-ev', convention: 'slater' };
    expect(proposedStem(asked, 2, 4)).toBe('By Slater’s rules, find the orbital energy in eV for a 3p electron of a Cl atom, to four significant figures.');
    expect(proposedStem({ ...asked, quantity: 'difference', other: { symbol: 'S', charge: 0, electron: '3p' } }, 2)).toBe(
      'By Slater’s rules, find Z_eff for a 3p electron of a Cl atom less Z_eff for a 3p electron of an S atom, to two decimals.',
    );
    expect(proposedStem({ ...asked, quantity: 'electronegativity', radiusAngstrom: '0.99', countsItself: true }, 2)).toBe(
      'By Slater’s rules, find the Allred-Rochow electronegativity of Cl from Z_eff for a 3p electron, the electron itself counted, with r = 0.99 Å, to two decimals.',
    );
    expect(proposedStem({ ...asked, quantity: 'zeff', convention: 'scf' }, 4)).toBe(
      'From the SCF screening constants of Clementi and co-workers, find Z_eff for a 3p electron of a Cl atom, to four decimals.',
    );
    expect(proposedStem({ ...asked, quantity: 'zeff', convention: 'ionisation-energy' }, 3, 4)).toBe('From the ionisation energy, find Z_eff for a 3p electron of a Cl atom, to four significant figures.');
  });

  // Symbols are read by the names of their letters; English usage, no source.
  it.each([
    ['F', 0, 'an F atom'], ['Cl', 0, 'a Cl atom'], ['Fe', 0, 'an Fe atom'], ['O', 0, 'an O atom'], ['Na', 0, 'an Na atom'], ['H', 0, 'an H atom'],
    ['U', 0, 'a U atom'], ['Y', 0, 'a Y atom'], ['Xe', 0, 'an Xe atom'], ['S', -2, 'an S²⁻ ion'], ['Li', 2, 'an Li²⁺ ion'], ['Cl', -1, 'a Cl⁻ ion'],
    ['U', 91, 'a U⁹¹⁺ ion'],
  ])('%s with charge %i is %s', (symbol, charge, expected) => expect(withArticle(symbol, charge)).toBe(expected));
});
