import type { RefObject } from 'react';
import type { TextInput } from 'react-native';

/**
 * A press with the mouse anywhere at the desk leaves the focus in the field, so that the next figure typed goes there and Enter
 * records. Fields, dialogs, menus and links keep the browser's own way.
 */
export const keepFocusIn = (field: RefObject<TextInput | null>) => ({
  onMouseDown: (event: { readonly target: EventTarget | null; preventDefault(): void }) => {
    if (event.target instanceof Element && event.target.closest('input, textarea, dialog, a[href], [popover]')) return;
    event.preventDefault();
    field.current?.focus();
  },
});
