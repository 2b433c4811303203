import type { CodedSheet } from './coded-page';
import type { CandidateTruth } from '../truth/written';
import type { PrintedSheet } from './printed';

/** What the codes of the sheets say, and whose each is. */
export interface CodedJob {
  readonly sheet: CodedSheet;
  readonly sitting: number;
  readonly layout: number;
  readonly secret: string;
  /** Script numbers by candidate number. */
  readonly scripts: Readonly<Record<string, number>>;
  /** What stands in the box for the own number where it is not that number; null for nothing. */
  readonly ownNumbers: Readonly<Record<string, string | null>>;
}

/** What the drawing process is told, as one JSON text on its standard input. */
export interface PageJob {
  readonly outDir: string;
  readonly seed: string;
  readonly sheet: PrintedSheet;
  readonly candidates: readonly CandidateTruth[];
  /** Printed answer sheets with codes; without them the pages are those of a paper of one's own. */
  readonly coded?: CodedJob;
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
