import { readTyped, type AnswerForm } from './read-typed';
import { isCode, type Code, type Given } from './scheme';

/** The form of a code among the forms of values: `@blank`. */
export const codeCanonical = (code: Code): string => `@${code}`;

/** The form of what was typed; null for a text that is no value. canonicalOf({ text: ' +3,80' }, plainNumber) is "3.80". */
export function canonicalOf(given: Given, form: AnswerForm): string | null {
  if (isCode(given)) return codeCanonical(given.code);
  const read = readTyped(given.text, form);
  return read.ok ? read.canonical : null;
}
