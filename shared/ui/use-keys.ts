import { useEffect, useRef } from 'react';
import { usePreference } from './preferences';
import { commandOf, type KeyPlace, type LetterKeys } from './keys';

export type KeyMap = Readonly<Record<string, (press: KeyboardEvent) => void>>;

interface KeyOptions {
  /** As the person prefers, unless a screen says otherwise. */
  readonly letters?: LetterKeys;
  readonly isOff?: boolean;
  /** The commands belong to the dialog that is open; otherwise an open dialog silences them. */
  readonly isInDialog?: boolean;
  /** The next key is a command whatever the field of commands holds: the second of two that belong together. */
  readonly isOverTyped?: boolean;
}

function placeOf(target: EventTarget | null): KeyPlace {
  if (!(target instanceof HTMLElement)) return { kind: 'elsewhere' };
  const isText = target instanceof HTMLTextAreaElement || (target instanceof HTMLInputElement && !['checkbox', 'radio', 'button', 'range', 'file'].includes(target.type));
  if (isText && target.dataset['commands'] === 'while-empty') return { kind: 'commands', isEmpty: target.value === '' };
  if (isText || target instanceof HTMLSelectElement || target.isContentEditable) return { kind: 'field' };
  return { kind: 'elsewhere' };
}

/** Enter and Space belong to the control that has the focus, and arrows to a group of choices or tabs. */
function isForControl(target: EventTarget | null, command: string): boolean {
  if (!(target instanceof HTMLElement)) return false;
  if (command === 'Enter' || command === ' ') return target.closest('a[href], button, summary, [role="button"], [role="radio"], [role="checkbox"], [role="tab"], [role="menuitem"]') !== null;
  return command.startsWith('Arrow') && target.closest('[role="radiogroup"], [role="tablist"], [role="menu"]') !== null;
}

/**
 * Keys that act on the whole screen: a map from the key's name (`B`, `Shift+Z`, `Enter`, `PageUp`, `/`, `?`) to what it does.
 * A field marked with `takesCommands` gives up its letters while it is empty; every other field keeps them.
 */
export function useKeys(map: KeyMap, { letters: asked, isOff = false, isInDialog = false, isOverTyped = false }: KeyOptions = {}): void {
  const [preferred] = usePreference('letters');
  const letters = asked ?? preferred;
  const latest = useRef(map);
  useEffect(() => {
    latest.current = map;
  });
  useEffect(() => {
    if (isOff) return undefined;
    const hear = (event: KeyboardEvent) => {
      const isUnderDialog = document.querySelector('dialog[open]') !== null;
      if (event.defaultPrevented || isUnderDialog !== isInDialog || document.querySelector(':popover-open')) return;
      const place = placeOf(event.target);
      const command = commandOf(event, isOverTyped && place.kind === 'commands' ? { ...place, isEmpty: true } : place, letters);
      if (command === null || isForControl(event.target, command)) return;
      const act = latest.current[command];
      if (!act) return;
      event.preventDefault();
      event.stopPropagation();
      act(event);
    };
    // NOTE text fields of React Native for the web keep their key presses to themselves, so the window listens on the way down.
    window.addEventListener('keydown', hear, true);
    return () => window.removeEventListener('keydown', hear, true);
  }, [letters, isOff, isInDialog, isOverTyped]);
}
