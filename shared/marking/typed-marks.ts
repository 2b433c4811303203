import { add, compare, multiply, whole, zero, type Exact } from '../chemistry/exact';
import { GRAINS_PER_MARK } from './grains';
import { readAnswer } from './read-answer';

export type TypedMarks = { readonly ok: true; readonly grains: number } | { readonly ok: false; readonly message: string };

const refuse = (message: string): TypedMarks => ({ ok: false, message });
const mostMarks = whole(1000);

/**
 * Marks as a lead types them, in whole grains (1200 a mark); our own unit, no outside source.
 * "2.5" is 3000 grains, "1 1/3" is 1600; "1/7" is refused, for it is no whole number of grains. No marks at all only where a
 * mark is given, not where an item gets its worth.
 */
export function readMarks(text: string, mayBeNone = false): TypedMarks {
  const mixed = /^(\d+) (\d+\/\d+)$/.exec(text.trim());
  const read = readAnswer(mixed?.[2] ?? text.trim(), []);
  if (!read.ok) return refuse(read.unfinished ? 'Write the marks, such as 3 or 2.5.' : read.message);
  const marks: Exact = mixed ? add(whole(Number(mixed[1])), read.value) : read.value;
  if (compare(marks, zero) < 0 || (!mayBeNone && compare(marks, zero) === 0)) return refuse(mayBeNone ? 'Marks are 0 or more.' : 'Marks are more than 0.');
  if (compare(marks, mostMarks) > 0) return refuse('At most 1,000 marks.');
  const grains = multiply(marks, whole(GRAINS_PER_MARK));
  if (grains.d !== 1n) return refuse('This share of a mark cannot be kept exactly. Halves to sixths, eighths, tenths and hundredths can.');
  return { ok: true, grains: Number(grains.n) };
}
