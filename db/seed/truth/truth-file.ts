import { writeFileSync } from 'node:fs';
import type { CandidateTruth, ExpectedReading } from './written';

/** NOTE: holds what every box says. It belongs beside the images of a demo or a test, never in the database. */
export interface TruthFile {
  readonly seed: string;
  readonly candidates: readonly CandidateTruth[];
}

export const saveTruth = (path: string, truth: TruthFile): void => writeFileSync(path, `${JSON.stringify(truth, null, 1)}\n`);

/** The reading a careful reader gives; undefined for an absent candidate or an item that is not on the paper. */
export const expectedReading = (candidates: readonly CandidateTruth[], candidate: string, itemNumber: number): ExpectedReading | undefined =>
  candidates
    .find((each) => each.candidate === candidate)
    ?.answers.find((answer) => answer.itemNumber === itemNumber)?.expected;
