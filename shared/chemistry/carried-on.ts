import { isComputed, isSlater } from './conventions';
import { effectiveCharge, RYDBERG_EV, type EffectiveCharge } from './effective-charge';
import { absolute, compare, decimal, divide, multiply, subtract, whole, zero, type Exact } from './exact';
import { effectiveNumber, electronegativity, energyEv, energyKjMol, KJ_PER_MOL, radiusPm, type Followed } from './quantities';
import { refused, type Result } from './result';
import { targetOf, type Target } from './target';
import type { AskedInput } from './work';

const fromCharge = ['energy-ev', 'energy-kj-mol', 'radius-pm', 'electronegativity', 'difference'] as const;

/** What can be worked again from a value of each quantity, of the same electron under the same convention. Ours, no source. */
const carriedOn: Readonly<Record<string, readonly string[]>> = {
  zeff: ['sigma', ...fromCharge],
  sigma: ['zeff', ...fromCharge],
  'energy-ev': ['energy-kj-mol'],
  'energy-kj-mol': ['energy-ev'],
};

/** Whether a value of one quantity can be carried on to another: Z_eff to an energy, and not an energy to Z_eff, whose sign it lost. */
export const canCarryOn = (from: string, to: string): boolean => carriedOn[from]?.includes(to) ?? false;

/** A candidate's own value of an earlier quantity, in the unit of that quantity. */
export interface OwnValue {
  readonly quantity: string;
  readonly value: Exact;
}

/** Questions never change, and most are asked of every candidate: what one comes to is kept as long as the question is. */
const targets = new WeakMap<AskedInput, Result<Target>>();
const charges = new WeakMap<AskedInput, Result<EffectiveCharge>>();

function kept<T>(known: WeakMap<AskedInput, T>, asked: AskedInput, work: () => T): T {
  const found = known.get(asked);
  if (found !== undefined) return found;
  const fresh = work();
  known.set(asked, fresh);
  return fresh;
}

const targetKnown = (asked: AskedInput): Result<Target> => kept(targets, asked, () => targetOf(asked));

/** Z_eff by an own value of Z_eff or sigma; null where no atom has it: below 0 or above Z. Our rule for "impossible", no source. */
function ownCharge({ species }: Target, { quantity, value }: OwnValue): Exact | null {
  const nuclear = whole(species.element.number);
  const zeff = quantity === 'sigma' ? subtract(nuclear, value) : value;
  return compare(zeff, zero) < 0 || compare(zeff, nuclear) > 0 ? null : zeff;
}

/** An energy from the other unit, in size at most that of the bare nucleus, -13.605693 eV x (Z/n*)^2. */
function ownEnergy({ species, electron }: Target, { quantity, value }: OwnValue): Exact | null {
  const number = effectiveNumber(electron.n);
  if (!number.ok) return null;
  const inEv = quantity === 'energy-ev' ? value : divide(value, KJ_PER_MOL);
  const bare = divide(whole(species.element.number), decimal(number.value));
  if (compare(absolute(inEv), multiply(RYDBERG_EV, multiply(bare, bare))) > 0) return null;
  return quantity === 'energy-ev' ? multiply(value, KJ_PER_MOL) : inEv;
}

function followedFrom(asked: AskedInput, target: Target, effective: EffectiveCharge): Result<Followed> {
  const { quantity, convention } = asked;
  if (!isSlater(convention)) return refused('outside-quantity', 'Such a quantity is worked out from Slater’s rules only.');
  if (quantity === 'energy-ev') return energyEv(target, effective);
  if (quantity === 'energy-kj-mol') return energyKjMol(target, effective);
  if (quantity === 'radius-pm') return radiusPm(target, effective);
  return electronegativity(target, effective, convention, asked);
}

/**
 * The value that a question has when it is worked on from the candidate's own value of an earlier one, in the unit of the
 * question; null where the own value is impossible or does not lead there. Error carried forward: common practice, no source;
 * the formulas are those of `work`. Own Z_eff 5.75 of Cl 3p gives sigma 17 - 5.75 = 11.25.
 */
export function carriedValue(asked: AskedInput, own: OwnValue, second: OwnValue | null = null): Exact | null {
  if (!canCarryOn(own.quantity, asked.quantity)) return null;
  const target = targetKnown(asked);
  if (!target.ok) return null;
  if (own.quantity.startsWith('energy')) return ownEnergy(target.value, own);
  const zeff = ownCharge(target.value, own);
  if (zeff === null) return null;
  if (asked.quantity === 'zeff') return zeff;
  if (asked.quantity === 'sigma') return subtract(whole(target.value.species.element.number), zeff);
  if (asked.quantity === 'difference') return ownDifference(asked, zeff, second);
  const { convention } = asked;
  const effective = isSlater(convention) ? kept(charges, asked, () => effectiveCharge(target.value, convention)) : null;
  if (!effective?.ok) return null;
  const followed = followedFrom(asked, target.value, { ...effective.value, zeff });
  return followed.ok ? followed.value.value : null;
}

/** Where only the first electron's value is carried on, the second is worked by the rules. */
function ownDifference({ other, convention }: AskedInput, first: Exact, second: OwnValue | null): Exact | null {
  const target = other ? targetOf(other) : null;
  if (!target?.ok) return null;
  if (second !== null) {
    const own = ownCharge(target.value, second);
    return own === null ? null : subtract(first, own);
  }
  const worked = isComputed(convention) ? effectiveCharge(target.value, convention) : null;
  return worked?.ok ? subtract(first, worked.value.zeff) : null;
}
