/** A text kept in this browser, or null where there is none or keeping is forbidden. */
export function readStored(name: string): string | null {
  try {
    return globalThis.localStorage?.getItem(name) ?? null;
  } catch {
    return null;
  }
}

export function store(name: string, text: string): void {
  try {
    globalThis.localStorage?.setItem(name, text);
  } catch {
    // Private windows may forbid it; the choice then lasts as long as the page.
  }
}
