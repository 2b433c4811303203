import { useMemo } from 'react';
import { useWorkedDraft } from '../../client/items';
import type { ItemDraft, ItemView, WorkedDraft } from '../../contracts/items';
import { useSettled } from '../use-settled';

const stillMs = 150;

/** What the server makes of the draft as it stands: what is stored already, or worked anew a moment after the last edit. */
export function useWorked(item: ItemView, draft: ItemDraft): WorkedDraft {
  const text = useSettled(JSON.stringify(draft), stillMs);
  const still = useMemo(() => JSON.parse(text) as ItemDraft, [text]);
  const isStored = text === JSON.stringify(item.draft);
  const { data } = useWorkedDraft({ sittingId: item.sittingId, itemId: item.id, number: item.number }, still, !isStored);
  return isStored ? item.worked : (data ?? item.worked);
}
