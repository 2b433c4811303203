import { layOutLabels, placesOn, type LaidLabel } from './scale-geometry';
import type { ScaleProps, ScaleSlip } from './scale-props';
import { plainOf, type Words } from './svg-words';

/** Slips on one value stand as one diamond: their letters together, the name of the first. */
export interface SlipGroup {
  readonly at: number;
  readonly letters: string;
  readonly words: Words | null;
  readonly marks: number;
  readonly isFitting: boolean;
  readonly text: string | undefined;
}

export function groupSlips(slips: readonly ScaleSlip[]): SlipGroup[] {
  const groups = new Map<number, ScaleSlip[]>();
  for (const slip of [...slips].sort((one, other) => one.at - other.at)) groups.set(slip.at, [...(groups.get(slip.at) ?? []), slip]);
  return [...groups.entries()].map(([at, [first, ...rest]]) => {
    const all = first ? [first, ...rest] : rest;
    const letters = all.map(({ letter }) => letter).join(', ');
    const name = all.find((slip) => slip.name !== undefined)?.name;
    return {
      at,
      letters,
      words: name === undefined ? null : typeof name === 'string' ? `${letters} ${name}` : [{ text: `${letters} ` }, ...name],
      marks: Math.max(...all.map((slip) => slip.marks)),
      isFitting: all.some((slip) => slip.isFitting),
      text: first?.text,
    };
  });
}

export interface NamedSlip extends SlipGroup {
  readonly x: number;
  readonly label: LaidLabel | null;
}

export interface ScaleFrame {
  readonly width: number;
  readonly height: number;
  readonly pad: number;
  readonly perMark: number;
  /** Of the line, and of the highest mark. */
  readonly base: number;
  readonly full: number;
  readonly numerals: number;
  readonly depth: number;
  readonly nameRows: number;
  readonly slips: readonly NamedSlip[];
  readonly offSlips: readonly (SlipGroup & { readonly isHigh: boolean })[];
  place(value: number): number;
}

const fits = { phone: { perMark: 13, pad: 14 }, wide: { perMark: 19, pad: 14 }, editor: { perMark: 34, pad: 40 } } as const;
const tallest = 128;
const rowHeight = 18;
/** Of a letter at 13, for setting labels apart; drawn text is a little narrower. */
const letterWidth = 6.7;

/** Where everything of a scale stands, for a width. */
export function frameOf(props: ScaleProps, width: number): ScaleFrame {
  const { fit, of, lo, hi, slips = [], columns = [], pair } = props;
  const { perMark: wanted, pad } = fits[fit];
  const perMark = Math.min(wanted, tallest / Math.max(of, 1));
  const place = placesOn(props, width, pad);
  const groups = groupSlips(slips);
  const within = groups.filter(({ at }) => at >= lo && at <= hi);
  const offSlips = groups.filter(({ at }) => at < lo || at > hi).map((slip) => ({ ...slip, isHigh: slip.at > hi }));
  const isNamed = fit !== 'phone' && !props.isLettered;
  const named = isNamed ? within.filter(({ words }) => words !== null) : [];
  const labels = layOutLabels(
    named.map(({ at, words }) => ({ at: place(at), width: plainOf(words ?? '').length * letterWidth })),
    { from: 0, to: width },
  );
  const offRows = offSlips.length > 0 ? 1 : 0;
  const nameRows = Math.max(0, ...labels.map(({ row }) => row + 1)) + offRows;
  const top = 30 + nameRows * rowHeight + (isNamed ? 0 : 4);
  const base = top + of * perMark + 4;
  const depth = columns.some(({ count }) => count > 3) ? (fit === 'phone' ? 48 : 64) : pair ? 38 : 34;
  const numerals = base + depth + 14;
  return {
    width,
    height: numerals + 6,
    pad,
    perMark,
    base,
    full: base - of * perMark,
    numerals,
    depth,
    nameRows,
    place,
    offSlips,
    slips: within.map((slip) => ({ ...slip, x: place(slip.at), label: labels[named.indexOf(slip)] ?? null })),
  };
}

/** Of the text in a row of names; row 0 is the lowest. */
export const nameLine = ({ nameRows }: ScaleFrame, row: number): number => (nameRows - 1 - row) * rowHeight + 13;
