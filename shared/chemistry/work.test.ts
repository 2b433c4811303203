import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { speciesOf } from './configurations';
import { elements } from './elements';
import { add, compare, equals, fromFractionText, toDecimals, toFractionText, whole } from './exact';
import type { Exact } from './exact';
import { slaterGroups } from './slater';
import { subshellLabel } from './subshells';
import { work } from './work';
import type { Worked } from './work';

const worked = (symbol: string, electron: string, charge = 0, convention = 'slater', quantity = 'zeff'): Worked => {
  const result = work({ symbol, charge, electron, quantity, convention });
  if (!result.ok) throw new Error(result.problem.message);
  return result.value;
};
const zeff = (symbol: string, electron: string, charge = 0, convention = 'slater'): string => toDecimals(worked(symbol, electron, charge, convention).value, 2);

describe('Slater’s rules', () => {
  // J. C. Slater, Phys. Rev. 36, 57 (1930): iron, 1s2 2s2 2p6 3s2 3p6 3d6 4s2.
  it.each([
    ['1s', '0.30', '25.70'],
    ['2s', '4.15', '21.85'],
    ['2p', '4.15', '21.85'],
    ['3s', '11.25', '14.75'],
    ['3p', '11.25', '14.75'],
    ['3d', '19.75', '6.25'],
    ['4s', '22.25', '3.75'],
  ])('give iron %s sigma %s and Z_eff %s', (electron, sigma, expected) => {
    expect(toDecimals(worked('Fe', electron, 0, 'slater', 'sigma').value, 2)).toBe(sigma);
    expect(zeff('Fe', electron)).toBe(expected);
  });

  // Common practice in first-year teaching, no source; rounded to one decimal.
  it.each([
    ['H', '1s', '1.0'], ['He', '1s', '1.7'], ['Li', '2s', '1.3'], ['B', '2p', '2.6'],
    ['Na', '3s', '2.2'], ['Na', '1s', '10.7'],
  ])('give %s %s %s', (symbol, electron, expected) => expect(toDecimals(worked(symbol, electron).value, 1)).toBe(expected));

  // The same list has Be 2.0 and C 3.3, which are 1.95 and 3.25 rounded.
  it.each([
    ['Be', '2s', '1.95'], ['C', '2p', '3.25'],
    // General chemistry textbooks, from memory.
    ['O', '2p', '4.55'], ['Ni', '3d', '7.55'], ['Ni', '4s', '4.05'], ['P', '3p', '4.80'], ['Cl', '3p', '6.10'],
  ])('give %s %s %s', (symbol, electron, expected) => expect(zeff(symbol, electron)).toBe(expected));

  it('give Na, K, Rb and Cs the same outermost charge', () => {
    expect([zeff('Na', '3s'), zeff('K', '4s'), zeff('Rb', '5s'), zeff('Cs', '6s')]).toEqual(['2.20', '2.20', '2.20', '2.20']);
  });

  it('follow the configuration of the ion', () => {
    expect(zeff('Cl', '3p', -1)).toBe('5.75');
    expect(zeff('Fe', '3d', 2)).toBe('6.25');
    expect(zeff('Fe', '3d', 3)).toBe('6.60');
  });
});

describe('the taught variants (common practice, no source)', () => {
  it('differ from the rules where they say so', () => {
    expect([zeff('He', '1s'), zeff('He', '1s', 0, 'slater-035-in-1s')]).toEqual(['1.70', '1.65']);
    expect(zeff('Cl', '3p', 0, 'slater-035-in-1s')).toBe('6.10');
    expect([zeff('Fe', '4s'), zeff('Fe', '4s', 0, 'slater-d-at-1')]).toEqual(['3.75', '2.85']);
    expect(zeff('Fe', '3d', 0, 'slater-d-at-1')).toBe('6.25');
    expect([zeff('Cl', '3p', 0, 'core-count'), zeff('Na', '3s', 0, 'core-count'), zeff('Fe', '3d', 0, 'core-count')]).toEqual(['7.00', '1.00', '16.00']);
  });
});

/** Every species the rules reach, with charges from -4 to +8. */
const species = elements.flatMap((element) =>
  Array.from({ length: 13 }, (_, index) => index - 4).flatMap((charge) => {
    const result = speciesOf({ symbol: element.symbol, charge });
    return result.ok ? [result.value] : [];
  }),
);

