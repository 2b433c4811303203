import { heldStates } from '../../contracts/enums';
import type { AnswerView } from '../../contracts/ledger';
import { marksText } from '../../marking/grains';
import { readTyped, type AnswerForm } from '../../marking/read-typed';
import { codeWords } from '../desk/words';
import { struckWords, type MethodMarkRow } from '../method-words';

type Mine = NonNullable<AnswerView['mine']>;
type Ruling = NonNullable<AnswerView['ruling']>;

type SaidWithMethod = Pick<Mine, 'text' | 'code'> & { readonly method?: readonly string[] };

/** "6.10", "blank", and of an item with method marks "6.10 with method 1 and 3"; none struck is said of a value only. */
export function saidOf({ text, code, method = [] }: SaidWithMethod, marks: readonly MethodMarkRow[] = []): string {
  const said = code === null ? (text ?? '') : codeWords[code];
  return marks.length === 0 || (code !== null && method.length === 0) ? said : `${said} with ${struckWords(method, marks)}`;
}

/** "1 mark", "2.5 marks", "0 marks". */
export const marksWords = (grains: number): string => `${marksText(grains)} ${marksText(grains) === '1' ? 'mark' : 'marks'}`;

const isHeld = ({ state }: Pick<AnswerView, 'state'>): boolean => heldStates.some((held) => held === state);

/** Whether ruling what I read asks for a reason: it is neither of the readings, or changes a mark that stands. */
export const needsReason = (answer: AnswerView): boolean => answer.ruling !== null || !isHeld(answer) || !answer.readings.some(({ isAsMine }) => isAsMine === true);

/** What the button says it will do; null where my reading gives no mark by the scheme and a mark has to be ruled. */
export function ruleWords({ mine, methodMarks }: Pick<AnswerView, 'mine' | 'methodMarks'>): string | null {
  if (mine === null) return null;
  if (mine.waitsFor !== null) return `Rule ${saidOf(mine, methodMarks)}; its mark waits for item ${mine.waitsFor}`;
  return mine.grains === null ? null : `Rule ${saidOf(mine, methodMarks)}, ${marksWords(mine.grains)}`;
}

/** What a ruling says, with the mark that stands by it: "6.10, 3 marks", or the mark alone where one was ruled by hand. */
export function ruledWords(ruling: Pick<Ruling, 'kind' | 'text' | 'code' | 'grains' | 'method'>, standing: number | null, marks: readonly MethodMarkRow[] = []): string {
  const grains = ruling.grains ?? standing;
  const mark = grains === null ? '' : marksWords(grains);
  return ruling.kind === 'mark' ? mark : [saidOf(ruling, marks), mark].filter((part) => part !== '').join(', ');
}

/** "a minute ago", "12 minutes ago", "2 hours ago": how long somebody else's ruling has stood. */
export function agoWords(ms: number): string {
  const minutes = Math.max(1, Math.round(ms / 60_000));
  if (minutes < 60) return minutes === 1 ? 'a minute ago' : `${minutes} minutes ago`;
  const hours = Math.round(minutes / 60);
  if (hours < 24) return hours === 1 ? 'an hour ago' : `${hours} hours ago`;
  const days = Math.round(hours / 24);
  return days === 1 ? 'a day ago' : `${days} days ago`;
}

/** What stands now that somebody else was first; null where the change was not a ruling. */
export function conflictWords(current: AnswerView, now: number): string | null {
  const { ruling, score, methodMarks } = current;
  if (ruling === null) return null;
  return `Someone ruled this ${agoWords(now - ruling.at)}: ${ruledWords(ruling, score?.grains ?? null, methodMarks)}. Yours was not stored.`;
}

/** "Either way 0 of 3": two readings that differ and give the same mark. Null where they do not, or are kept back. */
export function eitherWay({ state, readings, maxGrains }: Pick<AnswerView, 'state' | 'maxGrains'> & { readonly readings: readonly { readonly grains: number | null }[] }): string | null {
  const [first, ...others] = readings.map(({ grains }) => grains);
  if (state !== 'discordant' || first === undefined || first === null || others.length === 0 || others.some((grains) => grains !== first)) return null;
  return `Either way ${marksText(first)} of ${marksText(maxGrains)}.`;
}

const formOf = ({ text, code }: { readonly text: string | null; readonly code: string | null }, form: AnswerForm): string => {
  if (code !== null) return `@${code}`;
  const read = readTyped(text ?? '', form);
  return read.ok ? read.canonical : '';
};

/** Whether two uncovered readings agree in value and form, and differ in the method marks struck alone. */
export function differInMethodOnly(answer: Pick<AnswerView, 'readings' | 'kind' | 'units'>): boolean {
  const shown = answer.readings.flatMap(({ given, method }) => (given === null ? [] : [{ form: formOf(given, answer), method: [...method].sort().join() }]));
  const [first, ...others] = shown;
  if (first === undefined || shown.length < answer.readings.length) return false;
  return others.every(({ form }) => form === first.form) && others.some(({ method }) => method !== first.method);
}
