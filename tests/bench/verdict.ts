import { decimal, equals } from '../../shared/chemistry/exact';
import { slipsOf } from '../../shared/chemistry/slips/slips-of';
import { emptyContext, type ItemScheme, type MarkingContext } from '../../shared/marking/scheme';
import { markAnswer } from '../../shared/marking/verdict';
import { benchScheme, followingScheme } from './bench-scheme';
import { median, type BenchLine } from './figures';

const comparisons = 42;
const rounds = 15;
const perRound = 2000;

function microsecondsOf(work: (index: number) => void): number {
  const begun = process.hrtime.bigint();
  for (let index = 0; index < perRound; index += 1) work(index);
  return Number(process.hrtime.bigint() - begun) / 1e3 / perRound;
}

interface Case {
  readonly name: string;
  readonly scheme: ItemScheme;
  readonly texts: readonly string[];
  readonly contextOf: (index: number) => MarkingContext;
}

/** The case and its floor take turns, so that both meet the same machine. */
function lineOf({ name, scheme, texts, contextOf }: Case): BenchLine {
  const values = slipsOf(scheme.asked).map(({ value }) => value);
  const wanted = texts.map((text) => decimal(text));
  const figures = { ours: [] as number[], floor: [] as number[] };
  let met = 0;
  for (let round = 0; round <= rounds; round += 1) {
    const floor = microsecondsOf((index) => {
      for (let at = 0; at < comparisons; at += 1) if (equals(wanted[index] as (typeof wanted)[number], values[at % values.length] as (typeof values)[number])) met += 1;
    });
    const ours = microsecondsOf((index) => void markAnswer(scheme, { text: texts[index] as string }, contextOf(index)));
    // The first round warms both up.
    if (round > 0) {
      figures.ours.push(ours);
      figures.floor.push(floor);
    }
  }
  const [verdict, floor] = [median(figures.ours), median(figures.floor)];
  return { name, ratio: verdict / floor, budget: null, detail: `${verdict.toFixed(1)} µs to ${floor.toFixed(1)} µs, ${values.length} slips, ${met} met` };
}

const numbers = (sign: '' | '-'): string[] => Array.from({ length: perRound }, (_, index) => `${sign}${1 + (index % 14)}.${String(index % 100).padStart(2, '0')}`);

/** One verdict on a value that no rule pays, its slips looked for, and the same on one worked again from an earlier answer, each as a ratio to 42 bare comparisons of exact numbers. */
export function benchVerdict(): BenchLine[] {
  const own = numbers('');
  return [
    lineOf({ name: 'one verdict with its slips / 42 bare comparisons', scheme: benchScheme().scheme, texts: own, contextOf: () => emptyContext }),
    lineOf({ name: 'one verdict with its slips and what follows / 42 bare comparisons', scheme: followingScheme('item-1'), texts: numbers('-'), contextOf: (index) => ({ followed: own[(index * 7) % perRound] ?? '' }) }),
  ];
}
