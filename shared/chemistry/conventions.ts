import type { CountingConvention } from './slater';

/** The conventions that compute a value; a typed value is none of them. */
export type ComputedConvention = CountingConvention | 'scf' | 'ionisation-energy';

export interface Convention {
  readonly name: string;
  /** How a question begins that follows it. */
  readonly opening: string;
  /** What it says, in one sentence. */
  readonly says: string;
  readonly source: string;
  /** What it can be asked for. */
  readonly range: string;
}

const allSpecies = 'Every atom and ion with at least one electron, every occupied subshell.';

/** Names, sources and validity of the conventions. Sources as named in each; variants: common practice in teaching, no source. */
export const computedConventions: Readonly<Record<ComputedConvention, Convention>> = {
  slater: {
    name: 'Slater’s rules',
    opening: 'By Slater’s rules',
    says: 'Same group 0.35, in 1s 0.30. For an s or p electron the whole shell below counts 0.85 and deeper ones 1.00; for a d or f electron everything to the left counts 1.00.',
    source: 'J. C. Slater, Phys. Rev. 36, 57 (1930).',
    range: allSpecies,
  },
  'slater-035-in-1s': {
    name: 'Slater’s rules, 0.35 in 1s as well',
    opening: 'By Slater’s rules, with 0.35 in the 1s group as well',
    says: 'Slater’s rules, but the two 1s electrons screen each other by 0.35 like any other group.',
    source: 'A variant in teaching of J. C. Slater, Phys. Rev. 36, 57 (1930).',
    range: allSpecies,
  },
  'slater-d-at-1': {
    name: 'Slater’s rules, inner d and f at 1.00',
    opening: 'By Slater’s rules, with the d and f electrons of the shell below at 1.00',
    says: 'Slater’s rules, but for an s or p electron the d and f electrons of the shell below count 1.00, its s and p electrons 0.85.',
    source: 'A variant in teaching of J. C. Slater, Phys. Rev. 36, 57 (1930).',
    range: allSpecies,
  },
  'core-count': {
    name: 'Core count',
    opening: 'With only the electrons of the shells below screening, each by 1',
    says: 'Every electron in a shell below screens fully, every other one not at all.',
    source: 'Common practice in first-year teaching.',
    range: allSpecies,
  },
  scf: {
    name: 'SCF screening constants',
    opening: 'From the SCF screening constants of Clementi and co-workers',
    says: 'The screening constants of optimised single-zeta functions, from a table. For La, Ce and Gd the table has 4f in place of 5d.',
    source:
      'E. Clementi and D. L. Raimondi, J. Chem. Phys. 38, 2686 (1963), for Z up to 36; E. Clementi, D. L. Raimondi and W. P. Reinhardt, J. Chem. Phys. 47, 1300 (1967), for Z = 37 to 86.',
    range: 'Neutral atoms in their ground state, Z up to 86.',
  },
  'ionisation-energy': {
    name: 'From the ionisation energy',
    opening: 'From the ionisation energy',
    says: 'The charge that would hold the outermost electron this firmly in a hydrogen-like shell n: n × √(E / 13.605693 eV).',
    source: 'Ionisation energies: NIST Atomic Spectra Database.',
    range: 'The outermost electron of atoms and cations with a measured ionisation energy, Z up to 104.',
  },
};

const slaterConventions: readonly string[] = ['slater', 'slater-035-in-1s', 'slater-d-at-1'] satisfies readonly CountingConvention[];

/** Slater's rules or one of their variants: what energies, radii and electronegativities are worked out from. */
export const isSlater = (convention: string): convention is CountingConvention => slaterConventions.includes(convention);

export const isComputed = (convention: string): convention is ComputedConvention => Object.hasOwn(computedConventions, convention);
