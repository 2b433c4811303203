import { useMedia } from './use-media';

/** Whether this device has a mouse or trackpad, and so most likely a keyboard. */
export const useHasKeyboard = (): boolean => useMedia('(any-hover: hover) and (any-pointer: fine)', true);
