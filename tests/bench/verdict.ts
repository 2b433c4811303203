import { decimal, equals } from '../../shared/chemistry/exact';
import { slipsOf } from '../../shared/chemistry/slips/slips-of';
import { emptyContext } from '../../shared/marking/scheme';
import { markAnswer } from '../../shared/marking/verdict';
import { benchScheme } from './bench-scheme';
import { median, type BenchLine } from './figures';

const comparisons = 42;
const rounds = 15;
const perRound = 2000;

function microsecondsOf(work: (index: number) => void): number {
  const begun = process.hrtime.bigint();
  for (let index = 0; index < perRound; index += 1) work(index);
  return Number(process.hrtime.bigint() - begun) / 1e3 / perRound;
}

/** One verdict on a value that no rule pays, its slips looked for, as a ratio to 42 bare comparisons of exact numbers. */
export function benchVerdict(): BenchLine[] {
  const { scheme } = benchScheme();
  const values = slipsOf(scheme.asked).map(({ value }) => value);
  const texts = Array.from({ length: perRound }, (_, index) => `${1 + (index % 14)}.${String(index % 100).padStart(2, '0')}`);
  const wanted = texts.map((text) => decimal(text));
  const figures = { ours: [] as number[], floor: [] as number[] };
  let met = 0;
  for (let round = 0; round <= rounds; round += 1) {
    const floor = microsecondsOf((index) => {
      for (let at = 0; at < comparisons; at += 1) if (equals(wanted[index] as (typeof wanted)[number], values[at % values.length] as (typeof values)[number])) met += 1;
    });
    const ours = microsecondsOf((index) => void markAnswer(scheme, { text: texts[index] as string }, emptyContext));
    // The first round warms both up.
    if (round > 0) {
      figures.ours.push(ours);
      figures.floor.push(floor);
    }
  }
  const [verdict, floor] = [median(figures.ours), median(figures.floor)];
  return [{ name: 'one verdict with its slips / 42 bare comparisons', ratio: verdict / floor, budget: null, detail: `${verdict.toFixed(1)} µs to ${floor.toFixed(1)} µs, ${values.length} slips, ${met} met` }];
}
