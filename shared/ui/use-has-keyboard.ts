import { useSyncExternalStore } from 'react';

const finePointer = () => globalThis.matchMedia?.('(any-hover: hover) and (any-pointer: fine)');

function subscribe(changed: () => void): () => void {
  const query = finePointer();
  query?.addEventListener('change', changed);
  return () => query?.removeEventListener('change', changed);
}

/** Whether this device has a mouse or trackpad, and so most likely a keyboard. */
export const useHasKeyboard = (): boolean => useSyncExternalStore(subscribe, () => finePointer()?.matches ?? true);
