import { describe, expect, it } from 'vitest';
import { randomFrom } from '../../db/seed/truth/random';
import { binomialAtMost } from '../../shared/statistics/distributions';
import { averageRunLength, pauseChance } from '../../shared/statistics/pause-chances';
import { BAD_RATE, freshPauseState, GOOD_RATE, observe } from '../../shared/statistics/reader-pause';

const KNOWN_SHARE = 0.08;

/** Observations until the rule pauses a reader, or the end of the stretch. */
function pausedAfter(errorRate: number, length: number, seed: string): number | null {
  const random = randomFrom('reader pause', errorRate, seed);
  let state = freshPauseState;
  for (let at = 1; at <= length; at += 1) {
    state = observe(state, { source: random.chance(KNOWN_SHARE) ? 'known' : 'pair', isMiss: random.chance(errorRate) });
    if (state.paused) return at;
  }
  return null;
}

/** The exact two-sided chance of a count as far out as this one, twice the smaller tail. */
const asFarOut = (count: number, n: number, p: number): number => Math.min(1, 2 * Math.min(binomialAtMost(count, n, p), 1 - (count === 0 ? 0 : binomialAtMost(count - 1, n, p))));

describe('the pause rule, simulated against the chain', () => {
  it.each([[GOOD_RATE, 50], [GOOD_RATE, 300], [BAD_RATE, 50], [BAD_RATE, 150], [BAD_RATE, 300]])('at a rate of %f, 4,000 stretches of %i are paused as often as computed', (errorRate, length) => {
    const { chance } = pauseChance({ errorRate, knownShare: KNOWN_SHARE }, length);
    const paused = Array.from({ length: 4000 }, (_, run) => pausedAfter(errorRate, length, `${length} ${run}`)).filter((after) => after !== null).length;
    expect(asFarOut(paused, 4000, chance)).toBeGreaterThan(0.01);
  });

  it('the average run at 4 % is the one computed, within three standard errors', () => {
    const runs = Array.from({ length: 4000 }, (_, run) => pausedAfter(BAD_RATE, 5000, `run ${run}`) ?? 5000);
    const mean = runs.reduce((sum, run) => sum + run, 0) / runs.length;
    const error = Math.sqrt(runs.reduce((sum, run) => sum + (run - mean) ** 2, 0) / runs.length / runs.length);
    expect(Math.abs(mean - averageRunLength({ errorRate: BAD_RATE, knownShare: KNOWN_SHARE }))).toBeLessThan(3 * error);
  });

  it('a good reader goes on for more than 5,000 observations, one of 4 % for fewer than 150, on average', () => {
    expect(averageRunLength({ errorRate: GOOD_RATE, knownShare: KNOWN_SHARE })).toBeGreaterThan(5000);
    expect(averageRunLength({ errorRate: BAD_RATE, knownShare: KNOWN_SHARE })).toBeLessThan(150);
  });

  it('doubled first readings alone would pause a good reader far more often than all first readings do', () => {
    // 40 % of answers lose marks and are doubled; of the others those misread. A reading is a miss in 1 % of cases, whatever the answer.
    const falsePauses = (takesAll: boolean): number =>
      Array.from({ length: 400 }, (_, run) => {
        const random = randomFrom('chosen by their own errors', run);
        let state = freshPauseState;
        for (let at = 0; at < 300; ) {
          const isMiss = random.chance(GOOD_RATE);
          const isDoubled = isMiss || random.chance(0.4);
          if (!takesAll && !isDoubled) continue;
          state = observe(state, { source: 'pair', isMiss });
          at += 1;
        }
        return state.paused !== null;
      }).filter(Boolean).length;
    expect(falsePauses(false)).toBeGreaterThan(5 * falsePauses(true));
  });
});
