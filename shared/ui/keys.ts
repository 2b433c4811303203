/** How letters are used: as commands, only together with Alt, or not at all. */
export type LetterKeys = 'on' | 'alt' | 'off';

export interface KeyPress {
  readonly key: string;
  /** The place on the keyboard, such as `KeyB`: with Alt some systems give another character for the key. */
  readonly code?: string;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly altKey: boolean;
  readonly shiftKey: boolean;
  readonly isComposing: boolean;
}

/** What has the focus: nothing that types, a field of commands, any other field, or a list that reads letters itself. */
export type KeyPlace = { readonly kind: 'elsewhere' } | { readonly kind: 'commands'; readonly isEmpty: boolean } | { readonly kind: 'field' };

const isCharacter = (key: string): boolean => [...key].length === 1;
const isLetter = (key: string): boolean => /^[a-z]$/i.test(key);

/**
 * The name a key press has in a map of commands, or null where it belongs to the field or the browser.
 * Letters are upper case, with Shift they are `Shift+Z`; other keys keep their own name, such as `Enter` or `/`.
 */
export function commandOf(press: KeyPress, place: KeyPlace, letters: LetterKeys = 'on'): string | null {
  if (press.ctrlKey || press.metaKey || press.isComposing) return null;
  const typed = press.altKey && /^Key[A-Z]$/.test(press.code ?? '') ? (press.code ?? '').slice(3) : press.key;
  if (!isCharacter(typed)) {
    if (press.altKey) return null;
    if (place.kind === 'field' && typed !== 'Escape') return null;
    return press.shiftKey && typed !== 'Shift' ? `Shift+${typed}` : typed;
  }
  if (place.kind === 'field' || (place.kind === 'commands' && !place.isEmpty)) return null;
  if (!isLetter(typed)) return press.altKey ? null : typed;
  if (letters === 'off' || press.altKey !== (letters === 'alt')) return null;
  const letter = typed.toUpperCase();
  return press.shiftKey ? `Shift+${letter}` : letter;
}
