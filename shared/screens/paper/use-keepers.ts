import { useCallback, useEffect, useRef, useSyncExternalStore } from 'react';
import { useSaveItem } from '../../client/items';
import type { ItemView } from '../../contracts/items';
import { createDraftKeeper, type DraftKeeper, type KeptDraft } from './draft-keeper';

/** Keepers outlive a look at another screen, with their history and what could not be stored. */
const keepers = new Map<string, DraftKeeper>();

/** The keeper of an item's draft, one an item as long as the page is open. */
export function useKeeper(sittingId: string, item: ItemView): DraftKeeper {
  const { mutateAsync } = useSaveItem(sittingId);
  const save = useRef(mutateAsync);
  useEffect(() => void (save.current = mutateAsync), [mutateAsync]);

  const keeper = keepers.get(item.id) ?? createDraftKeeper(item, {
    save: (itemId, rev, draft) => save.current({ itemId, rev, draft }),
    now: () => Date.now(),
    later: (work, ms) => setTimeout(work, ms),
    cancel: (timer) => clearTimeout(timer as ReturnType<typeof setTimeout>),
  });
  keepers.set(item.id, keeper);

  useEffect(() => keeper.receive(item), [keeper, item]);
  useEffect(() => {
    const warn = (event: BeforeUnloadEvent) => {
      keeper.flush();
      if (keeper.isUnsaved()) event.preventDefault();
    };
    window.addEventListener('beforeunload', warn);
    return () => {
      window.removeEventListener('beforeunload', warn);
      keeper.flush();
    };
  }, [keeper]);
  return keeper;
}

export function useKept(keeper: DraftKeeper): KeptDraft {
  const subscribe = useCallback((changed: () => void) => keeper.subscribe(changed), [keeper]);
  return useSyncExternalStore(subscribe, keeper.get);
}

export const forgetKeeper = (itemId: string): void => void keepers.delete(itemId);
