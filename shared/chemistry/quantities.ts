import { FIGURES, RYDBERG_EV, effectiveCharge } from './effective-charge';
import type { EffectiveCharge } from './effective-charge';
import type { ComputedConvention } from './conventions';
import { add, compare, decimal, divide, multiply, negate, subtract, toDecimals, toFigures, zero } from './exact';
import type { Exact } from './exact';
import { found, refused } from './result';
import type { Result } from './result';
import { contributionOf, screeningTerms } from './slater';
import type { CountingConvention } from './slater';
import { subshellLabel } from './subshells';
import type { Target } from './target';

/** A value that follows from Z_eff, and the line that shows how. */
export interface Followed {
  readonly value: Exact;
  readonly step: string;
  /** Beside that of the convention; empty where it is the same paper. */
  readonly source: string;
}

/** n* for n = 1 to 6. Source: J. C. Slater, Phys. Rev. 36, 57 (1930). */
const effectiveNumbers = ['1', '2', '3', '3.7', '4.0', '4.2'];
/** 1 eV a particle in kJ/mol. Source: CODATA 2018, from memory. */
export const KJ_PER_MOL = decimal('96.48533');
const BOHR_PM = decimal('52.9177');

const allredRochowSource = 'A. L. Allred and E. G. Rochow, J. Inorg. Nucl. Chem. 5, 264 (1958).';

const charge = (value: Exact): string => toDecimals(value, 2).replace('-', '−');
const inText = (value: Exact): string => toFigures(value, FIGURES).replace('-', '−');

/** Slater's effective quantum number n*: 3.7 for n = 4. Source: J. C. Slater, Phys. Rev. 36, 57 (1930); n = 7 has none. */
export function effectiveNumber(n: number): Result<string> {
  const number = effectiveNumbers[n - 1];
  return number === undefined ? refused('outside-quantity', `Slater gives n* for shells 1 to 6 only, not for n = ${n}.`) : found(number);
}

/** Orbital energy in eV, −13.605693 (Z_eff/n*)². Source: Slater 1930. For 1s of hydrogen −13.61. */
export function energyEv({ electron }: Target, { zeff }: EffectiveCharge): Result<Followed> {
  const number = effectiveNumber(electron.n);
  if (!number.ok) return number;
  const reduced = divide(zeff, decimal(number.value));
  const value = negate(multiply(RYDBERG_EV, multiply(reduced, reduced)));
  return found({ value, step: `−13.605693 eV × (${charge(zeff)} / ${number.value})² = ${inText(value)} eV`, source: '' });
}

/** The same in kJ/mol, times 96.48533. Source: Slater 1930; factor CODATA 2018, from memory. For 1s of hydrogen −1313. */
export function energyKjMol(target: Target, effective: EffectiveCharge): Result<Followed> {
  const energy = energyEv(target, effective);
  if (!energy.ok) return energy;
  const value = multiply(energy.value.value, KJ_PER_MOL);
  return found({ ...energy.value, value, step: `${energy.value.step}, × 96.48533 = ${inText(value)} kJ/mol` });
}

/** Radius of maximum density in pm, n*²/Z_eff in bohr of 52.9177 pm. Source: Slater 1930. For 1s of hydrogen 52.92. */
export function radiusPm({ electron }: Target, { zeff }: EffectiveCharge): Result<Followed> {
  const number = effectiveNumber(electron.n);
  if (!number.ok) return number;
  if (compare(zeff, zero) <= 0) return refused('outside-quantity', 'A radius needs a Z_eff above 0.');
  const squared = multiply(decimal(number.value), decimal(number.value));
  const value = multiply(divide(squared, zeff), BOHR_PM);
  return found({ value, step: `${number.value}² / ${charge(zeff)} × 52.9177 pm = ${inText(value)} pm`, source: '' });
}

export interface Contact {
  /** In angstrom, as printed in the question: `0.99`. */
  readonly radiusAngstrom?: string | undefined;
  /** Whether the electron is counted among those that screen. */
  readonly countsItself?: boolean | undefined;
}

/**
 * Electronegativity 0.359 Z_eff/r² + 0.744, r in angstrom. Source: Allred and Rochow, J. Inorg. Nucl. Chem. 5, 264 (1958).
 * For chlorine, 3p, r = 0.99 Å: with the electron itself counted Z_eff is 5.75 and the value 2.850.
 */
export function electronegativity({ species, electron }: Target, { zeff }: EffectiveCharge, convention: CountingConvention, { radiusAngstrom, countsItself }: Contact): Result<Followed> {
  const text = radiusAngstrom?.trim() ?? '';
  if (!/^\d{1,2}(\.\d{1,4})?$/.test(text) || compare(decimal(text), zero) === 0) {
    return refused('incomplete', 'The radius r is needed, in ångström, such as 0.99.');
  }
  if (countsItself === undefined) return refused('incomplete', 'Say whether the electron counts itself.');
  const own = screeningTerms(species.configuration, electron, convention).find(({ place }) => place === 'same');
  const used = countsItself && own ? subtract(zeff, contributionOf({ ...own, counted: 1 })) : zeff;
  const radius = decimal(text);
  const value = add(multiply(decimal('0.359'), divide(used, multiply(radius, radius))), decimal('0.744'));
  const counted = countsItself ? `, the ${subshellLabel(electron)} electron itself counted` : '';
  return found({ value, step: `0.359 × ${charge(used)} / ${text}² + 0.744 = ${inText(value)}${counted}`, source: allredRochowSource });
}

/** Z_eff of one electron less that of another, by the same convention. Ours, no source. Cl 3p less S 3p is 6.10 − 5.45 = 0.65. */
export function difference(first: EffectiveCharge, other: Target, convention: ComputedConvention): Result<Followed & { readonly other: EffectiveCharge }> {
  const second = effectiveCharge(other, convention);
  if (!second.ok) return second;
  const value = subtract(first.zeff, second.value.zeff);
  const places = first.figures === null ? first.decimals : FIGURES;
  const text = (exact: Exact): string => toDecimals(exact, places).replace('-', '−');
  return found({ value, other: second.value, step: `${text(first.zeff)} − ${text(second.value.zeff)} = ${text(value)}`, source: '' });
}

