import bwip from 'bwip-js/node';
import { codeLevel, codeModules, codeVersion, moduleMm, type Rect } from '../../shared/sheets/geometry';

/** A stretch of dark modules in one row of a code. */
export interface DarkRun {
  readonly row: number;
  readonly from: number;
  readonly modules: number;
}

interface RawMatrix {
  readonly pixs: ArrayLike<number>;
  readonly pixx: number;
}

/** The dark modules of the code that says these digits, row by row from the top. */
export function darkRuns(digits: string): DarkRun[] {
  const [matrix] = bwip.raw('qrcode', digits, `version=${codeVersion} eclevel=${codeLevel}`) as unknown as RawMatrix[];
  if (!matrix || matrix.pixx !== codeModules) throw new Error(`${digits.length} digits do not make a code of ${codeModules} modules a side.`);
  const runs: DarkRun[] = [];
  for (let row = 0; row < codeModules; row += 1) {
    for (let from = 0; from < codeModules; from += 1) {
      if (!matrix.pixs[row * codeModules + from]) continue;
      let modules = 1;
      while (from + modules < codeModules && matrix.pixs[row * codeModules + from + modules]) modules += 1;
      runs.push({ row, from, modules });
      from += modules;
    }
  }
  return runs;
}

/** Where a stretch lies on the page, for a code with its top left at a point. */
export const rectOfRun = ({ row, from, modules }: DarkRun, place: Pick<Rect, 'x' | 'y'>): Rect => ({ x: place.x + from * moduleMm, y: place.y + row * moduleMm, w: modules * moduleMm, h: moduleMm });
