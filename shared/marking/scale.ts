import { exactDecimals, fromFractionText, toApproximate, toDecimals } from '../chemistry/exact';
import { bandRange } from './bands';
import { roundings } from './rounding';
import type { ItemScheme } from './scheme';

/** What the scale draws. Plain numbers, for drawing only; they decide nothing. */
export interface ScaleData {
  readonly lo: number;
  readonly hi: number;
  /** Steps of the graduations, and the decimals of their numerals. */
  readonly major: number;
  readonly minor: number;
  readonly decimals: number;
  readonly maxGrains: number;
  readonly key: { readonly at: number; readonly label: string };
  /** Accepted roundings that stand apart from the key. */
  readonly roundings: readonly { readonly at: number; readonly label: string }[];
  readonly alternatives: readonly { readonly at: number; readonly label: string; readonly grains: number }[];
  readonly bands: readonly { readonly name: string; readonly from: number; readonly to: number; readonly grains: number }[];
  /** Named slips; those that share a value share a diamond. */
  readonly slips: readonly { readonly at: number; readonly letter: string; readonly name: string; readonly text: string; readonly grains: number }[];
}

const graduations = [
  { upTo: 4, major: 0.5, minor: 0.1, decimals: 1 },
  { upTo: 8, major: 1, minor: 0.2, decimals: 0 },
  { upTo: 20, major: 2, minor: 0.5, decimals: 0 },
  { upTo: 50, major: 5, minor: 1, decimals: 0 },
  { upTo: 120, major: 10, minor: 2, decimals: 0 },
];

function graduationFor(width: number): { major: number; minor: number; decimals: number } {
  const known = graduations.find(({ upTo }) => width <= upTo);
  if (known) return known;
  const major = 10 ** Math.ceil(Math.log10(width / 10));
  return { major, minor: major / 5, decimals: 0 };
}

/** The accepted roundings of the key that are other values than the key; both neighbours on a tie. */
function roundingsApart(scheme: ItemScheme): { at: number; label: string }[] {
  const { downToDecimals } = scheme.roundings;
  if (downToDecimals === null) return [];
  const key = fromFractionText(scheme.key.value);
  const found = new Map<string, number>();
  for (let places = downToDecimals; places < scheme.key.decimals; places += 1) {
    for (const value of roundings(key, places)) if (value.n !== key.n || value.d !== key.d) found.set(toDecimals(value, places), toApproximate(value));
  }
  return [...found].map(([label, at]) => ({ at, label }));
}

/** Binary floats put a limit that is on a line just beside it. */
const nearly = 1e-9;

/** Limits, graduations, key, roundings, alternatives and bands of an item. */
export function scaleOf(scheme: ItemScheme): ScaleData {
  const key = fromFractionText(scheme.key.value);
  const at = toApproximate(key);
  const bands = scheme.bands.map((band) => {
    const { from, to } = bandRange(band, key);
    return { name: band.name, from: toApproximate(from), to: toApproximate(to), grains: band.grains };
  });
  const alternatives = scheme.alternatives.map((one) => ({ at: toApproximate(fromFractionText(one.value)), label: one.text, grains: one.grains }));
  const apart = roundingsApart(scheme);
  const slips = (scheme.slips ?? []).map(({ letter, name, value, text, grains }) => ({ at: toApproximate(fromFractionText(value)), letter, name, text, grains }));
  const reach = [...bands.flatMap(({ from, to }) => [from, to]), ...alternatives.map((one) => one.at), ...apart.map((one) => one.at)];
  const farthest = Math.max(1.2, ...reach.map((value) => Math.abs(value - at) * 1.15));
  const { major, minor, decimals } = graduationFor(2 * farthest);
  const lo = Math.floor((at - farthest) / minor + nearly) * minor;
  const hi = Math.ceil((at + farthest) / minor - nearly) * minor;
  const places = Math.max(scheme.key.decimals, Math.min(6, exactDecimals(key) ?? 0));
  return { lo, hi, major, minor, decimals, maxGrains: scheme.maxGrains, key: { at, label: toDecimals(key, places) }, roundings: apart, alternatives, bands, slips };
}
