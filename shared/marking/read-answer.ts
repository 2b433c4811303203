import { decimal, divide, multiply, negate, type Exact } from '../chemistry/exact';

/** Grows when the same text would be understood otherwise; stored with every reading. */
export const grammarVersion = 1;

export const longestAnswer = 64;
const largestExponent = 30n;

/** How a value was written, beside the value itself: trailing zeros, fraction or exponent as such, unit, charge sign. */
export interface ReadValue {
  readonly ok: true;
  readonly value: Exact;
  /** Digits shown after the point; 0 for a whole number or a fraction. */
  readonly decimals: number;
  /** Significant figures shown; null for a fraction. */
  readonly figures: number | null;
  readonly unit: string | null;
  /** The form, the same text for two readings exactly when they are written alike. */
  readonly canonical: string;
}

export interface Unfinished {
  readonly ok: false;
  readonly unfinished: true;
}

export interface Refused {
  readonly ok: false;
  readonly unfinished: false;
  /** Where in the text, and how far, the trouble is. */
  readonly at: number;
  readonly length: number;
  readonly message: string;
}

export type ReadAnswer = ReadValue | Unfinished | Refused;

/** The number as written, without its unit: "56.25" of "56.25 eV". */
export const writtenNumber = ({ canonical, unit }: ReadValue): string => (unit === null ? canonical : canonical.slice(0, -unit.length).trimEnd());

const unfinished: Unfinished = { ok: false, unfinished: true };
const refuse = (at: number, length: number, message: string): Refused => ({ ok: false, unfinished: false, at, length, message });

const lead = /^\s*(?:(?:Z\s*_?\s*eff|σ|sigma)\s*=|[=~≈])*\s*/i;
const minusSigns = /[-\u2212]/;
const number = /^(\d*)(?:[.,](\d*))?/;
const exponent = /^\s*(?:[eE]|[x×*]\s*10\s*\^)\s*([+\-\u2212]?)(\d*)/;

/** A cursor over the text, so that every refusal can name its place. */
interface Rest {
  readonly text: string;
  readonly at: number;
}

const skip = (rest: Rest, length: number): Rest => ({ text: rest.text.slice(length), at: rest.at + length });

const isNegative = (sign: string): boolean => minusSigns.test(sign);

/** A second point or comma after a number is the commonest slip of the hand: say which one to keep. */
function strayMark(before: string, rest: Rest): Refused | null {
  if (!/^[.,]/.test(rest.text)) return null;
  const digits = /^[.,]\d*/.exec(rest.text)?.[0] ?? '';
  const example = /[.,]\d/.test(before) ? before.replace(',', '.') : `${before.replace(/[.,]$/, '')}.${digits.replace(/\D/g, '') || '0'}`;
  return refuse(rest.at, digits.length, `Two points. Keep one: ${example}`);
}

interface Mantissa {
  readonly whole: string;
  readonly places: string | null;
  readonly rest: Rest;
}

function readMantissa(start: Rest): Mantissa | ReadAnswer {
  const match = number.exec(start.text);
  const taken = match?.[0] ?? '';
  if (taken === '') {
    const found = start.text[0];
    return found === undefined ? unfinished : refuse(start.at, 1, `“${found}” is not part of a number. Use digits, a point or a comma.`);
  }
  const rest = skip(start, taken.length);
  const stray = strayMark(taken, rest);
  if (stray) return stray;
  const whole = match?.[1] ?? '';
  const places = match?.[2] ?? null;
  if (whole === '' && (places === null || places === '')) return rest.text === '' ? unfinished : refuse(start.at, taken.length, 'A point without digits is not a value.');
  if (places === '') return rest.text.trim() === '' ? unfinished : refuse(start.at + taken.length - 1, 1, 'Digits are missing after the point.');
  return { whole: whole === '' ? '0' : whole, places, rest };
}

interface Power {
  readonly text: string;
  readonly power: bigint;
  readonly rest: Rest;
}

function readExponent(rest: Rest, units: readonly string[]): Power | ReadAnswer | null {
  const match = exponent.exec(rest.text);
  if (!match) return null;
  const [taken, sign = '', digits = ''] = match;
  if (digits === '') {
    // An e may begin a unit: eV is no exponent.
    const word = rest.text.trim();
    return units.some((unit) => unit.startsWith(word) || word === unit) ? null : unfinished;
  }
  const power = BigInt(digits) * (isNegative(sign) ? -1n : 1n);
  if (power > largestExponent || power < -largestExponent) return refuse(rest.at, taken.length, `An exponent goes from -${largestExponent} to ${largestExponent}.`);
  return { text: `e${power}`, power, rest: skip(rest, taken.length) };
}

