import { fitHomography, mapped } from './homography';
import type { PlacedCode } from './identify';
import { cornersOf } from './page-map';
import { levelAt, type Grey } from './pixels';

export interface Levels {
  /** Between ink and paper, as printed black shows it. */
  readonly contrast: number;
  /** The picture knows black and white only: what was fainter than its threshold is lost. */
  readonly isBilevel: boolean;
}

const samplesOfSide = 75;
/** Edges of modules leave more levels than this between the two even in a picture without blur; JPEG alone leaves fewer. */
const leastBetween = 0.05;

/** How black and white a picture shows its codes. */
export function levelsOf(grey: Grey, codes: readonly PlacedCode[]): Levels {
  const contrasts: number[] = [];
  let [between, all] = [0, 0];
  for (const { code } of codes) {
    const square = cornersOf({ x: 0, y: 0, w: samplesOfSide, h: samplesOfSide });
    const map = fitHomography(square.flatMap((from, index) => (code.corners[index] ? [{ from, to: code.corners[index] }] : [])));
    if (!map) continue;
    const levels = new Float64Array(samplesOfSide ** 2);
    for (let at = 0; at < levels.length; at += 1) {
      const { x, y } = mapped(map, { x: (at % samplesOfSide) + 0.5, y: Math.floor(at / samplesOfSide) + 0.5 });
      // The level of the nearest pixel: between two, there would be levels that the picture has not.
      levels[at] = levelAt(grey, Math.floor(x) + 0.5, Math.floor(y) + 0.5);
    }
    const sorted = levels.slice().sort();
    const [dark, light] = [sorted[Math.floor(sorted.length * 0.1)] ?? 0, sorted[Math.floor(sorted.length * 0.9)] ?? 0];
    contrasts.push(light - dark);
    between += sorted.filter((level) => level > dark + (light - dark) / 4 && level < light - (light - dark) / 4).length;
    all += sorted.length;
  }
  contrasts.sort((one, other) => one - other);
  return { contrast: contrasts[Math.floor(contrasts.length / 2)] ?? 0, isBilevel: all > 0 && between / all < leastBetween };
}
