import { canCarryOn } from '../chemistry/carried-on';
import { completeScheme } from './complete-scheme';
import type { Asked, AskedElectron, FollowedItem, ItemScheme } from './scheme';

/** An item of a paper, as far as others may follow from it. */
export interface LinkedItem {
  readonly id: string;
  readonly number: number;
  readonly scheme: ItemScheme;
}

const isSameElectron = (one: AskedElectron, other: AskedElectron): boolean =>
  one.symbol === other.symbol && one.charge === other.charge && one.electron === other.electron && (one.configuration ?? '').trim() === (other.configuration ?? '').trim();

export type Leg = 'first' | 'second';

/** Which electron of a question an earlier item gives a value of; null where nothing can be carried on from it. */
export function legOf(asked: Asked, { scheme }: LinkedItem): Leg | null {
  if (scheme.kind !== 'numeric' || scheme.asked.convention !== asked.convention || !canCarryOn(scheme.asked.quantity, asked.quantity)) return null;
  if (isSameElectron(scheme.asked, asked)) return 'first';
  return asked.other !== undefined && isSameElectron(scheme.asked, asked.other) ? 'second' : null;
}

/** The earlier items that a question can follow from, in paper order. */
export const sourcesOf = (asked: Asked, number: number, items: readonly LinkedItem[]): { readonly item: LinkedItem; readonly leg: Leg }[] =>
  items.flatMap((item) => {
    const leg = item.number < number ? legOf(asked, item) : null;
    return leg === null ? [] : [{ item, leg }];
  });

function legProblem(scheme: ItemScheme, number: number, link: FollowedItem, leg: Leg, items: readonly LinkedItem[]): string | null {
  const source = items.find(({ id }) => id === link.from);
  if (!source) return 'The item it follows from is no longer on the paper.';
  if (source.number >= number) return `It follows from item ${source.number}, which comes after it.`;
  if (source.scheme.asked.quantity !== link.quantity || legOf(scheme.asked, source) !== leg) return `Nothing can be carried on from item ${source.number} as it is now.`;
  return null;
}

/** What is wrong with the link of an item on its paper, in a sentence; null where nothing is. Only earlier items count, so links have no cycle. */
export function linkProblem({ number, scheme }: LinkedItem, items: readonly LinkedItem[]): string | null {
  const link = completeScheme(scheme).followThrough;
  if (!link) return null;
  return legProblem(scheme, number, link, 'first', items) ?? (link.second ? legProblem(scheme, number, link.second, 'second', items) : null);
}
