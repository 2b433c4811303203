import { codeModules } from '../../../shared/sheets/geometry';
import { fitHomography, mapped } from './homography';
import type { PlacedCode } from './identify';
import { cornersOf } from './page-map';
import type { Grey } from './pixels';

export interface Levels {
  /** Between ink and paper, as printed black shows it. */
  readonly contrast: number;
  /** The picture knows black and white only: what was fainter than its threshold is lost. */
  readonly isBilevel: boolean;
}

const samplesOfModule = 2;
const samplesOfSide = codeModules * samplesOfModule;
/** Edges of modules leave more levels than this between the two even in a sharp picture; in one of black and white, JPEG alone leaves fewer. */
const leastBetween = 0.05;
/** A picture of black and white that was made smaller has levels between, but nothing near the two. */
const extreme = 2;
const mostAtExtremes = 0.95;

/** The pixels of a code, two by two a module, unmixed: between two pixels there would be levels that the picture has not. */
function samplesOf({ width, height, data }: Grey, { code }: PlacedCode): Uint8Array | null {
  const map = fitHomography(square.flatMap((from, index) => (code.corners[index] ? [{ from, to: code.corners[index] }] : [])));
  if (!map) return null;
  const samples = new Uint8Array(samplesOfSide ** 2);
  for (let at = 0; at < samples.length; at += 1) {
    const { x, y } = mapped(map, { x: at % samplesOfSide, y: Math.floor(at / samplesOfSide) });
    const column = Math.min(width - 1, Math.max(0, Math.floor(x)));
    const row = Math.min(height - 1, Math.max(0, Math.floor(y)));
    samples[at] = data[row * width + column]!;
  }
  return samples;
}

const square = cornersOf({ x: 0, y: 0, w: samplesOfSide, h: samplesOfSide });
const isModuleMiddle = (at: number): boolean => at % samplesOfModule === 1 && Math.floor(at / samplesOfSide) % samplesOfModule === 1;

interface Seen {
  readonly contrast: number;
  readonly all: number;
  readonly between: number;
  readonly middles: number;
  readonly extremes: number;
}

function seenIn(samples: Uint8Array): Seen {
  const sorted = samples.slice().sort();
  const dark = sorted[Math.floor(sorted.length * 0.1)] ?? 0;
  const light = sorted[Math.floor(sorted.length * 0.9)] ?? 0;
  const quarter = (light - dark) / 4;
  let between = 0;
  let middles = 0;
  let extremes = 0;
  for (let at = 0; at < samples.length; at += 1) {
    const level = samples[at]!;
    if (level > dark + quarter && level < light - quarter) between += 1;
    if (!isModuleMiddle(at)) continue;
    middles += 1;
    if (level <= extreme || level >= 255 - extreme) extremes += 1;
  }
  return { contrast: light - dark, all: samples.length, between, middles, extremes };
}

/** How black and white a picture shows its codes. */
export function levelsOf(grey: Grey, codes: readonly PlacedCode[]): Levels {
  const seen = codes.flatMap((code) => {
    const samples = samplesOf(grey, code);
    return samples ? [seenIn(samples)] : [];
  });
  const sumOf = (name: keyof Seen): number => seen.reduce((sum, each) => sum + each[name], 0);
  const contrasts = seen.map(({ contrast }) => contrast).sort((one, other) => one - other);
  const isBilevel = seen.length > 0 && (sumOf('between') < leastBetween * sumOf('all') || sumOf('extremes') >= mostAtExtremes * sumOf('middles'));
  return { contrast: contrasts[Math.floor(contrasts.length / 2)] ?? 0, isBilevel };
}
