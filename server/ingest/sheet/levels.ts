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

const samplesOfModule = 4;
const samplesOfSide = codeModules * samplesOfModule;
/** Edges of modules leave more levels than this between the two even in a sharp picture; in one of black and white, JPEG alone leaves fewer. */
const leastBetween = 0.05;
/** A picture of black and white that was made smaller has levels between, but nothing near the two. */
const extreme = 2;
const mostAtExtremes = 0.95;

/** The pixels of a code, four by four a module, unmixed: between two pixels there would be levels that the picture has not. */
function samplesOf({ width, height, data }: Grey, { code }: PlacedCode): Uint8Array | null {
  const square = cornersOf({ x: 0, y: 0, w: samplesOfSide, h: samplesOfSide });
  const map = fitHomography(square.flatMap((from, index) => (code.corners[index] ? [{ from, to: code.corners[index] }] : [])));
  if (!map) return null;
  return Uint8Array.from({ length: samplesOfSide ** 2 }, (_, at) => {
    const { x, y } = mapped(map, { x: at % samplesOfSide, y: Math.floor(at / samplesOfSide) });
    const [column, row] = [Math.min(width - 1, Math.max(0, Math.floor(x))), Math.min(height - 1, Math.max(0, Math.floor(y)))];
    return data[row * width + column] ?? 0;
  });
}

const isModuleMiddle = (at: number): boolean => at % samplesOfModule === 2 && Math.floor(at / samplesOfSide) % samplesOfModule === 2;

/** How black and white a picture shows its codes. */
export function levelsOf(grey: Grey, codes: readonly PlacedCode[]): Levels {
  const contrasts: number[] = [];
  const counts = { all: 0, between: 0, middles: 0, extremes: 0 };
  for (const placed of codes) {
    const samples = samplesOf(grey, placed);
    if (!samples) continue;
    const sorted = samples.slice().sort();
    const [dark, light] = [sorted[Math.floor(sorted.length * 0.1)] ?? 0, sorted[Math.floor(sorted.length * 0.9)] ?? 0];
    const quarter = (light - dark) / 4;
    contrasts.push(light - dark);
    counts.all += samples.length;
    counts.between += samples.filter((level) => level > dark + quarter && level < light - quarter).length;
    const middles = samples.filter((_, at) => isModuleMiddle(at));
    counts.middles += middles.length;
    counts.extremes += middles.filter((level) => level <= extreme || level >= 255 - extreme).length;
  }
  contrasts.sort((one, other) => one - other);
  const isBilevel = counts.all > 0 && (counts.between < leastBetween * counts.all || counts.extremes >= mostAtExtremes * counts.middles);
  return { contrast: contrasts[Math.floor(contrasts.length / 2)] ?? 0, isBilevel };
}