describe('every element, subshell and charge', () => {
  it('sigma and Z_eff add up to Z, and the terms of the derivation to sigma', () => {
    expect(species.length).toBeGreaterThan(800);
    fc.assert(
      fc.property(fc.constantFrom(...species), fc.constantFrom('slater', 'slater-035-in-1s', 'slater-d-at-1', 'core-count'), ({ element, charge, configuration }, convention) => {
        for (const occupation of configuration) {
          const { sigma, zeff: charged, derivation } = worked(element.symbol, subshellLabel(occupation), charge, convention);
          expect(sigma && equals(add(sigma, charged), whole(element.number))).toBe(true);
          const total = derivation.groups.map(({ contribution }) => fromFractionText(contribution.fraction)).reduce(add, whole(0));
          expect(toFractionText(total)).toBe(derivation.sigma.fraction);
          expect(derivation.groups.reduce((sum, { electrons }) => sum + electrons, 0)).toBe(element.number - charge);
        }
      }),
      { numRuns: process.env.SWEEP === 'thin' ? 20 : 1200 },
    );
  });

  it('each occupied group stands once, in Slater’s order', () => {
    const order = ['1sp', '2sp', '3sp', '3d', '4sp', '4d', '4f', '5sp', '5d', '5f', '6sp', '6d', '7sp'];
    for (const { configuration } of species) {
      const names = slaterGroups(configuration).map(({ n, kind }) => `${n}${kind}`);
      expect(names).toEqual(order.filter((name) => names.includes(name)));
    }
  });

  // Common practice in first-year teaching, no source.
  it('Z_eff of the outermost electron rises across the main groups of a period and drops at the next one', () => {
    const outermostCharge = (number: number): Exact => {
      const element = elements[number - 1];
      if (!element) throw new Error(`No element ${number}.`);
      const valence = element.configuration.split(' ').map((text) => text.slice(0, 2)).filter((label) => label.startsWith(String(element.period)));
      return worked(element.symbol, valence.at(-1) ?? '').zeff;
    };
    const mainGroup = elements.filter(({ block, number }) => (block === 's' || block === 'p') && number <= 88);
    for (const [index, next] of mainGroup.entries()) {
      const before = mainGroup[index - 1];
      if (!before || next.number !== before.number + 1) continue;
      const change = compare(outermostCharge(next.number), outermostCharge(before.number));
      expect([next.symbol, change]).toEqual([next.symbol, next.period === before.period ? 1 : -1]);
    }
  });
});

describe('a derivation', () => {
  it('is plain data: chlorine 3p', () => {
    const { derivation } = worked('Cl', '3p');
    expect(JSON.parse(JSON.stringify(derivation))).toEqual(derivation);
    expect(derivation.groups.map(({ counted, coefficient, contribution }) => `${counted} × ${coefficient.text} = ${contribution.text}`)).toEqual(['2 × 1.00 = 2.00', '8 × 0.85 = 6.80', '6 × 0.35 = 2.10']);
    expect(derivation).toMatchObject({
      species: 'Cl', electron: '3p', nuclearCharge: 17, sigma: { fraction: '109/10', text: '10.90' }, zeff: { fraction: '61/10', text: '6.10' },
      conventionName: 'Slater’s rules', source: 'J. C. Slater, Phys. Rev. 36, 57 (1930).',
      selfScreening: 'An electron does not screen itself, so 6 of the 7 electrons in (3s 3p) count.',
    });
    expect(derivation.groups[2]).toMatchObject({ isAsked: true, electrons: 7, subshells: [{ label: '3s', electrons: 2 }, { label: '3p', electrons: 5 }] });
  });

  it('shows the electrons further out with nothing to contribute', () => {
    expect(worked('Fe', '3d').derivation.groups.at(-1)).toMatchObject({ place: 'outer', electrons: 2, contribution: { text: '0.00' } });
  });
});

describe('edge cases', () => {
  const refusal = (symbol: string, charge: number, electron: string, configuration?: string): string => {
    const result = work({ symbol, charge, electron, quantity: 'zeff', convention: 'slater', configuration });
    return result.ok ? 'worked' : result.problem.message;
  };

  it('names what is wrong', () => {
    expect(refusal('Fe', 0, '4p')).toBe('Iron has no 4p electron in its ground state.');
    expect(refusal('Fe', 2, '4s')).toBe('Fe²⁺ has no 4s electron in its ground state.');
    expect(refusal('Ne', 0, '3p', '1s2 2s2 2p5 3s1')).toBe('The configuration 1s2 2s2 2p5 3s1 has no 3p electron.');
    expect(refusal('Ne', 0, '2d')).toBe('There is no 2d subshell.');
    expect(refusal('Ne', 0, 'p')).toBe('“p” names no subshell from 1s to 7f.');
    expect(refusal('Ne', 0, '')).toBe('No electron is named.');
    expect(refusal('Ne', 10, '1s')).toBe('Ne¹⁰⁺ is a bare nucleus: no electron is left.');
  });
});
