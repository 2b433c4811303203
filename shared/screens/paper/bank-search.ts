import type { BankItem } from '../../contracts/item-bank';

/** Items whose label or question holds every word that was typed, without regard to case. */
export function bankItemsFound(items: readonly BankItem[], find: string): readonly BankItem[] {
  const wanted = find.trim().toLowerCase().split(/\s+/).filter((word) => word !== '');
  return items.filter(({ label, prompt }) => wanted.every((word) => `${label} ${prompt}`.toLowerCase().includes(word)));
}
