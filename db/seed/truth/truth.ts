import { decimal } from '../../../shared/chemistry/exact';
import { handFrom } from './hands';
import { arithmeticErrors } from './wrong-numbers';
import { randomFrom } from './random';
import type { Random } from './random';
import { lastStepTo, leadsTo, workingLines } from './working';
import type { Term, WorkingStyle } from './working';
import type { AnswerTruth, CandidateTruth, ExpectedReading, WrittenAnswer } from './written';

export interface SlipFacts {
  readonly slip: string;
  /** As a candidate writes the wrong value, 5.75. */
  readonly text: string;
  /** How common it is beside the other slips of the item. */
  readonly weight: number;
  /** The sum of the wrong method, where it is one, and what it is taken from when that is not Z. */
  readonly terms?: readonly Term[];
  readonly nuclear?: number;
}

/** What must be known of an item to invent answers to it. */
export interface ItemFacts {
  readonly number: number;
  readonly quantity: 'zeff' | 'sigma';
  readonly nuclear: number;
  readonly key: string;
  readonly terms: readonly Term[];
  /** Accepted roundings of the key, both neighbours on a tie. */
  readonly roundings: readonly string[];
  readonly slips: readonly SlipFacts[];
}

export interface TruthOrder {
  /** Same seed, items and candidate: the same answers, whoever else sits the paper. */
  readonly seed: string;
  readonly items: readonly ItemFacts[];
  readonly candidates: readonly string[];
  readonly absentShare?: number;
}

/** Candidate numbers of the demo: W4001, W4002 and on. */
export const candidateNumbers = (count: number, first = 4001): readonly string[] =>
  Array.from({ length: count }, (_, index) => `W${first + index}`);

/** What every candidate wrote, and what a careful reader types for it. */
export const inventTruth = ({ seed, items, candidates, absentShare = 0.03 }: TruthOrder): readonly CandidateTruth[] =>
  candidates.map((candidate) => {
    const random = randomFrom(seed, 'candidate', candidate);
    const isAbsent = random.chance(absentShare);
    const hand = handFrom(random);
    const habits = habitsFrom(random, items);
    const streamOf = (item: ItemFacts): Random => randomFrom(seed, 'answer', candidate, item.number);
    const answers = isAbsent ? [] : items.map((item) => answerTo(item, items.length, habits, streamOf(item)));
    return { candidate, isAbsent, hand, answers };
  });

interface Habits {
  /** 0 for an ordinary candidate, positive for an able one; close to normal with deviation 1. */
  readonly ability: number;
  readonly style: WorkingStyle;
  readonly showsResult: boolean;
  /** The wrong method this candidate tends to. */
  readonly favourite: string;
}

function habitsFrom(random: Random, items: readonly ItemFacts[]): Habits {
  return {
    ability: random.normal(),
    style: random.pickWeighted<WorkingStyle>([
      { weight: 46, choice: 'terms' },
      { weight: 30, choice: 'sum' },
      { weight: 16, choice: 'last-step' },
      { weight: 8, choice: 'none' },
    ]),
    showsResult: random.chance(0.55),
    favourite: random.pickWeighted([
      { weight: 0.001, choice: '' },
      ...items.flatMap((item) => item.slips.map(({ slip, weight }) => ({ weight, choice: slip }))),
    ]),
  };
}

const fates = [
  { weight: 15, choice: 'crossed-out' },
  { weight: 10, choice: 'two-answers' },
  { weight: 4, choice: 'cannot-read' },
  { weight: 4, choice: 'elsewhere' },
  { weight: 967, choice: 'value' },
] as const;

const SHARE = {
  withoutWorking: 0.07,
  comma: 0.0105,
  // About half of the values have a figure that can be drawn between two.
  unclear: 0.013,
  replaced: 0.04,
  faint: 0.012,
  roundedOfRight: 0.115,
  slipOfWrong: 0.82,
} as const;

const ELSEWHERE = ['see over', 'see back', 'on the back', 'see last page'] as const;

