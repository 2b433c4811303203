import { canonicalOf } from './canonical';
import { completeScheme } from './complete-scheme';
import { contextFor, contextKey } from './context';
import type { LinkedItem } from './links';
import type { Given, ItemScheme, MarkingContext, Verdict } from './scheme';
import { couldRise, markAnswer } from './verdict';

/** What stands in one candidate's paper for one item: what was settled, and the method marks struck. */
export interface SettledAnswer {
  readonly given: Given;
  readonly struck: readonly string[];
}

export interface MarkedAnswer {
  readonly verdict: Verdict;
  /** The mark could still rise once the item it follows from is settled. */
  readonly waits: boolean;
}

/** What equal inputs were worth before; the same function gives the same verdict, so looking it up changes nothing. */
export type VerdictMemo = Map<string, Verdict>;

function verdictOf(item: LinkedItem, canonical: string, given: Given, context: MarkingContext, memo: VerdictMemo | null): Verdict {
  const key = `${item.id} ${canonical} ${contextKey(context)}`;
  const known = memo?.get(key);
  if (known) return known;
  const fresh = markAnswer(item.scheme, given, context);
  memo?.set(key, fresh);
  return fresh;
}

const isCharged = (verdict: Verdict, cost: 'unitCost' | 'signCost'): boolean => Number(verdict.numbers[cost] ?? 0) > 0;

/**
 * Every verdict on one candidate's paper, items in paper order: what follows from an earlier item, and what a unit or a sign
 * costs once, included. Rests on what is settled alone, not on the order in which it came. Answers by item id; what is absent is
 * held or unread and has no verdict. Texts must be such as the grammar understands.
 */
export function markPaper(items: readonly LinkedItem[], answers: ReadonlyMap<string, SettledAnswer>, memo: VerdictMemo | null = null): Map<string, MarkedAnswer> {
  const settled = (id: string | undefined): string | null => {
    const answer = id === undefined ? undefined : answers.get(id);
    const source = items.find((item) => item.id === id);
    return answer && source ? canonicalOf(answer.given, source.scheme) : null;
  };
  const marked = new Map<string, MarkedAnswer>();
  let isUnitCharged = false;
  let isSignCharged = false;
  for (const item of items) {
    const answer = answers.get(item.id);
    const canonical = settled(item.id);
    if (!answer || canonical === null) continue;
    const link = completeScheme(item.scheme).followThrough;
    const facts = { followed: settled(link?.from), second: settled(link?.second?.from), isUnitCharged, isSignCharged, struck: answer.struck };
    const verdict = verdictOf(item, canonical, answer.given, contextFor(item.scheme, facts), memo);
    const waits = isWaiting(item.scheme, verdict, facts);
    isUnitCharged ||= !waits && isCharged(verdict, 'unitCost');
    isSignCharged ||= !waits && isCharged(verdict, 'signCost');
    marked.set(item.id, { verdict, waits });
  }
  return marked;
}

/** Whether an item it follows from is still held or unread, and the mark could rise with it. */
export function isWaiting(scheme: ItemScheme, verdict: Verdict, { followed, second }: { readonly followed: string | null; readonly second: string | null }): boolean {
  const link = completeScheme(scheme).followThrough;
  return (followed === null || (link?.second !== undefined && second === null)) && couldRise(scheme, verdict);
}
