import { heldStates } from '../../contracts/enums';
import type { AnswerView } from '../../contracts/ledger';
import { marksText } from '../../marking/grains';
import { codeWords } from '../desk/words';

type Mine = NonNullable<AnswerView['mine']>;

export const saidOf = ({ text, code }: Pick<Mine, 'text' | 'code'>): string => (code === null ? (text ?? '') : codeWords[code]);

/** "1 mark", "2.5 marks", "0 marks". */
export const marksWords = (grains: number): string => `${marksText(grains)} ${marksText(grains) === '1' ? 'mark' : 'marks'}`;

const isHeld = ({ state }: Pick<AnswerView, 'state'>): boolean => heldStates.some((held) => held === state);

/** Whether ruling what I read asks for a reason: it is neither of the readings, or changes a mark that stands. */
export const needsReason = (answer: AnswerView): boolean => answer.ruling !== null || !isHeld(answer) || !answer.readings.some(({ isAsMine }) => isAsMine === true);

/** What the button says it will do; null where my reading gives no mark by the scheme and a mark has to be ruled. */
export function ruleWords(answer: AnswerView): string | null {
  const { mine } = answer;
  if (mine === null || mine.grains === null) return null;
  return `Rule ${saidOf(mine)}, ${marksWords(mine.grains)}`;
}
