import { computedConventions } from './conventions';
import type { ComputedConvention } from './conventions';
import { equals } from './exact';
import type { Exact } from './exact';
import { work } from './work';
import type { AskedInput } from './work';

/** The same question under another convention. */
export interface ConventionValue {
  readonly convention: ComputedConvention;
  readonly name: string;
  readonly value: Exact;
  readonly text: string;
  readonly decimals: number;
}

/**
 * What the other conventions make of an item, where they cover it and differ. Sources: see computedConventions.
 * Cl 3p by Slater's rules is 6.10; core count 7.00, screening constants 6.1161, ionisation energy 2.929.
 */
export function valuesByOtherConventions(asked: AskedInput): readonly ConventionValue[] {
  const own = work(asked);
  const names = Object.keys(computedConventions).filter((name): name is ComputedConvention => Object.hasOwn(computedConventions, name));
  return names.flatMap((convention) => {
    const other = convention === asked.convention ? null : work({ ...asked, convention });
    if (!other?.ok || (own.ok && equals(own.value.value, other.value.value))) return [];
    const { value, text, decimals } = other.value;
    return [{ convention, name: computedConventions[convention].name, value, text, decimals }];
  });
}
