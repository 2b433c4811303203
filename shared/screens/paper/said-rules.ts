import type { ItemView } from '../../contracts/items';
import { electronLabel } from '../../marking/item-label';
import { numbersFollowed } from './chain-of';
import { words } from './words';

const w = words.said;

/** One thing that an item asks for or decides, by name. */
export type Said = readonly [name: string, text: string];

/** What an item asks for, in words. */
export function askedInWords({ draft, worked }: ItemView): Said[] {
  const { kind, asked, printed } = draft;
  const convention: Said = [words.asked.convention, words.asked.conventions[asked.convention]];
  if (kind !== 'numeric' && printed) {
    return [[words.kind, `${words.kinds[kind]}, ${words.questions[printed.question]}`], [words.asked.quantity, words.asked.quantityNames[asked.quantity]], convention];
  }
  const precision: Said = worked.key?.figures ? [words.asked.figures, words.counts.figuresOf(draft.figures)] : [words.asked.decimals, words.counts.decimalsOf(worked.key?.decimals ?? draft.decimals)];
  if (asked.convention === 'typed') return [[w.asks, worked.label], convention, ...(worked.unit === '' ? [] : [[words.typed.unit, worked.unit] as const]), precision];
  const starred = [asked, ...(asked.other ? [asked.other] : [])].filter(({ configuration = '' }) => configuration.trim() !== '');
  return [
    [words.asked.quantity, words.asked.quantityNames[asked.quantity]],
    convention,
    [words.asked.element, worked.label],
    ...starred.map((electron): Said => [electronLabel(electron), electron.configuration ?? '']),
    precision,
  ];
}

/** Rules that rest on more than the value, in words; a line only where the item has them. */
export function rulesInWords(item: ItemView, items: readonly ItemView[]): Said[] {
  const { draft, worked } = item;
  const follows = numbersFollowed(items, item).map((number) => `item ${number}`).join(' and ');
  return [
    ...(draft.followThrough ? [[words.follow.title, `${words.follow.said(follows, draft.followThrough.isTrivial)}.`] as const] : []),
    ...(worked.units.length > 0 ? [[words.typed.unit, words.costs.units(worked.units)] as const] : []),
    ...(draft.unitCost === null ? [] : [[w.unitCost, words.costs.saidUnit(draft.unitCost)] as const]),
    ...(draft.signCost === null ? [] : [[w.signCost, words.costs.saidSign(draft.signCost)] as const]),
    [words.counts.crossedOut, words.counts.policies[draft.crossedOut]],
    [words.counts.twoAnswers, words.counts.policies[draft.twoAnswers]],
  ];
}
