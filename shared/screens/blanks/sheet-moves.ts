import type { BlankSheet, SheetPlace } from '../../client/blanks';

/** The sheet after this one: the rest of the item, then the next item in paper order; null at the end. */
export function nextPlace({ items, itemId, cursor }: Pick<BlankSheet, 'items' | 'itemId' | 'cursor'>, round: number): SheetPlace | null {
  if (itemId !== null && cursor !== null) return { item: itemId, cursor, round };
  const here = items.findIndex(({ id }) => id === itemId);
  const next = items[here + 1];
  return here === -1 || !next ? null : { item: next.id, round };
}

/** Where an arrow leads in a sheet of so many columns; it stops at the edges. Null for other keys. */
export function movedTo(key: string, from: number, { count, columns }: { readonly count: number; readonly columns: number }): number | null {
  const steps: Readonly<Record<string, number>> = { ArrowRight: 1, ArrowLeft: -1, ArrowDown: columns, ArrowUp: -columns };
  if (key === 'Home') return 0;
  if (key === 'End') return count - 1;
  const step = steps[key];
  if (step === undefined) return null;
  const to = from + step;
  return to < 0 || to >= count ? from : to;
}
