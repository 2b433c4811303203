import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { averageRunLength, pauseChance } from './pause-chances';
import { BAD_RATE, countPerMiss, freshPauseState, GOOD_RATE, nextCount, observe, PAUSE_RULE, type Observation, type PauseRule, type PauseState } from './reader-pause';

const feed = (observations: readonly Observation[], rule?: PauseRule): PauseState => observations.reduce((state, one) => observe(state, one, rule), freshPauseState);
const many = (n: number, source: Observation['source'], isMiss = false): Observation[] => Array.from({ length: n }, () => ({ source, isMiss }));
const missedPair = many(1, 'pair', true);
const missedKnown = many(1, 'known', true);

it('a miss weighs 45 matches when 1 % is to be told from 4 %', () => {
  // By hand: ln 4 = 1.3863, ln(0.99/0.96) = 0.030772, and their ratio is 45.05.
  expect(countPerMiss(GOOD_RATE, BAD_RATE)).toBe(45);
  expect([nextCount(0, false, PAUSE_RULE), nextCount(0, true, PAUSE_RULE), nextCount(45, false, PAUSE_RULE)]).toEqual([0, 45, 44]);
});

describe('three misses in the last twenty known answers', () => {
  // The cumulative count is put out of reach.
  const rule = { ...PAUSE_RULE, limit: 10_000 };

  it('pause, at the third', () => {
    const two = [...missedKnown, ...many(9, 'known'), ...missedKnown, ...many(8, 'known')];
    expect(feed(two, rule).paused).toBeNull();
    expect(feed([...two, ...missedKnown], rule).paused).toBe('three in twenty');
  });

  it('do not when the first is the twenty-first from the end, and settled pairs are no known answers', () => {
    expect(feed([...missedKnown, ...many(9, 'known'), ...missedKnown, ...many(9, 'known'), ...missedKnown], rule).paused).toBeNull();
    expect(feed([...missedKnown, ...missedKnown, ...many(30, 'pair'), ...missedPair], rule).paused).toBeNull();
    expect(feed([...missedKnown, ...missedKnown, ...many(30, 'pair'), ...missedKnown], rule).paused).toBe('three in twenty');
  });
});

describe('the cumulative count', () => {
  it('stands at 45 after a miss on a known answer from the start', () => {
    expect(feed(missedKnown)).toEqual({ known: [true], count: 45, observed: 1, sinceZero: 1, paused: null });
  });

  it('pauses at 135: three misses in a row, or four with 45 matches between', () => {
    expect(feed([...missedPair, ...missedPair]).count).toBe(90);
    expect(feed([...missedPair, ...missedPair, ...missedPair]).paused).toBe('cumulative count');
    expect(feed([...missedPair, ...many(1, 'pair'), ...missedPair, ...missedPair]).paused).toBeNull();
    expect(feed([...missedPair, ...many(45, 'pair'), ...missedPair, ...missedPair, ...missedPair]).paused).toBe('cumulative count');
  });

  it('says how long the run is, and what was clean before is not in it', () => {
    const state = feed([...many(100, 'pair'), ...missedPair, ...many(10, 'pair'), ...missedPair]);
    expect([state.observed, state.count, state.sinceZero]).toEqual([112, 80, 12]);
    expect(feed([...missedPair, ...many(45, 'pair')]).sinceZero).toBe(0);
  });

  it('a paused reader stays paused, with the first reason, until the state is fresh', () => {
    const paused = feed([...missedPair, ...missedPair, ...missedPair, ...many(400, 'known')]);
    expect(paused.paused).toBe('cumulative count');
    expect(freshPauseState.paused).toBeNull();
  });

  it('never falls below 0, and one more miss never leads to a lower count', () => {
    fc.assert(
      fc.property(fc.array(fc.record({ source: fc.constantFrom('known' as const, 'pair' as const), isMiss: fc.boolean() }), { minLength: 1, maxLength: 80 }), fc.nat(), (list, pick) => {
        const state = feed(list);
        const at = pick % list.length;
        const worse = feed(list.map((one, index) => (index === at ? { ...one, isMiss: true } : one)));
        expect(state.count).toBeGreaterThanOrEqual(0);
        expect(worse.count).toBeGreaterThanOrEqual(state.count);
        if (state.paused) expect(worse.paused).not.toBeNull();
        expect(state.known.length).toBeLessThanOrEqual(20);
      }),
    );
  });
});

describe('chances worked on the chain', () => {
  const pairsOnly: PauseRule = { misses: 3, window: 20, perMiss: 45, limit: 90 };

  it('are those worked by hand for the shortest stretches', () => {
    // Three misses in three known answers: 0.04 cubed. Two misses in two pairs reach 90: 0.04 squared.
    expect(pauseChance({ errorRate: 0.04, knownShare: 1 }, 3).chance).toBeCloseTo(0.04 ** 3, 12);
    expect(pauseChance({ errorRate: 0.04, knownShare: 0, rule: pairsOnly }, 2).chance).toBeCloseTo(0.04 ** 2, 12);
    // Known answers alone, the count out of reach: at least 3 misses in 20, 1 - (0.99^20 + 20 x 0.01 x 0.99^19 + 190 x 0.01^2 x 0.99^18).
    const byHand = 1 - (0.99 ** 20 + 20 * 0.01 * 0.99 ** 19 + 190 * 0.01 ** 2 * 0.99 ** 18);
    expect(pauseChance({ errorRate: 0.01, knownShare: 1, rule: { ...PAUSE_RULE, limit: 1000 } }, 20).chance).toBeCloseTo(byHand, 12);
  });

  it('average run: 3 where every reading is wrong, and 1/p where the first miss pauses', () => {
    expect(averageRunLength({ errorRate: 1, knownShare: 0.5 })).toBeCloseTo(3, 10);
    expect(averageRunLength({ errorRate: 0.04, knownShare: 0, rule: { ...pairsOnly, limit: 45 } })).toBeCloseTo(25, 6);
    // Runs of two misses: (1 + p)/p squared, W. Feller, An Introduction to Probability Theory and Its Applications I, XIII.7, from memory.
    expect(averageRunLength({ errorRate: 0.25, knownShare: 1, rule: { misses: 2, window: 2, perMiss: 1, limit: 3000 } })).toBeCloseTo(20, 5);
  });

  it('rise with the stretch and with the error rate', () => {
    const at = (errorRate: number, n: number): number => pauseChance({ errorRate, knownShare: 0.1 }, n).chance;
    expect(at(0.01, 50)).toBeLessThan(at(0.01, 100));
    expect(at(0.01, 100)).toBeLessThan(at(0.04, 100));
    expect(at(0, 200)).toBeCloseTo(0, 12);
  });
});
