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
