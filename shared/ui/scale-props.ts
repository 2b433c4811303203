import type { ScaleBand, ScaleColumn } from './scale-geometry';
import { plainOf, type Words } from './svg-words';

export interface ScaleMark {
  readonly at: number;
  readonly label: string;
}

export interface ScaleSlip {
  readonly at: number;
  readonly letter: string;
  readonly name?: Words | undefined;
  /** As written, for one that lies beyond the ends. */
  readonly text?: string | undefined;
  readonly marks: number;
  /** The value in hand fits it. */
  readonly isFitting?: boolean | undefined;
}

export interface ScalePair {
  readonly first: number;
  readonly second: number;
  /** Such as `0.60 apart`. */
  readonly gap: string;
}

export interface ScaleProps {
  /** phone: 13 a mark, letters; wide: 19, names; editor: 34, names and the levels of the marks. */
  readonly fit: 'phone' | 'wide' | 'editor';
  readonly lo: number;
  readonly hi: number;
  readonly major: number;
  readonly minor: number;
  readonly decimals: number;
  /** Marks of the whole. */
  readonly of: number;
  readonly keyAt: number;
  /** Such as `key 6.10, rounded 6.1`. */
  readonly keyText: string;
  readonly roundings?: readonly ScaleMark[] | undefined;
  readonly alternatives?: readonly (ScaleMark & { readonly marks: number })[] | undefined;
  readonly bands?: readonly ScaleBand[] | undefined;
  readonly slips?: readonly ScaleSlip[] | undefined;
  /** Letters only, whatever the fit. */
  readonly isLettered?: boolean | undefined;
  /** Readings with their counts: beads for a few, columns for many. */
  readonly columns?: readonly ScaleColumn[] | undefined;
  readonly pair?: ScalePair | undefined;
  /** The value being typed. */
  readonly drop?: number | null | undefined;
  readonly dropText?: string | undefined;
}

const trimmed = (value: number, places = 2): number => Number(value.toFixed(places));
const marks = (count: number): string => `${trimmed(count)} ${count === 1 ? 'mark' : 'marks'}`;

/** A scale in words, for those who do not see the drawing. */
export function spokenScale({ keyText, of, bands = [], roundings = [], alternatives = [], slips = [], columns = [], pair, drop, dropText, decimals }: ScaleProps): string {
  return [
    `${keyText}, ${marks(of)}`,
    ...roundings.map(({ label }) => `accepted rounding ${label}`),
    ...alternatives.map(({ label, marks: given }) => `accepted ${label}, ${marks(given)}`),
    ...bands.map(({ name, from, to, marks: given }) => `band ${name}, ${trimmed(from, 6)} to ${trimmed(to, 6)}, ${marks(given)}`),
    ...slips.map(({ letter, name, text, at, marks: given }) => `slip ${letter}${name === undefined ? '' : ` ${plainOf(name)}`}, ${text ?? at.toFixed(decimals)}, ${marks(given)}`),
    ...columns.map(({ at, count }) => `${count} at ${trimmed(at, 6)}`),
    ...(pair ? [`readings ${trimmed(pair.first, 6)} and ${trimmed(pair.second, 6)}, ${pair.gap}`] : []),
    ...(drop === null || drop === undefined ? [] : [`value ${dropText || String(drop)}`]),
  ].join('. ');
}
