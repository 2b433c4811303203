export interface OptionMark {
  readonly number: number;
  readonly text: string;
  readonly x: number;
  /** Where its number and value are written: beside each other even where the values are close. */
  readonly labelX: number;
  /** A second row where there is no room in the first. */
  readonly row: 0 | 1;
}

const margin = 30;
const room = 56;

/** Where the values of options stand on a line of some width; an option without a value has no place. */
export function optionMarks(values: readonly (string | null)[], width: number): OptionMark[] {
  const known = values.flatMap((text, index) => (text === null ? [] : [{ number: index + 1, text, at: Number(text.replace('−', '-')) }])).sort((one, other) => one.at - other.at);
  if (known.length === 0 || width <= 2 * margin) return [];
  const [lo, hi] = [known[0]?.at ?? 0, known.at(-1)?.at ?? 0];
  const scale = hi > lo ? (width - 2 * margin) / (hi - lo) : 0;
  const last = [-Infinity, -Infinity];
  return known.map(({ number, text, at }) => {
    const x = hi > lo ? margin + (at - lo) * scale : width / 2;
    const row = x - (last[0] ?? 0) >= room || (last[0] ?? 0) <= (last[1] ?? 0) ? 0 : 1;
    const labelX = Math.max(x, (last[row] ?? 0) + room);
    last[row] = labelX;
    return { number, text, x, labelX: Math.min(labelX, width - margin), row };
  });
}
