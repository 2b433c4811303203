/** One step of the fingers between what was meant and what was typed. */
export type KeyingStep = 'point-missing' | 'point-moved' | 'digits-exchanged' | 'digit-doubled' | 'digit-dropped' | 'look-alike' | 'sign-lost';

/** Digits that are taken for each other in handwriting. */
const lookAlikes = ['17', '49', '06', '38', '56'];

const digitsOf = (text: string): string => text.replace('.', '');

const without = (text: string, at: number): string => text.slice(0, at) + text.slice(at + 1);

const isDigit = (letter: string | undefined): boolean => letter !== undefined && /\d/.test(letter);

function stepOfPoint(typed: string, meant: string): KeyingStep | null {
  if (digitsOf(typed) !== digitsOf(meant)) return null;
  return typed.includes('.') ? 'point-moved' : 'point-missing';
}

/** Where two texts of equal length first differ, and how they go on after one letter or two. */
function stepInPlace(typed: string, meant: string): KeyingStep | null {
  const at = [...typed].findIndex((letter, index) => letter !== meant[index]);
  const [one = '', other = ''] = [typed[at], meant[at]];
  if (!isDigit(one) || !isDigit(other)) return null;
  if (typed.slice(at + 1) === meant.slice(at + 1)) return lookAlikes.some((pair) => pair.includes(one) && pair.includes(other)) ? 'look-alike' : null;
  // The neighbour of a digit in a number may stand beyond the point: 1.65 and 6.15.
  const next = typed[at + 1] === '.' ? at + 2 : at + 1;
  const isExchanged = typed[next] === other && meant[next] === one && typed.slice(at + 1, next) === meant.slice(at + 1, next) && typed.slice(next + 1) === meant.slice(next + 1);
  return isExchanged ? 'digits-exchanged' : null;
}

/** The digit of the longer text that leaves the shorter when taken away; -1 when none does. */
const digitTooMany = (longer: string, shorter: string): number => [...longer].findIndex((letter, at) => isDigit(letter) && without(longer, at) === shorter);

function stepOfLength(typed: string, meant: string): KeyingStep | null {
  if (digitTooMany(meant, typed) >= 0) return 'digit-dropped';
  const at = digitTooMany(typed, meant);
  return at >= 0 && typed[at] === typed[at + 1] ? 'digit-doubled' : null;
}

/**
 * How a reader who meant one number may have typed the other by one wrong step, null when no single step leads there.
 * Both are plain decimals in canonical form. keyingStep('6.01', '6.10') is `digits-exchanged`; keyingStep('610', '6.10') `point-missing`.
 */
export function keyingStep(typed: string, meant: string): KeyingStep | null {
  if (typed === meant) return null;
  if (meant === `-${typed}`) return 'sign-lost';
  const point = stepOfPoint(typed, meant);
  if (point) return point;
  return typed.length === meant.length ? stepInPlace(typed, meant) : stepOfLength(typed, meant);
}
