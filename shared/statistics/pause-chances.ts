import { nextCount, PAUSE_RULE, type PauseRule } from './reader-pause';

export interface PauseQuestion {
  /** Share of readings that are wrong, each by itself. */
  readonly errorRate: number;
  /** Share of observations that are known answers, each by chance; the others are settled pairs. */
  readonly knownShare: number;
  readonly rule?: PauseRule;
}

/** Chance of a pause within a stretch of so many observations, from a fresh start. */
export interface PauseChance {
  readonly observations: number;
  readonly chance: number;
}

/**
 * The chance that a reader is paused within so many observations: the false-pause rate at 1 %, the power at 4 %. Worked exactly on
 * the Markov chain of misses in the window and the cumulative count. Source: D. Brook and D. A. Evans, Biometrika 59, 539 (1972).
 * With known answers alone and 3 of them, at 4 %: 0.04 cubed.
 */
export function pauseChance(question: PauseQuestion, observations: number): PauseChance {
  const step = chainOf(question);
  let reading = 1;
  for (let done = 0; done < observations; done += 1) reading = step();
  return { observations, chance: Math.max(0, 1 - reading) };
}

/**
 * How many observations pass before a pause, on average: the sum of the chances of still reading after 0, 1, 2 of them, its tail
 * taken as geometric once the rate at which it falls has settled. Source: Brook and Evans 1972. Where every reading is wrong: 3.
 */
export function averageRunLength(question: PauseQuestion): number {
  const step = chainOf(question);
  let [sum, estimate, before, after] = [0, 0, 1, 1];
  for (let block = 0; block < 2000; block += 1) {
    for (let done = 0; done < BLOCK; done += 1) {
      sum += after;
      [before, after] = [after, step()];
      if (after < 1e-12) return sum;
    }
    const next = sum + after / (1 - after / before);
    if (Math.abs(next - estimate) < 1e-7 * next) return next;
    estimate = next;
  }
  return estimate;
}

/** Observations between two looks at the tail. */
const BLOCK = 100;

/** A chance that no figure would show; leaving such places out keeps the chain from crawling through denormal numbers. */
const NEVER = 1e-18;

/** Ways the misses can lie in the window of known answers, short of a pause, and which follows a match or a miss; -1 is a pause. */
interface Windows {
  readonly afterMatch: Int32Array;
  readonly afterMiss: Int32Array;
}

/** Ages of the misses, as bits: bit 0 is the latest known answer. */
function windowsOf({ misses, window }: PauseRule): Windows {
  const found = new Map<number, number>([[0, 0]]);
  const order = [0];
  const mask = 2 ** (window - 1) - 1;
  const at = (bits: number): number => {
    if (bitsSet(bits) >= misses) return -1;
    const kept = bits & mask;
    if (!found.has(kept)) {
      found.set(kept, order.length);
      order.push(kept);
    }
    return found.get(kept) ?? -1;
  };
  const follow: [number, number][] = [];
  for (let next = 0; next < order.length; next += 1) {
    const bits = order[next] ?? 0;
    follow.push([at(bits << 1), at((bits << 1) | 1)]);
  }
  return { afterMatch: Int32Array.from(follow, ([match]) => match), afterMiss: Int32Array.from(follow, ([, miss]) => miss) };
}

function bitsSet(bits: number): number {
  let count = 0;
  for (let left = bits; left > 0; left &= left - 1) count += 1;
  return count;
}

/** One more observation: the chance, after it, that there was no pause yet. */
type Step = () => number;

/** Chances of each window and count, short of a pause; what is gone has been paused. */
function chainOf({ errorRate, knownShare, rule = PAUSE_RULE }: PauseQuestion): Step {
  const { afterMatch, afterMiss } = windowsOf(rule);
  const { limit } = rule;
  const counts = Array.from({ length: limit }, (_, count) => count);
  const up = Int32Array.from(counts, (count) => nextCount(count, true, rule));
  const down = Int32Array.from(counts, (count) => nextCount(count, false, rule));
  const [missKnown, matchKnown] = [errorRate * knownShare, (1 - errorRate) * knownShare];
  const [missPair, matchPair] = [errorRate * (1 - knownShare), (1 - errorRate) * (1 - knownShare)];
  let now = new Float64Array(afterMatch.length * limit);
  let next = new Float64Array(now.length);
  now[0] = 1;
  // NOTE: tens of thousands of places a step; loops by index are several times faster than forEach.
  return () => {
    let paused = 0;
    let before = 0;
    next.fill(0);
    for (let way = 0; way < afterMatch.length; way += 1) {
      const [own, match, miss] = [way * limit, afterMatch[way]! * limit, afterMiss[way]! * limit];
      for (let count = 0; count < limit; count += 1) {
        const chance = now[own + count]!;
        if (chance < NEVER) continue;
        const more = up[count]!;
        const less = down[count]!;
        before += chance;
        next[own + less]! += chance * matchPair;
        next[match + less]! += chance * matchKnown;
        if (more < limit) next[own + more]! += chance * missPair;
        else paused += chance * missPair;
        if (more < limit && miss >= 0) next[miss + more]! += chance * missKnown;
        else paused += chance * missKnown;
      }
    }
    [now, next] = [next, now];
    return before - paused;
  };
}
