import { demoFacts } from '../../db/seed/truth/demo-facts';
import { candidateNumbers, inventTruth } from '../../db/seed/truth/truth';
import type { CandidateTruth } from '../../db/seed/truth/written';

export const demoSeed = 'wrenmoor';
const candidates = 120;
const absentShare = 0.06;
/** Candidates at the end of the list whose pages stay out, to be uploaded by hand. */
const inSecondBatch = 6;

export interface DemoSitting {
  readonly sittingId: string;
  readonly readers: readonly string[];
}

/** What everyone on the demo's class list wrote. */
export const demoTruth = (): readonly CandidateTruth[] => inventTruth({ seed: demoSeed, items: demoFacts(), candidates: candidateNumbers(candidates), absentShare });

export const firstBatch = (truth: readonly CandidateTruth[]): readonly CandidateTruth[] => truth.slice(0, -inSecondBatch).filter(({ isAbsent }) => !isAbsent);
export const secondBatch = (truth: readonly CandidateTruth[]): readonly CandidateTruth[] => truth.slice(-inSecondBatch).filter(({ isAbsent }) => !isAbsent);
