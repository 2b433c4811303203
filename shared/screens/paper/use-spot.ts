import { useState } from 'react';
import { ApiError } from '../../client/api';
import { useSpotTest } from '../../client/items';
import type { ItemDraft, SpotTestResult } from '../../contracts/items';
import { useSettled } from '../use-settled';

/** What a mark may rest on besides the value: own values as typed, and ids of method marks. */
export interface Beside {
  readonly followed: string;
  readonly second: string;
  readonly method: readonly string[];
}

export interface Spot {
  readonly text: string;
  readonly setText: (text: string) => void;
  readonly beside: Beside;
  readonly setBeside: (beside: Beside) => void;
  /** Null while nothing is typed. */
  readonly result: SpotTestResult | null;
  /** Why nothing can be tried: the draft is not whole. */
  readonly refusal: string | null;
  /** Sentences about what stands beside the value, by field. */
  readonly problems: Readonly<Record<string, string>>;
  readonly drop: { readonly at: number; readonly text: string } | null;
}

const stillMs = 120;
const nothingBeside: Beside = { followed: '', second: '', method: [] };

/** The typed value and what the server says of it; `draft` is what is not stored yet, null where the stored item is the one to try. */
export function useSpot(itemId: string, draft: ItemDraft | null): Spot {
  const [text, setText] = useState('');
  const [beside, setBeside] = useState(nothingBeside);
  const still = useSettled(text, stillMs);
  const stillBeside = useSettled(beside, stillMs);
  const { data, error } = useSpotTest(itemId, { text: still, beside: stillBeside, draft });
  const result = text === '' || still === '' || error ? null : (data ?? null);
  const at = result?.value ?? null;
  const problems = error instanceof ApiError ? error.fields : {};
  const isBeside = 'followed' in problems || 'second' in problems;
  return { text, setText, beside, setBeside, result, refusal: error && text !== '' && !isBeside ? error.message : null, problems, drop: at === null ? null : { at, text } };
}
