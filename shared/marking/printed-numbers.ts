import { whole } from '../chemistry/exact';
import type { ReadAnswer, ReadValue } from './read-answer';

const most = 9;

const refused = (at: number, length: number, message: string): ReadAnswer => ({ ok: false, unfinished: false, at, length, message });

/**
 * Understands the printed numbers of options, single digits in the order written, with spaces or commas between or nothing.
 * Ours, no source. "3,1 2" and "312" have the form "3 1 2"; what is not an option is kept, for the candidate may have written it.
 */
export function readPrintedNumbers(text: string): ReadAnswer {
  const wrong = /[^\d\s,]/.exec(text);
  if (wrong) return refused(wrong.index, 1, `“${wrong[0]}” is no printed number. Type the numbers in their order, such as 3 1 2.`);
  const digits = text.replace(/[\s,]/g, '');
  if (digits === '') return { ok: false, unfinished: true };
  if (digits.length > most) return refused(0, text.length, `At most ${most} numbers.`);
  const value: ReadValue = { ok: true, value: whole(Number(digits)), decimals: 0, figures: digits.length, unit: null, canonical: [...digits].join(' ') };
  return value;
}

/** How many of the typed numbers stand in the place they have in the answer: of "3 2 1" against "3 1 2" one. */
export function inPlace(typed: string, answer: string): number {
  const wanted = answer.split(' ');
  return typed.split(' ').filter((number, index) => number === wanted[index]).length;
}
