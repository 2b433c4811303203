import type { AnswerForm } from '../../marking/read-typed';
import type { Code } from '../../marking/scheme';
import { understood } from '../../marking/understood';

export interface TypedItem {
  readonly text: string;
  readonly code: Code | null;
  /** Ids of the method marks struck. */
  readonly method: readonly string[];
}

/** Whether an item can be recorded: it has a code, or a value that is understood. "6." is not yet one. */
export const isWhole = ({ text, code }: TypedItem, form: AnswerForm): boolean => code !== null || understood(text, form).kind === 'value';
