/** From how many on a figure may be interpreted. Ours, common practice, no source. */
export const LEAST_INTERPRETED = 30;

/** A figure with what it rests on: without variation there is none, and on too few it is shown and not to be interpreted. */
export type Figure =
  | { readonly state: 'value'; readonly n: number; readonly value: number }
  | { readonly state: 'too few'; readonly n: number; readonly value: number | null }
  | { readonly state: 'no variation'; readonly n: number; readonly value: null };

/** The figure of a value, null where there was no variation. Ours, no source: 0.5 on 29 is "too few", null on 40 "no variation". */
export function figure(n: number, value: number | null): Figure {
  if (value === null) return n === 0 ? { state: 'too few', n, value } : { state: 'no variation', n, value };
  return n < LEAST_INTERPRETED ? { state: 'too few', n, value } : { state: 'value', n, value };
}
