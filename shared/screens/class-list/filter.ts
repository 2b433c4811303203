import type { CandidateView } from '../../contracts/class-list';
import { attendances, type Attendance } from '../../contracts/enums';

export type Shown = Attendance | 'all';

const toBeMarked: readonly Attendance[] = ['expected', 'present', 'late'];
export const isToBeMarked = ({ attendance }: CandidateView): boolean => toBeMarked.includes(attendance);

export function countsOf(candidates: readonly CandidateView[]): Readonly<Record<Shown, number>> {
  const counts = { all: candidates.length, ...(Object.fromEntries(attendances.map((name) => [name, 0])) as Record<Attendance, number>) };
  for (const { attendance } of candidates) counts[attendance] += 1;
  return counts;
}

/** Those of one attendance whose number or name holds the text, whatever its capitals. */
export function found(candidates: readonly CandidateView[], shown: Shown, text: string, names: ReadonlyMap<string, string>): CandidateView[] {
  const wanted = text.trim().toLocaleLowerCase();
  return candidates.filter(
    ({ id, number, attendance }) =>
      (shown === 'all' || attendance === shown) &&
      (wanted === '' || number.toLocaleLowerCase().includes(wanted) || (names.get(id) ?? '').toLocaleLowerCase().includes(wanted)),
  );
}
