import { writtenNumber } from './read-answer';
import { readTyped, type AnswerForm } from './read-typed';

export type Understood =
  | { readonly kind: 'nothing' }
  /** Waits without complaint: `6.` is not yet a value. */
  | { readonly kind: 'waiting' }
  | { readonly kind: 'value'; readonly value: string; readonly form: string }
  | { readonly kind: 'refused'; readonly message: string };

const smallNumbers = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten'] as const;
const unitWords = (unit: string | null): string => (unit === null ? 'no unit' : `unit ${unit}`);
const decimalsWords = (decimals: number): string => `${smallNumbers[decimals] ?? decimals} ${decimals === 1 ? 'decimal' : 'decimals'}`;

/**
 * What is said back of a typed text before it is recorded, without a word on its mark.
 * understood('5,75', plainNumber) is the value 5.75 with "Two decimals, no unit."; the typed text itself stays as it is.
 */
export function understood(text: string, form: AnswerForm): Understood {
  if (text.trim() === '') return { kind: 'nothing' };
  const read = readTyped(text, form);
  if (!read.ok) return read.unfinished ? { kind: 'waiting' } : { kind: 'refused', message: read.message };
  const value = writtenNumber(read);
  if (form.kind !== 'numeric') return { kind: 'value', value, form: read.figures === 1 ? 'One number.' : `${smallNumbers[read.figures ?? 0] ?? ''} numbers in this order.` };
  const written = read.figures === null ? 'A fraction' : /e/.test(value) ? 'A power of ten' : decimalsWords(read.decimals);
  return { kind: 'value', value, form: `${written}, ${unitWords(read.unit)}.` };
}
