import { completeScheme } from './complete-scheme';
import type { ItemScheme, MarkingContext } from './scheme';

/** What is known of one candidate's paper when one of its answers is marked. */
export interface PaperFacts {
  /** The settled form of the item followed from; null while it is held or unread. */
  readonly followed: string | null;
  readonly second: string | null;
  /** Whether an earlier item in paper order has paid for a unit, for a sign. */
  readonly isUnitCharged: boolean;
  readonly isSignCharged: boolean;
  /** Ids of the method marks struck. */
  readonly struck: readonly string[];
}

export const noFacts: PaperFacts = { followed: null, second: null, isUnitCharged: false, isSignCharged: false, struck: [] };

/** All codes are alike to the item that follows: none has a value. */
const valueOrNone = (canonical: string): string => (canonical.startsWith('@') ? '@' : canonical);

/**
 * What of a paper the verdict on one item rests on, and no more: facts the scheme has no use for are left out, so that equal
 * readings stay in one pile. Ours, no source. For an item without links, rules and method marks it is empty.
 */
export function contextFor(scheme: ItemScheme, facts: PaperFacts): MarkingContext {
  const { followThrough, unitRule, signRule, methodMarks } = completeScheme(scheme);
  const link = followThrough?.isTrivial === false ? followThrough : null;
  const struck = methodMarks.filter(({ id }) => facts.struck.includes(id)).map(({ id }) => id);
  return {
    ...(link && facts.followed !== null ? { followed: valueOrNone(facts.followed) } : {}),
    ...(link?.second && facts.second !== null ? { second: valueOrNone(facts.second) } : {}),
    ...(unitRule && facts.isUnitCharged ? { unit: 'charged' as const } : {}),
    ...(signRule && facts.isSignCharged ? { sign: 'charged' as const } : {}),
    ...(struck.length > 0 ? { method: struck.join(',') } : {}),
  };
}

/**
 * The context of a verdict as one text: the same for two contexts exactly when their entries are, empty for an empty one.
 * Ours, no source. contextKey({ followed: '10.55' }) is '[["followed","10.55"]]'.
 */
export function contextKey(context: MarkingContext): string {
  const entries = Object.entries(context).filter(([, value]) => value !== undefined);
  return entries.length === 0 ? '' : JSON.stringify(entries.sort(([one], [other]) => (one < other ? -1 : 1)));
}
