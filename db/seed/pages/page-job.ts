import type { CandidateTruth } from '../truth/written';
import type { PrintedSheet } from './printed';

/** What the drawing process is told, as one JSON text on its standard input. */
export interface PageJob {
  readonly outDir: string;
  readonly seed: string;
  readonly sheet: PrintedSheet;
  readonly candidates: readonly CandidateTruth[];
  /** Whether the pages are also drawn as they come from the press. */
  readonly withSamples: boolean;
}

/** What it says for each file once that is whole on disk, one JSON text a line on its standard output. */
export interface PageDrawn {
  /** Such as `W4071-p1.jpg`. */
  readonly file: string;
  /** Null for a page without a candidate. */
  readonly candidate: string | null;
  readonly pageNo: number;
  readonly bytes: number;
}

export const pageFile = (candidate: string | null, pageNo: number): string => `${candidate ?? 'sample'}-p${pageNo}.jpg`;
