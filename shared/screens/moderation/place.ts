import type { LedgerChip } from '../../contracts/enums';
import { heldStates } from '../../contracts/enums';
import { nextHeld } from './question';

/** The row that is looked at: where it stood last, and which answer it is. */
export interface Place {
  readonly at: number;
  /** Null until the row has come. */
  readonly id: string | null;
}

type IdAt = (row: number) => string | undefined;

export const nowhere: Place = { at: -1, id: null };

/** How far from its old row an answer is looked for. */
const reach = 200;

/** The list moves when others rule: the place follows its answer, and the same place comes back where nothing has moved. */
export function settledPlace(place: Place, idAt: IdAt): Place {
  if (place.at < 0) return place;
  const here = idAt(place.at);
  if (here === place.id) return place;
  if (place.id === null) return here === undefined ? place : { at: place.at, id: here };
  // The row may have gone too, where the list has become shorter.
  for (let away = 1; away <= reach; away += 1) {
    const found = [place.at - away, place.at + away].find((row) => row >= 0 && idAt(row) === place.id);
    if (found !== undefined) return { at: found, id: place.id };
  }
  return place;
}

/** The place one row on or back. Where the answer has left the list, the one that moved up into its row is the next. */
export function steppedPlace({ at, id }: Place, step: 1 | -1, total: number, idAt: IdAt): Place {
  const here = idAt(at);
  const hasLeft = at >= 0 && here !== undefined && here !== id;
  const to = Math.min(total - 1, Math.max(0, step === 1 && hasLeft ? at : at + step));
  return { at: to, id: idAt(to) ?? null };
}

const onlyHeld = (show: LedgerChip): boolean => show === 'to-rule' || heldStates.some((state) => state === show);

/**
 * Where a ruling leads: to the next row that waits. With none left it stays, or null where the list shows only what waits.
 * The list may be older than the last rulings: what they settled is no longer waiting.
 */
export function placeAfterRuling(place: Place, held: readonly number[], show: LedgerChip, idAt: IdAt, ruled: ReadonlySet<string> = new Set()): Place | null {
  const waits = (row: number): boolean => row !== place.at && !ruled.has(idAt(row) ?? '');
  const next = nextHeld(held.filter(waits), place.at, 1);
  if (next !== null) return { at: next, id: idAt(next) ?? null };
  return onlyHeld(show) ? null : place;
}

/** "3 of 14": which of the held rows this is; null where it is none of them. */
export function countOfHeld(held: readonly number[], at: number): string | null {
  const index = held.indexOf(at);
  return index === -1 ? null : `${(index + 1).toLocaleString('en-GB')} of ${held.length.toLocaleString('en-GB')}`;
}