function answerTo(item: ItemFacts, itemCount: number, habits: Habits, random: Random): AnswerTruth {
  const itemNumber = item.number;
  // Time runs out towards the end, and sooner for the weak.
  const late = itemNumber / itemCount;
  if (random.chance(0.012 * Math.exp(1.1 * late - 0.7 * habits.ability))) {
    return { itemNumber, kind: 'blank', text: '', working: [], origin: 'none', expected: { code: 'blank' } };
  }
  const value = valueFor(item, late, habits, random);
  const { text, origin, slip } = value;
  const other = otherThan(text, item, random);
  const working = random.chance(SHARE.withoutWorking) ? [] : workingFor(item, value, habits);
  const given = { itemNumber, working, origin, ...(slip === undefined ? {} : { slip }) };
  const kind = random.pickWeighted(fates);
  switch (kind) {
    case 'value':
      return { ...given, kind, ...shown(text, other, random) };
    case 'two-answers':
      return { ...given, kind, text, second: other, expected: { code: kind } };
    case 'elsewhere':
      return { ...given, kind, text: random.pick(ELSEWHERE), expected: { code: kind } };
    default:
      return { ...given, kind, text, expected: { code: kind } };
  }
}

type Shown = Pick<WrittenAnswer, 'text' | 'struck' | 'unclear' | 'isFaint'> & { readonly expected: ExpectedReading };

/** How a value got into its box: with a comma, with a figure that may be another, after a first try, or hardly visible. */
function shown(value: string, other: string, random: Random): Shown {
  const fate = random.next();
  if (fate < SHARE.comma) {
    const text = value.replace('.', ',');
    return { text, expected: { text } };
  }
  const expected = { text: value };
  if (fate < SHARE.comma + SHARE.unclear) {
    const alsoPossible = lookAlike(value);
    return { text: value, expected, ...(alsoPossible === undefined ? {} : { unclear: [value, alsoPossible] as const }) };
  }
  if (random.chance(SHARE.replaced)) return { text: value, struck: other, expected };
  return random.chance(SHARE.faint) ? { text: value, isFaint: true, expected } : { text: value, expected };
}

const twins: Readonly<Record<string, string>> = { '1': '7', '7': '1', '4': '9', '9': '4' };

/** The value with its first figure that looks like another exchanged for that one; undefined when it has none. */
function lookAlike(text: string): string | undefined {
  const at = [...text].findIndex((figure) => figure in twins);
  return at < 0 ? undefined : text.slice(0, at) + (twins[text[at] ?? ''] ?? '') + text.slice(at + 1);
}

interface Value {
  readonly text: string;
  readonly origin: 'key' | 'rounding' | 'slip' | 'other';
  readonly slip?: string;
  readonly terms?: readonly Term[];
  readonly nuclear?: number;
}

function valueFor(item: ItemFacts, late: number, habits: Habits, random: Random): Value {
  const ease = 1.75 - 0.6 * late + 1.05 * habits.ability;
  if (random.chance(1 / (1 + Math.exp(-ease)))) {
    return item.roundings.length > 0 && random.chance(SHARE.roundedOfRight)
      ? { text: random.pick(item.roundings), origin: 'rounding', terms: item.terms }
      : { text: item.key, origin: 'key', terms: item.terms };
  }
  if (item.slips.length === 0 || !random.chance(SHARE.slipOfWrong)) {
    return { text: random.pick(wrongNumbers(item)), origin: 'other', terms: item.terms };
  }
  const { text, slip, terms, nuclear = item.nuclear } = random.pickWeighted(
    item.slips.map((each) => ({ weight: each.weight * (each.slip === habits.favourite ? 8 : 1), choice: each })),
  );
  return { text, origin: 'slip', slip, ...(terms ? { terms, nuclear } : {}) };
}

const wrongNumbers = (item: ItemFacts): readonly string[] =>
  arithmeticErrors(item.key, new Set([...item.roundings, ...item.slips.map((slip) => slip.text)]));

function otherThan(text: string, item: ItemFacts, random: Random): string {
  const choices = [item.key, ...item.slips.map((slip) => slip.text), ...wrongNumbers(item)].filter((choice) => choice !== text);
  return random.pick(choices);
}

function workingFor(item: ItemFacts, value: Value, habits: Habits): readonly string[] {
  if (habits.style === 'none') return [];
  const isRounded = value.origin === 'rounding';
  const written = isRounded ? item.key : value.text;
  const sum = { quantity: item.quantity, nuclear: value.nuclear ?? item.nuclear, terms: value.terms ?? [] };
  // An error of arithmetic stands at the end of a right sum.
  const follows = value.terms !== undefined && (value.origin === 'other' || leadsTo(sum, decimal(written)));
  if (follows) return workingLines(sum, habits.style, written, habits.showsResult);
  return item.quantity === 'zeff' ? lastStepTo(item.nuclear, decimal(written)) : [];
}
