import { readPrintedNumbers } from './printed-numbers';
import { readAnswer, type ReadAnswer } from './read-answer';
import type { ItemKind } from './scheme';

/** What the grammar needs to know of an item, and all that a reader is told of its scheme. */
export interface AnswerForm {
  readonly kind: ItemKind;
  readonly units: readonly string[];
}

export const plainNumber: AnswerForm = { kind: 'numeric', units: [] };

/** Understands one typed answer by the grammar of its item: a number, or the printed numbers of options. */
export const readTyped = (text: string, { kind, units }: AnswerForm): ReadAnswer => (kind === 'numeric' ? readAnswer(text, units) : readPrintedNumbers(text));
