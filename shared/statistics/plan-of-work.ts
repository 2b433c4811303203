/** A time offered for reading, in milliseconds since 1970. */
export interface Window {
  readonly from: number;
  readonly to: number;
}

export interface PlannedReader {
  readonly reader: string;
  readonly windows: readonly Window[];
  /** Readings that are this reader's to do. */
  readonly readings: number;
  readonly secondsPerReading: number;
}

/** When a reader is done, or the hours still missing when what is offered does not do. */
export interface Finish {
  readonly reader: string;
  readonly finishesAt: number | null;
  readonly hoursMissing: number;
}

export interface PlanFinish {
  readonly readers: readonly Finish[];
  /** When the last is done; null while hours are missing. */
  readonly finishesAt: number | null;
  readonly hoursMissing: number;
}

const HOUR = 3_600_000;

/**
 * When each reader of a plan is done, and the plan, working through the times offered from now on. Ours, no source; milliseconds and
 * hours. 120 readings of 30 s, offered from 0 to 0.5 h and from 2 h to 4 h, are done at 2.5 h.
 */
export function finishingTimes(plan: readonly PlannedReader[], now: number): PlanFinish {
  const readers = plan.map((reader) => finishOf(reader, now));
  const hoursMissing = readers.reduce((sum, finish) => sum + finish.hoursMissing, 0);
  const last = Math.max(now, ...readers.map(({ finishesAt }) => finishesAt ?? now));
  return { readers, finishesAt: hoursMissing > 0 ? null : last, hoursMissing };
}

function finishOf({ reader, windows, readings, secondsPerReading }: PlannedReader, now: number): Finish {
  let left = readings * secondsPerReading * 1000;
  let at = now;
  for (const { from, to } of [...windows].sort((one, other) => one.from - other.from)) {
    if (left <= 0) break;
    const start = Math.max(from, at);
    const used = Math.min(left, Math.max(0, to - start));
    if (used > 0) [at, left] = [start + used, left - used];
  }
  return left > 0 ? { reader, finishesAt: null, hoursMissing: left / HOUR } : { reader, finishesAt: at, hoursMissing: 0 };
}

/** What a reader offers, for sharing out. */
export interface Offer {
  readonly reader: string;
  readonly hours: number;
  readonly secondsPerReading: number;
}

/**
 * Shares readings out so that all are busy for one part of the hours they offer; what is left over goes to the largest remainders,
 * the earlier reader first. Remainders: A. Hamilton's method (1792), from memory. 100 readings over 2 h and 1 h at one pace: 67, 33.
 */
export function shareOut(readings: number, offers: readonly Offer[]): readonly number[] {
  const capacities = offers.map(({ hours, secondsPerReading }) => Math.max(0, hours) / secondsPerReading);
  const all = capacities.reduce((sum, capacity) => sum + capacity, 0);
  if (all === 0) return offers.map(() => 0);
  const due = capacities.map((capacity) => (readings * capacity) / all);
  const whole = due.map(Math.floor);
  const over = readings - whole.reduce((sum, count) => sum + count, 0);
  const byRemainder = due.map((share, at) => ({ at, part: share - Math.floor(share) })).sort((one, other) => other.part - one.part || one.at - other.at);
  const favoured = new Set(byRemainder.slice(0, over).map(({ at }) => at));
  return whole.map((count, at) => count + (favoured.has(at) ? 1 : 0));
}
