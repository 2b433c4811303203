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
const NEVER = 1e-22;

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
  const windows = windowsOf(rule);
  const { limit } = rule;
  let now = new Float64Array(windows.afterMatch.length * limit);
  let next = new Float64Array(now.length);
  now[0] = 1;
  // A place and its chance; what it returns is 0 for a pause.
  const put = (way: number, count: number, chance: number): number => {
    if (way < 0 || count >= limit) return 0;
    next[way * limit + count]! += chance;
    return chance;
  };
  // NOTE: tens of thousands of places a step; a loop by index is several times faster than forEach.
  return () => {
    let reading = 0;
    next.fill(0);
    for (let at = 0; at < now.length; at += 1) {
      const chance = now[at]!;
      if (chance < NEVER) continue;
      const way = Math.floor(at / limit);
      const miss = nextCount(at % limit, true, rule);
      const match = nextCount(at % limit, false, rule);
      reading += put(windows.afterMiss[way]!, miss, chance * errorRate * knownShare) + put(windows.afterMatch[way]!, match, chance * (1 - errorRate) * knownShare);
      reading += put(way, miss, chance * errorRate * (1 - knownShare)) + put(way, match, chance * (1 - errorRate) * (1 - knownShare));
    }
    [now, next] = [next, now];
    return reading;
  };
}
