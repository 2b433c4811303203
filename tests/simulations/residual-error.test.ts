import { describe, expect, it } from 'vitest';
import { randomFrom, type Random } from '../../db/seed/truth/random';
import { binomialAtMost } from '../../shared/statistics/distributions';
import { residualError, type Stratum } from '../../shared/statistics/residual-error';

const SITTINGS = 400;
const SCRIPTS = 300;
const ITEMS = 12;

/** Shares are ours, no source, but for the rate of typing errors, 0.3 % to 4 %. */
interface Setting {
  /** Of misread answers: what was wrong is taken for the key; what was right keeps full marks in another form, such as a zero less. */
  readonly takenForKey: number;
  readonly keepsMarks: number;
  /** Sampling share of an item, and how many times the usual rate its answers are misread. */
  readonly share: (item: number) => number;
  readonly hardness: (item: number) => number;
}

/** What stands in the box, or was read: 0 the key, 1 the key in another form that has full marks, above that other values. */
type Value = number;
const hasFullMarks = (value: Value): boolean => value <= 1;

function misread(truth: Value, setting: Setting, random: Random): Value {
  if (truth === 0) return random.chance(setting.keepsMarks) ? 1 : random.whole(2, 30);
  return random.chance(setting.takenForKey) ? 0 : random.whole(31, 60);
}

/** One sitting read under the by-risk policy; pairs that differ are read a third time and by the lead, who is right. */
function sitting(setting: Setting, seed: number): { readonly strata: readonly Stratum[]; readonly left: number } {
  const random = randomFrom('residual error', seed);
  const usual = 0.003 * Math.exp(random.next() * Math.log(0.04 / 0.003));
  let [left, all] = [0, 0];
  const strata = Array.from({ length: ITEMS }, (_, item): Stratum => {
    const facility = random.between(0.3, 0.9);
    const rate = Math.min(0.3, usual * setting.hardness(item));
    const read = (truth: Value): Value => (random.chance(rate) ? misread(truth, setting, random) : truth);
    const counts = { fullMark: 0, reRead: 0, wrong: 0 };
    for (let script = 0; script < SCRIPTS; script += 1) {
      const truth = random.chance(facility) ? 0 : random.whole(2, 60);
      const first = read(truth);
      if (!hasFullMarks(first)) continue;
      counts.fullMark += 1;
      const isReRead = random.chance(setting.share(item));
      const second = isReRead ? read(truth) : first;
      const third = second === first ? first : read(truth);
      const settled = third === first || third === second ? third : truth;
      if (isReRead) counts.reRead += 1;
      if (isReRead && settled !== first) counts.wrong += 1;
      if (settled !== truth) left += 1;
    }
    all += counts.fullMark;
    return { item: String(item + 1), share: setting.share(item), ...counts };
  });
  return { strata, left: left / all };
}

/** The exact chance of so few in so many where 95 % are due. */
const chanceOfSoFew = (covered: number): number => binomialAtMost(covered, SITTINGS, 0.95);

const even = { share: () => 0.1, hardness: () => 1 };
const settings: readonly (readonly [string, Setting])[] = [
  ['as in common practice, where hardly an error keeps full marks', { takenForKey: 0.05, keepsMarks: 0.05, ...even }],
  ['where half of the errors keep full marks', { takenForKey: 0.3, keepsMarks: 0.5, ...even }],
  ['where half of all is re-read', { takenForKey: 0.3, keepsMarks: 0.5, share: () => 0.5, hardness: () => 1 }],
  ['with shares that differ by item', { takenForKey: 0.3, keepsMarks: 0.5, share: (item) => [0.05, 0.1, 0.3][item % 3] ?? 0.1, hardness: () => 1 }],
  ['with shares that differ, errors where least is re-read', { takenForKey: 0.3, keepsMarks: 0.5, share: (item) => (item < 4 ? 0.05 : 0.25), hardness: (item) => (item < 4 ? 4 : 0.5) }],
];

describe.each(settings)('400 sittings %s', (_, setting) => {
  const sittings = Array.from({ length: SITTINGS }, (__, seed) => {
    const { strata, left } = sitting(setting, seed);
    return { true: left, stated: residualError(strata) };
  });

  it('the stated interval covers the true rate not significantly less often than in 95 %', () => {
    const covered = sittings.filter(({ true: rate, stated: { left } }) => left.low <= rate && rate <= left.high).length;
    expect(chanceOfSoFew(covered)).toBeGreaterThan(0.05);
  });

  it('nor does the one-sided bound', () => {
    const covered = sittings.filter(({ true: rate, stated: { left } }) => rate <= left.atMost).length;
    expect(chanceOfSoFew(covered)).toBeGreaterThan(0.05);
  });

  it('the estimate is right on average, within three standard errors', () => {
    const errors = sittings.map(({ true: rate, stated: { left } }) => left.estimate - rate);
    const mean = errors.reduce((sum, error) => sum + error, 0) / SITTINGS;
    const spread = Math.sqrt(errors.reduce((sum, error) => sum + (error - mean) ** 2, 0) / SITTINGS);
    expect(Math.abs(mean)).toBeLessThan((3 * spread) / Math.sqrt(SITTINGS));
  });
});
