/** A settled answer mixed in unmarked, or a pair that is settled. */
export type ObservationSource = 'known' | 'pair';

/**
 * Whether one reading turned out other than what was settled. Give every reading of its kind, whatever it says: under the by-risk
 * policy a first reading left alone at full marks counts as not missed. Only those doubled for what they say would be chosen by
 * their own errors: where 40 % lose marks, 1 % wrong looks like 0.01/(0.4 + 0.6 x 0.01), or 2.5 %.
 */
export interface Observation {
  readonly source: ObservationSource;
  readonly isMiss: boolean;
}

/** Which half of the rule paused a reader. */
export type PauseReason = 'three in twenty' | 'cumulative count';

export interface PauseRule {
  /** So many misses in the last known answers pause. */
  readonly misses: number;
  readonly window: number;
  /** A miss adds this to the cumulative count, a match takes 1 away; it never falls below 0. */
  readonly perMiss: number;
  /** The count at which a reader pauses. */
  readonly limit: number;
}

/** The error rates, as shares, that the cumulative count is to tell apart. */
export const GOOD_RATE = 0.01;
export const BAD_RATE = 0.04;

/**
 * What a miss adds to the count: the likelihood ratio of two rates gives ln(bad/good) to a miss and ln((1 - bad)/(1 - good)) to a
 * match, and the count is in units of the latter, to whole numbers. Source: M. R. Reynolds and Z. G. Stoumbos, J. Qual. Technol. 31, 87
 * (1999), from memory; after E. S. Page, Biometrika 41, 100 (1954). For 1 % and 4 % it is 45.
 */
export function countPerMiss(good: number, bad: number): number {
  const match = Math.log((1 - good) / (1 - bad));
  return Math.round(Math.log(bad / good) / match);
}

/** Three in twenty, or a count to 135: its false-pause rate and power are worked out in pause-chances. Limit: ours, no source. */
export const PAUSE_RULE: PauseRule = { misses: 3, window: 20, perMiss: countPerMiss(GOOD_RATE, BAD_RATE), limit: 135 };

/** Where one reader stands. */
export interface PauseState {
  /** Misses among the last known answers, the latest last. */
  readonly known: readonly boolean[];
  readonly count: number;
  readonly observed: number;
  /** Observations since the count last stood at 0: where a worse rate most likely began (Page 1954). */
  readonly sinceZero: number;
  readonly paused: PauseReason | null;
}

/** Before the first observation, and after a pause has been lifted. */
export const freshPauseState: PauseState = { known: [], count: 0, observed: 0, sinceZero: 0, paused: null };

/**
 * The state after one more observation; a paused reader stays paused. Rule: ours; count after E. S. Page, Biometrika 41, 100 (1954).
 * A miss on a known answer, from the start, leaves the count at 45.
 */
export function observe(state: PauseState, { source, isMiss }: Observation, rule: PauseRule = PAUSE_RULE): PauseState {
  const known = source === 'known' ? [...state.known, isMiss].slice(-rule.window) : state.known;
  const count = nextCount(state.count, isMiss, rule);
  const paused = state.paused ?? reasonFor(known.filter(Boolean).length, count, rule);
  return { known, count, observed: state.observed + 1, sinceZero: count === 0 ? 0 : state.sinceZero + 1, paused };
}

/** The cumulative count after one observation, never below 0: ours on Page 1954. From 0 a match leaves 0, a miss 45. */
export const nextCount = (count: number, isMiss: boolean, { perMiss }: PauseRule): number => (isMiss ? count + perMiss : Math.max(0, count - 1));

const reasonFor = (misses: number, count: number, rule: PauseRule): PauseReason | null => {
  if (misses >= rule.misses) return 'three in twenty';
  return count >= rule.limit ? 'cumulative count' : null;
};
