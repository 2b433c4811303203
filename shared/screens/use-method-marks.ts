import { useCallback, useState } from 'react';
import { useKeys } from '../ui/use-keys';
import type { MethodMarkRow } from './method-words';

export interface MethodDraft {
  /** Ids of those struck. */
  readonly struck: readonly string[];
  strike(id: string): void;
  /** As they stood before, or none for the next answer. */
  reset(struck: readonly string[]): void;
  /** The next figure says which mark is meant. */
  readonly isNumbering: boolean;
  begin(): void;
  end(): void;
}

/** Method marks while they are struck: by a press, or by a key and then the number of the mark; a single mark needs no number. */
export function useMethodMarks(marks: readonly MethodMarkRow[], isInDialog = false): MethodDraft {
  const [struck, setStruck] = useState<readonly string[]>([]);
  const [isNumbering, setNumbering] = useState(false);
  const end = useCallback(() => setNumbering(false), []);
  const reset = useCallback((ids: readonly string[]) => {
    setStruck(ids);
    setNumbering(false);
  }, []);
  const strike = (id: string) => {
    setStruck((before) => (before.includes(id) ? before.filter((one) => one !== id) : [...before, id]));
    setNumbering(false);
  };
  const begin = () => {
    const [first, ...others] = marks;
    if (first && others.length === 0) strike(first.id);
    else setNumbering(marks.length > 0 && !isNumbering);
  };
  useKeys(Object.fromEntries(marks.map(({ id }, index) => [String(index + 1), () => strike(id)])), { isOff: !isNumbering, isOverTyped: true, isInDialog });
  return { struck, strike, reset, isNumbering, begin, end };
}
