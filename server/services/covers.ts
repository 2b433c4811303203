import type { AnswerState } from '../../shared/contracts/enums';
import type { Code } from '../../shared/marking/scheme';

interface ShownGiven {
  readonly text: string | null;
  readonly code: Code | null;
}

/** Whether the readings of an answer are kept back from someone who has not typed what the image says. */
export function isCovered(state: AnswerState, readingsDue: number, hasUncovered: boolean): boolean {
  if (hasUncovered) return false;
  return state === 'discordant' || state === 'cannot-read' || state === 'set-aside' || (state === 'one-reading' && readingsDue > 0);
}

/** A reading as it may be shown: of covered answers only the code that set one aside. */
export function shownGiven(given: ShownGiven, state: AnswerState, covered: boolean): ShownGiven | null {
  if (!covered) return { text: given.text, code: given.code };
  return state === 'set-aside' && given.code !== null ? { text: null, code: given.code } : null;
}
