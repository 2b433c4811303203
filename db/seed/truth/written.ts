import type { Code } from '../../../shared/marking/scheme';
import type { Hand } from './hands';

export type WrittenKind = 'value' | 'blank' | 'crossed-out' | 'two-answers' | 'cannot-read' | 'elsewhere';

/** What stands in and beside one answer box. */
export interface WrittenAnswer {
  readonly itemNumber: number;
  readonly kind: WrittenKind;
  /** In the box as it stands; for `crossed-out` the value under the strokes, for `elsewhere` the words; empty when blank. */
  readonly text: string;
  /** Of two answers left standing, the other. */
  readonly second?: string;
  /** A value crossed out first; `text` is what replaced it. */
  readonly struck?: string;
  /** One figure is drawn between two: as it was meant, and as it may be read. */
  readonly unclear?: readonly [asRead: string, alsoPossible: string];
  readonly isFaint?: true;
  readonly working: readonly string[];
}

/** What a careful reader types for an answer: the text as written, or a code. */
export type ExpectedReading = { readonly text: string } | { readonly code: Code };

export interface AnswerTruth extends WrittenAnswer {
  readonly expected: ExpectedReading;
  /** How the answer came about; `slip` is then named in `slip`. */
  readonly origin: 'key' | 'rounding' | 'slip' | 'other' | 'none';
  readonly slip?: string;
}

export interface CandidateTruth {
  readonly candidate: string;
  readonly isAbsent: boolean;
  readonly hand: Hand;
  /** Empty for an absent candidate. */
  readonly answers: readonly AnswerTruth[];
}
