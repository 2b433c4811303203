import type { ItemDraft } from '../../contracts/items';
import { words } from './words';

/** What an item asks for, short enough to stand beside its label: nothing for a key typed by hand. */
export const quantityShort = ({ kind, asked }: Pick<ItemDraft, 'kind' | 'asked'>): string => (kind === 'numeric' && asked.convention === 'typed' ? '' : words.quantityShort[asked.quantity]);

/** Number, quantity and label of an item, as its heading: "Item 6, Z_eff of Cl 3p", "Item 7, Z_eff: the greatest of 4". */
export function itemTitle(number: number, draft: Pick<ItemDraft, 'kind' | 'asked'>, label: string): string {
  const quantity = words.quantityOf[draft.asked.quantity];
  if (draft.kind === 'numeric' && draft.asked.convention === 'typed') return words.plainTitle(number, label === '' ? words.asked.quantities.value : label);
  return draft.kind === 'numeric' ? words.title(number, quantity, label) : words.printedTitle(number, quantity, label);
}
