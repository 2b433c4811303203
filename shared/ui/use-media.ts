import { useCallback, useSyncExternalStore } from 'react';

/** Whether a media query holds now; `otherwise` where nothing can be asked. */
export function useMedia(query: string, otherwise: boolean): boolean {
  const subscribe = useCallback(
    (changed: () => void) => {
      const list = globalThis.matchMedia?.(query);
      list?.addEventListener('change', changed);
      return () => list?.removeEventListener('change', changed);
    },
    [query],
  );
  return useSyncExternalStore(subscribe, () => globalThis.matchMedia?.(query).matches ?? otherwise);
}
