import { randomFrom } from '../truth/random';
import type { Hand } from '../truth/hands';
import type { WrittenAnswer } from '../truth/written';
import { answerInk } from './answer-ink';
import { printedNumber, printedPage } from './printed';
import type { PrintedSheet } from './printed';
import { flat, onTheGlass, scanPose, scanned } from './scan';
import { pageOfItem } from './sheet-layout';

export interface PageSpec {
  /** Same seed, candidate and page: the same picture, byte for byte. */
  readonly seed: string;
  readonly sheet: PrintedSheet;
  readonly pageNo: number;
  readonly candidate: string;
  readonly hand: Hand;
  readonly answers: readonly WrittenAnswer[];
}

/** One answer page as it comes from the scanner: JPEG, 1240 by 1754, colour. */
export function drawPage({ seed, sheet, pageNo, candidate, hand, answers }: PageSpec): Promise<Buffer> {
  const ink = answers
    .filter((answer) => pageOfItem(answer.itemNumber) === pageNo)
    .map((answer) => answerInk(answer, hand, randomFrom(seed, 'ink', candidate, answer.itemNumber)))
    .join('');
  const page = printedPage(sheet, pageNo) + printedNumber(candidate) + ink;
  return scanned(onTheGlass(scanPose(seed, candidate, pageNo), page), randomFrom(seed, 'scan', candidate, pageNo));
}

/** A page nobody wrote on, flat on the glass: to draw the boxes on. */
export const drawSamplePage = (sheet: PrintedSheet, pageNo: number): Promise<Buffer> =>
  scanned(onTheGlass(flat, printedPage(sheet, pageNo)), randomFrom('sample', pageNo));
