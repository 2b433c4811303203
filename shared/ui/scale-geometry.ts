export interface ScaleBand {
  readonly name: string;
  readonly from: number;
  readonly to: number;
  readonly marks: number;
}

export interface ScaleLimits {
  readonly lo: number;
  readonly hi: number;
  readonly major: number;
  readonly minor: number;
}

export interface Graduation {
  readonly at: number;
  readonly isMajor: boolean;
}

const isMultiple = (value: number, step: number): boolean => Math.abs(value / step - Math.round(value / step)) < 1e-6;

/** Every graduation between the limits, long ones at the major step. */
export function graduationsOf({ lo, hi, major, minor }: ScaleLimits): Graduation[] {
  const first = Math.ceil((lo - 1e-9) / minor);
  const last = Math.floor((hi + 1e-9) / minor);
  if (!Number.isFinite(first) || !Number.isFinite(last) || last - first > 400) return [];
  return Array.from({ length: last - first + 1 }, (_, index) => {
    const at = (first + index) * minor;
    return { at, isMajor: isMultiple(at, major) };
  });
}

/** From a value to pixels, with room at both ends. */
export const placesOn =
  ({ lo, hi }: Pick<ScaleLimits, 'lo' | 'hi'>, width: number, pad: number) =>
  (value: number): number =>
    pad + ((value - lo) / (hi - lo)) * (width - 2 * pad);

const narrowest = 5;
const hundredths = (px: number): number => Math.round(px * 100) / 100;

export interface DrawnBand {
  readonly band: ScaleBand;
  readonly left: number;
  readonly right: number;
  readonly top: number;
}

/** Bands as steps, the widest first; none is drawn narrower than five pixels. */
export function stepsOf(bands: readonly ScaleBand[], place: (value: number) => number, base: number, perMark: number): DrawnBand[] {
  return [...bands]
    .sort((one, other) => other.to - other.from - (one.to - one.from))
    .map((band) => {
      const [from, to] = [place(band.from), place(band.to)];
      const width = Math.max(to - from, narrowest);
      const middle = (from + to) / 2;
      return { band, left: hundredths(middle - width / 2), right: hundredths(middle + width / 2), top: hundredths(base - band.marks * perMark) };
    });
}

/** The one outline round all steps, up the left sides and down the right ones. */
export function outlineOf(steps: readonly DrawnBand[], base: number): string {
  const [outer] = steps;
  if (!outer) return '';
  const up = steps.map((step, index) => `V${step.top} H${steps[index + 1]?.left ?? step.right}`).join(' ');
  const down = [...steps]
    .reverse()
    .map((_step, index) => {
      const wider = steps[steps.length - 2 - index];
      return wider ? `V${wider.top} H${wider.right}` : `V${base}`;
    })
    .join(' ');
  return `M${outer.left},${base} ${up} ${down}`;
}

export interface LabelBox {
  readonly at: number;
  readonly width: number;
}

export interface LaidLabel {
  readonly row: number;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly left: number;
}

const gapBetween = 10;

/** Rows for labels over their lines: the lowest row where one fits beside those already there, leaning left or right of its line where it must. Boxes come from left to right. */
export function layOutLabels(boxes: readonly LabelBox[], limits: { readonly from: number; readonly to: number }): LaidLabel[] {
  const ends: number[] = [];
  return boxes.map(({ at, width }) => {
    const choices = (['middle', 'start', 'end'] as const)
      .map((anchor) => ({ anchor, left: anchor === 'middle' ? at - width / 2 : anchor === 'start' ? at : at - width }))
      .filter(({ left }) => left >= limits.from && left + width <= limits.to);
    const fallback = { anchor: at > (limits.from + limits.to) / 2 ? ('end' as const) : ('start' as const), left: at > (limits.from + limits.to) / 2 ? at - width : at };
    for (let row = 0; row <= ends.length; row += 1) {
      const free = ends[row] ?? -Infinity;
      const fits = (choices.length > 0 ? choices : [fallback]).find(({ left }) => left >= free + gapBetween);
      if (!fits && row < ends.length) continue;
      const laid = fits ?? fallback;
      ends[row] = laid.left + width;
      return { row, ...laid };
    }
    return { row: 0, ...fallback };
  });
}

export interface ScaleColumn {
  readonly at: number;
  readonly count: number;
}

export interface HungColumn extends ScaleColumn {
  readonly x: number;
  readonly length: number;
  readonly isCountShown: boolean;
}

const roomForCount = 26;

/** Columns as long as their counts, the longest filling the depth; a count is written from 8 up, or where no neighbour to the right is in its way. */
export function hangColumns(columns: readonly ScaleColumn[], place: (value: number) => number, depth: number): HungColumn[] {
  const most = Math.max(1, ...columns.map(({ count }) => count));
  const sorted = [...columns].sort((one, other) => one.at - other.at);
  return sorted.map((column, index) => {
    const x = place(column.at);
    const next = sorted[index + 1];
    const hasRoom = next === undefined || place(next.at) - x >= roomForCount;
    return { ...column, x, length: Math.max(6, (depth * column.count) / most), isCountShown: column.count >= 8 || hasRoom };
  });
}

/** How many readings lie below and above the scale. */
export function beyond(columns: readonly ScaleColumn[], { lo, hi }: Pick<ScaleLimits, 'lo' | 'hi'>): { low: number; high: number; within: ScaleColumn[] } {
  const total = (some: readonly ScaleColumn[]) => some.reduce((sum, { count }) => sum + count, 0);
  return {
    low: total(columns.filter(({ at }) => at < lo)),
    high: total(columns.filter(({ at }) => at > hi)),
    within: columns.filter(({ at }) => at >= lo && at <= hi),
  };
}
