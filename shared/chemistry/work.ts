import { computedConventions, isComputed, isSlater } from './conventions';
import type { ComputedConvention } from './conventions';
import type { Derivation } from './derivation';
import { FIGURES, effectiveCharge } from './effective-charge';
import type { EffectiveCharge } from './effective-charge';
import { decimalsForFigures, toDecimals, toFigures } from './exact';
import type { Exact } from './exact';
import { difference, electronegativity, energyEv, energyKjMol, radiusPm } from './quantities';
import type { Contact, Followed } from './quantities';
import { found, refused } from './result';
import type { Result } from './result';
import type { CountingConvention } from './slater';
import { targetOf } from './target';
import type { ElectronAsked, Target } from './target';

/** What fixes a computed value. */
export interface AskedInput extends ElectronAsked, Contact {
  readonly quantity: string;
  readonly convention: string;
  /** The electron that is taken off, for a difference of two. */
  readonly other?: ElectronAsked | undefined;
}

export interface Worked {
  readonly value: Exact;
  /** As printed: `6.10`. */
  readonly text: string;
  readonly sigma: Exact | null;
  readonly zeff: Exact;
  readonly configuration: string;
  readonly derivation: Derivation;
  /** Of the second electron of a difference. */
  readonly otherDerivation: Derivation | null;
  /** The decimals a key of this kind is stated with: 2 by Slater's rules, 4 from screening constants. */
  readonly decimals: number;
  /** The significant figures of a key that is no short decimal, 4; otherwise null. */
  readonly figures: number | null;
  /** `eV`, `kJ/mol`, `pm`, or empty for a pure number. */
  readonly unit: string;
  readonly source: string;
}

/**
 * The value of a computed item, with its derivation; charges in elementary charges, other units as named in `unit`.
 * Z_eff of a 3p electron of Cl by Slater's rules (Phys. Rev. 36, 57, 1930) is 61/10.
 */
export function work(asked: AskedInput): Result<Worked> {
  const { convention, quantity } = asked;
  if (!isComputed(convention)) return refused('outside-convention', 'Under this convention the value is typed, not worked out.');
  const target = targetOf(asked);
  if (!target.ok) return target;
  const effective = effectiveCharge(target.value, convention);
  if (!effective.ok) return effective;
  const base = resultOf(effective.value);
  if (quantity === 'zeff') return found(base);
  if (quantity === 'sigma') return found({ ...base, ...stated(effective.value, effective.value.sigma) });
  if (quantity === 'difference') return workDifference(asked, effective.value, convention);
  if (!isSlater(convention)) {
    return refused('outside-quantity', `${quantityNames[quantity] ?? 'This quantity'} is worked out from Slater’s rules only, not under ${computedConventions[convention].name}.`);
  }
  const followed = followedBy(asked, target.value, effective.value, convention);
  return followed.ok ? found(withStep(base, followed.value, units[quantity] ?? '')) : followed;
}

const units: Readonly<Record<string, string>> = { 'energy-ev': 'eV', 'energy-kj-mol': 'kJ/mol', 'radius-pm': 'pm' };

const quantityNames: Readonly<Record<string, string>> = {
  'energy-ev': 'An orbital energy',
  'energy-kj-mol': 'An orbital energy',
  'radius-pm': 'A radius of maximum density',
  electronegativity: 'An electronegativity',
};

function followedBy(asked: AskedInput, target: Target, effective: EffectiveCharge, convention: CountingConvention): Result<Followed> {
  switch (asked.quantity) {
    case 'energy-ev':
      return energyEv(target, effective);
    case 'energy-kj-mol':
      return energyKjMol(target, effective);
    case 'radius-pm':
      return radiusPm(target, effective);
    case 'electronegativity':
      return electronegativity(target, effective, convention, asked);
    default:
      return refused('outside-quantity', `Nothing is worked out for the quantity “${asked.quantity}”.`);
  }
}

/** A value with the decimals or figures of the convention it comes from. */
const stated = ({ decimals, figures }: EffectiveCharge, value: Exact): Pick<Worked, 'value' | 'text' | 'decimals' | 'figures'> =>
  figures === null ? { value, text: toDecimals(value, decimals), decimals, figures } : inFourFigures(value);

const inFourFigures = (value: Exact): Pick<Worked, 'value' | 'text' | 'decimals' | 'figures'> => ({
  value,
  text: toFigures(value, FIGURES),
  decimals: Math.max(0, decimalsForFigures(value, FIGURES)),
  figures: FIGURES,
});

const resultOf = (effective: EffectiveCharge): Worked => ({
  ...stated(effective, effective.zeff),
  sigma: effective.sigma,
  zeff: effective.zeff,
  configuration: effective.derivation.configuration,
  derivation: effective.derivation,
  otherDerivation: null,
  unit: '',
  source: effective.derivation.source,
});

function withStep(base: Worked, { value, step, source }: Followed, unit: string): Worked {
  const sources = source === '' ? base.source : `${base.source} ${source}`;
  const derivation = { ...base.derivation, steps: [...base.derivation.steps, step], source: sources };
  return { ...base, ...inFourFigures(value), unit, derivation, source: sources };
}

function workDifference({ other }: AskedInput, first: EffectiveCharge, convention: ComputedConvention): Result<Worked> {
  if (!other) return refused('incomplete', 'A difference needs a second electron.');
  const target = targetOf(other);
  if (!target.ok) return target;
  const followed = difference(first, target.value, convention);
  if (!followed.ok) return followed;
  const base = resultOf(first);
  const { value, step } = followed.value;
  return found({
    ...base,
    ...stated(first, value),
    otherDerivation: followed.value.other.derivation,
    derivation: { ...base.derivation, steps: [...base.derivation.steps, step] },
  });
}