/** A trailing charge sign, as in 4.55+, and one unit of the closed list; nothing may follow. */
function readTail(rest: Rest, units: readonly string[]): { chargeSign: string; unit: string | null } | ReadAnswer {
  const charge = /^\s*([+\-\u2212])\s*/.exec(rest.text);
  const after = charge ? skip(rest, charge[0].length) : rest;
  const word = after.text.trim();
  const at = after.at + (after.text.length - after.text.trimStart().length);
  const chargeSign = charge ? (isNegative(charge[1] ?? '') ? '-' : '+') : '';
  if (word === '') return { chargeSign, unit: null };
  const unit = units.find((known) => known === word);
  if (unit !== undefined) return { chargeSign, unit };
  if (units.some((known) => known.startsWith(word))) return unfinished;
  const known = units.length === 0 ? 'This item has no unit.' : `Units here: ${units.join(', ')}.`;
  return refuse(at, word.length, `“${word}” is not understood. ${known}`);
}

const isOutcome = (found: object | null): found is ReadAnswer => found !== null && 'ok' in found;

const significant = (whole: string, places: string | null): number => {
  const digits = `${whole}${places ?? ''}`.replace(/^0+/, '');
  return Math.max(1, digits.length);
};

const wholeText = (digits: string): string => digits.replace(/^0+(?=\d)/, '');

function readFraction(mantissa: Mantissa, sign: string, units: readonly string[]): ReadAnswer {
  const slash = /^\s*\/\s*/.exec(mantissa.rest.text)?.[0] ?? '';
  const below = skip(mantissa.rest, slash.length);
  if (mantissa.places !== null) return refuse(mantissa.rest.at, slash.length, 'A fraction has whole numbers above and below.');
  const digits = /^\d+/.exec(below.text)?.[0] ?? '';
  if (digits === '') return below.text === '' ? unfinished : refuse(below.at, 1, 'A fraction needs a whole number below the line.');
  if (/^0+$/.test(digits)) return refuse(below.at, digits.length, 'A fraction has no value with 0 below the line.');
  const rest = skip(below, digits.length);
  if (/^[.,]/.test(rest.text)) return refuse(rest.at, 1, 'A fraction has whole numbers above and below.');
  const tail = readTail(rest, units);
  if (isOutcome(tail)) return tail;
  const magnitude = divide(decimal(mantissa.whole), decimal(digits));
  const body = `${wholeText(mantissa.whole)}/${wholeText(digits)}`;
  return {
    ok: true,
    value: sign === '-' ? negate(magnitude) : magnitude,
    decimals: 0,
    figures: null,
    unit: tail.unit,
    canonical: `${sign}${body}${tail.chargeSign}${tail.unit === null ? '' : ` ${tail.unit}`}`,
  };
}

function readDecimal(mantissa: Mantissa, sign: string, units: readonly string[]): ReadAnswer {
  const power = readExponent(mantissa.rest, units);
  if (isOutcome(power)) return power;
  const tail = readTail(power?.rest ?? mantissa.rest, units);
  if (isOutcome(tail)) return tail;
  const written = `${wholeText(mantissa.whole)}${mantissa.places === null ? '' : `.${mantissa.places}`}`;
  const magnitude = power ? multiply(decimal(written), decimal(`1e${power.power}`)) : decimal(written);
  const shown = (mantissa.places?.length ?? 0) - Number(power?.power ?? 0n);
  return {
    ok: true,
    value: sign === '-' ? negate(magnitude) : magnitude,
    decimals: Math.max(0, shown),
    figures: significant(mantissa.whole, mantissa.places),
    unit: tail.unit,
    canonical: `${sign}${written}${power?.text ?? ''}${tail.chargeSign}${tail.unit === null ? '' : ` ${tail.unit}`}`,
  };
}

/**
 * Understands one typed answer, strictly: 3,75 is 3.75 with two decimals, 15/4 the same value in another form, `6.` not yet
 * a value. Units are the closed list of the item. What is refused is named with its place; the text itself is never changed.
 */
export function readAnswer(text: string, units: readonly string[]): ReadAnswer {
  if (text.length > longestAnswer) return refuse(longestAnswer, text.length - longestAnswer, `At most ${longestAnswer} characters.`);
  const start = skip({ text, at: 0 }, lead.exec(text)?.[0].length ?? 0);
  const signText = /^([+\-\u2212])\s*/.exec(start.text);
  const body = skip(start, signText?.[0].length ?? 0);
  const sign = signText && isNegative(signText[1] ?? '') ? '-' : '';
  const mantissa = readMantissa(body);
  if (isOutcome(mantissa)) return mantissa;
  return /^\s*\//.test(mantissa.rest.text) ? readFraction(mantissa, sign, units) : readDecimal(mantissa, sign, units);
}
