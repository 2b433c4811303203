import { demoFacts } from '../../db/seed/truth/demo-facts';
import { candidateNumbers, inventTruth } from '../../db/seed/truth/truth';
import type { AnswerTruth, CandidateTruth } from '../../db/seed/truth/written';
import type { Code } from '../../shared/marking/scheme';

export const itemsRead = 6;

interface Cell {
  readonly candidate: number;
  readonly item: number;
  readonly change: Partial<AnswerTruth>;
  /** What the reader gives, where it is not what the truth file expects. */
  readonly given?: Code;
}

/** One of each code: five as they are written, two as a reader may feel about an ordinary value. */
const cells: readonly Cell[] = [
  { candidate: 0, item: 1, change: { kind: 'blank', text: '', working: [], origin: 'none', expected: { code: 'blank' } } },
  { candidate: 0, item: 2, change: { kind: 'cannot-read', expected: { code: 'cannot-read' } } },
  { candidate: 1, item: 3, change: { kind: 'crossed-out', expected: { code: 'crossed-out' } } },
  { candidate: 1, item: 4, change: { kind: 'two-answers', second: '9.9', expected: { code: 'two-answers' } } },
  { candidate: 2, item: 5, change: { kind: 'elsewhere', text: 'see over', expected: { code: 'elsewhere' } } },
  { candidate: 2, item: 6, change: {}, given: 'wrong-page' },
  { candidate: 3, item: 1, change: {}, given: 'ask-the-lead' },
];

export interface WrittenPaper {
  readonly truth: readonly CandidateTruth[];
  /** What a reader types or says for an answer. */
  readingOf(candidate: string, item: number): { readonly text: string } | { readonly code: Code };
  answerOf(candidate: string, item: number): AnswerTruth;
}

/** Four candidates and six items: 24 answers, at least one of each code. */
export function writtenPaper(seed = 'main job'): WrittenPaper {
  const plain = inventTruth({ seed, items: demoFacts().slice(0, itemsRead), candidates: candidateNumbers(4), absentShare: 0 });
  const truth = plain.map((candidate, at): CandidateTruth => ({
    ...candidate,
    answers: candidate.answers.map((answer): AnswerTruth => {
      const cell = cells.find((one) => one.candidate === at && one.item === answer.itemNumber);
      const asValue: AnswerTruth = { itemNumber: answer.itemNumber, kind: 'value', text: answer.text === '' ? '3.33' : answer.text, working: answer.working, origin: answer.kind === 'value' ? answer.origin : 'other', expected: { text: answer.text === '' ? '3.33' : answer.text } };
      const isPlain = answer.kind === 'value' && answer.unclear === undefined;
      return { ...(isPlain ? answer : asValue), ...cell?.change };
    }),
  }));
  const answerOf = (number: string, item: number): AnswerTruth => {
    const found = truth.find(({ candidate }) => candidate === number)?.answers.find(({ itemNumber }) => itemNumber === item);
    if (!found) throw new Error(`The truth has no answer of ${number} to item ${item}.`);
    return found;
  };
  return {
    truth,
    answerOf,
    readingOf: (number, item) => {
      const at = truth.findIndex(({ candidate }) => candidate === number);
      const given = cells.find((cell) => cell.candidate === at && cell.item === item)?.given;
      return given ? { code: given } : answerOf(number, item).expected;
    },
  };
}
