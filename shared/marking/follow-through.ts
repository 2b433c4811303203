import { carriedValue, type OwnValue } from '../chemistry/carried-on';
import type { Exact } from '../chemistry/exact';
import { readAnswer } from './read-answer';
import type { CompleteScheme, MarkingContext, QuantityName } from './scheme';

/** Units that an answer for a quantity may carry, that of the key first. */
export const unitsOf: Readonly<Partial<Record<QuantityName, readonly string[]>>> = {
  'energy-ev': ['eV', 'kJ/mol', 'J'],
  'energy-kj-mol': ['kJ/mol', 'J/mol', 'eV'],
  'radius-pm': ['pm', 'nm', 'Å'],
};

/** The number of a settled form; null for a code, and for a value in a unit other than the quantity's own. */
function ownValue(canonical: string | undefined, quantity: QuantityName): OwnValue | null {
  if (canonical === undefined || canonical.startsWith('@')) return null;
  const units = unitsOf[quantity] ?? [];
  const read = readAnswer(canonical, units);
  if (!read.ok || (read.unit !== null && read.unit !== units[0])) return null;
  return { quantity, value: read.value };
}

/**
 * The key of an item worked again from the candidate's own settled value of an earlier one; null where nothing is carried on.
 * Error carried forward: common practice, no source. Sigma of Cl 3p after a Z_eff of 5.75 is 11.25.
 */
export function carriedKey({ asked, followThrough }: CompleteScheme, context: MarkingContext): Exact | null {
  if (!followThrough || followThrough.isTrivial) return null;
  const own = ownValue(context.followed, followThrough.quantity);
  if (own === null) return null;
  if (!followThrough.second) return carriedValue(asked, own);
  const second = ownValue(context.second, followThrough.second.quantity);
  return second === null ? null : carriedValue(asked, own, second);
}
