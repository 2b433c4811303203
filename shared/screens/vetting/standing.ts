import type { VettingItem } from '../../contracts/vetting';

export type Standing = 'signed' | 'sent-back' | 'worked' | 'to-work';

/** How an item stands: the newest signature or return of its scheme decides; without one, whether its key was worked. */
export function standingOf({ vettings, mine }: Pick<VettingItem, 'vettings' | 'mine'>): Standing {
  return vettings[0]?.outcome ?? (mine === null ? 'to-work' : 'worked');
}

/** The next item after one that is not signed yet, going round; null when all are. */
export function nextUnsigned(items: readonly VettingItem[], after: string): VettingItem | null {
  const at = items.findIndex(({ itemId }) => itemId === after);
  const inOrder = [...items.slice(at + 1), ...items.slice(0, Math.max(0, at))];
  return inOrder.find((item) => standingOf(item) !== 'signed') ?? null;
}
