import { useSyncExternalStore } from 'react';
import type { LetterKeys } from './keys';
import { readStored, store } from './stored';

interface Choices {
  /** Whether single letters are commands. */
  readonly letters: LetterKeys;
  /** Where the action keys of a phone's desk stand. */
  readonly actions: 'right' | 'left';
}

const known: { readonly [Name in keyof Choices]: readonly Choices[Name][] } = { letters: ['on', 'alt', 'off'], actions: ['right', 'left'] };
const listeners = new Set<() => void>();

const subscribe = (listener: () => void) => {
  listeners.add(listener);
  return () => listeners.delete(listener);
};

function choiceOf<Name extends keyof Choices>(name: Name): Choices[Name] {
  const text = readStored(`meniscus.${name}`);
  return known[name].find((value) => value === text) ?? (known[name][0] as Choices[Name]);
}

/** An own way of working, kept in this browser, and how to change it. */
export function usePreference<Name extends keyof Choices>(name: Name): [Choices[Name], (value: Choices[Name]) => void] {
  const read = () => choiceOf(name);
  const value = useSyncExternalStore(subscribe, read, read);
  return [
    value,
    (next) => {
      store(`meniscus.${name}`, next);
      for (const listener of listeners) listener();
    },
  ];
}
