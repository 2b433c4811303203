import type { ItemDraft } from '../../shared/contracts/items';
import { completeScheme } from '../../shared/marking/complete-scheme';
import { valueGrains } from '../../shared/marking/claims';
import { marksText } from '../../shared/marking/grains';
import { leftOutOfQti, type QtiLeavesOut } from '../../shared/marking/qti-leaves-out';
import type { ItemScheme } from '../../shared/marking/scheme';
import { draftOf } from './drafts/draft-of';
import { readDraft } from './drafts/read-draft';

/** An attribute of ours, of the kind the standard leaves to whoever writes a package: `data-` and a name. From memory. */
export const carriedAttribute = 'data-meniscus-item';

export interface Carried {
  readonly draft: ItemDraft;
  readonly scheme: ItemScheme;
  readonly leftOut: readonly QtiLeavesOut[];
}

/** An item without what a package has no place for, worth what its value alone can give; null where nothing is left of it. */
export function carriedOf(stored: ItemScheme, prompt: string): Carried | null {
  const whole = draftOf(stored, prompt);
  const marks = marksText(valueGrains(completeScheme(stored)));
  const draft: ItemDraft = { ...whole, marks, followThrough: null, methodMarks: [], unitCost: null, signCost: null };
  const { scheme } = readDraft(draft);
  return scheme && { draft, scheme, leftOut: leftOutOfQti(whole) };
}
