import type { ItemDraft, ItemProblem } from '../../../shared/contracts/items';
import type { FileItem, PaperFile } from '../../../shared/contracts/paper-file';
import type { LinkedItem } from '../../../shared/marking/links';
import type { ItemScheme } from '../../../shared/marking/scheme';
import { readDraft } from './read-draft';

/** Items of a file are named by their place in it, from 1. */
export const fileItemId = (place: number): string => String(place);

/** A draft as it stands in a file; `placeOf` tells the place of an item of the paper. */
export function fileItemOf(draft: ItemDraft, placeOf: (itemId: string) => number | null): FileItem {
  const { followThrough, ...rest } = draft;
  const from = followThrough ? placeOf(followThrough.from) : null;
  if (!followThrough || from === null) return { ...rest, followThrough: null };
  return { ...rest, followThrough: { from, second: followThrough.second === null ? null : placeOf(followThrough.second), isTrivial: followThrough.isTrivial } };
}

/** The draft of an item of a file; `idOf` tells the id that the item at a place has got. */
export function draftOfFileItem({ followThrough, ...rest }: FileItem, idOf: (place: number) => string): ItemDraft {
  if (!followThrough) return { ...rest, followThrough: null };
  const { from, second, isTrivial } = followThrough;
  return { ...rest, followThrough: { from: idOf(from), second: second === null ? null : idOf(second), isTrivial } };
}

export interface FileProblem extends ItemProblem {
  /** From 1. */
  readonly place: number;
}

/** The schemes of a file in its order, each read beside the ones before it, and what keeps any from being stored or locked. */
export function readFileItems(items: PaperFile['items']): { readonly schemes: readonly ItemScheme[]; readonly refusals: readonly FileProblem[]; readonly problems: readonly FileProblem[] } {
  const linked: LinkedItem[] = [];
  const refusals: FileProblem[] = [];
  const problems: FileProblem[] = [];
  items.forEach((item, index) => {
    const place = index + 1;
    const read = readDraft(draftOfFileItem(item, fileItemId), { items: linked, number: place });
    refusals.push(...read.refusals.map((problem) => ({ ...problem, place })));
    problems.push(...read.problems.map((problem) => ({ ...problem, place })));
    if (read.scheme) linked.push({ id: fileItemId(place), number: place, scheme: read.scheme });
  });
  return { schemes: linked.map(({ scheme }) => scheme), refusals, problems };
}
