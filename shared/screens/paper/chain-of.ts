import type { ItemDraft } from '../../contracts/items';

/** An item as far as links go. */
export interface Linked {
  readonly id: string;
  readonly number: number;
  readonly draft: Pick<ItemDraft, 'followThrough'>;
}

export interface ChainLink {
  readonly from: string;
  readonly to: string;
  /** Shown, and not carried on. */
  readonly isTrivial: boolean;
}

/** The ids an item follows, the first leg first. */
export const followsOf = ({ draft: { followThrough } }: Pick<Linked, 'draft'>): string[] => (followThrough ? [followThrough.from, ...(followThrough.second === null ? [] : [followThrough.second])] : []);

/** The links between items of the paper that are there. */
export function linksOf(items: readonly Linked[]): ChainLink[] {
  const there = new Set(items.map(({ id }) => id));
  return items.flatMap((item) => [...new Set(followsOf(item))].filter((from) => there.has(from)).map((from) => ({ from, to: item.id, isTrivial: item.draft.followThrough?.isTrivial ?? false })));
}

/** All items that hang together with one by links, in paper order; it alone where nothing is linked. */
export function chainOf<Item extends Linked>(items: readonly Item[], id: string): { readonly items: readonly Item[]; readonly links: readonly ChainLink[] } {
  const links = linksOf(items);
  const found = new Set([id]);
  for (let before = 0; before < found.size; ) {
    before = found.size;
    for (const { from, to } of links) {
      if (found.has(from)) found.add(to);
      else if (found.has(to)) found.add(from);
    }
  }
  return { items: items.filter((item) => found.has(item.id)).sort((one, other) => one.number - other.number), links: links.filter(({ from }) => found.has(from)) };
}

/** The numbers of the items that one follows, in paper order. */
export function numbersFollowed(items: readonly Linked[], item: Pick<Linked, 'draft'>): number[] {
  const follows = new Set(followsOf(item));
  return items.filter(({ id }) => follows.has(id)).map(({ number }) => number).sort((one, other) => one - other);
}
