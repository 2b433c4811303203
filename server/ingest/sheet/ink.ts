import { areaOfPieces, type Region } from './pieces';
import { blackTopHat, meanOfNine } from './top-hat';
import type { Grey } from './pixels';

export type Ink = 'blank' | 'unsure' | 'written';

export interface InkQuestion {
  /** The inside of a box, without its frame. */
  readonly inside: Grey;
  readonly pxPerMm: number;
  /** How dark the frame's own line is against its paper. */
  readonly frameContrast: number;
  readonly isBilevel: boolean;
}

/** Larger than any stroke is wide, smaller than smudges and shadows. */
const strokeMm = 1.8;
/** Shares of the frame's contrast from which darkness counts as ink: surely, and perhaps. */
const strong = 0.14;
const weak = 0.09;
const leastLevels = 7;
const writtenMm2 = 0.6;
const unsureMm2 = 0.15;

/** The median of levels and their spread, from the median distance to it (1.4826 makes it a standard deviation for normal noise). */
function medianAndSpread(levels: Uint8Array): { median: number; spread: number } {
  const middleOf = (counts: Uint32Array): number => {
    let passed = 0;
    return Math.max(0, counts.findIndex((count) => (passed += count) * 2 >= levels.length));
  };
  const counts = new Uint32Array(256);
  for (const level of levels) counts[level] = (counts[level] ?? 0) + 1;
  const median = middleOf(counts);
  const distances = new Uint32Array(256);
  counts.forEach((count, level) => {
    const distance = Math.abs(level - median);
    distances[distance] = (distances[distance] ?? 0) + count;
  });
  return { median, spread: 1.4826 * middleOf(distances) };
}

/** Tells the square millimetres of ink in a box that are darker than a share of its frame. */
function areasOf({ inside, pxPerMm, frameContrast }: InkQuestion): (share: number) => number {
  const hat = blackTopHat(meanOfNine(inside), Math.max(3, Math.round(strokeMm * pxPerMm) | 1));
  const { median, spread } = medianAndSpread(hat.data);
  const region: Region = { ...hat, pxPerMm };
  return (share) => areaOfPieces(region, Math.max(leastLevels, median + 5 * spread, share * frameContrast));
}

/** Whether somebody wrote in a box. A picture in black and white lost faint strokes, so that it never proves a box blank. */
export function inkOf(question: InkQuestion): Ink {
  const areaFor = areasOf(question);
  const surely = areaFor(strong);
  if (surely >= writtenMm2) return 'written';
  return surely >= unsureMm2 || question.isBilevel || areaFor(weak) >= writtenMm2 ? 'unsure' : 'blank';
}
