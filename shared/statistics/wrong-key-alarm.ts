import { readingLead } from './reading-lead';
import { wilson } from './intervals';
import { correlation, total } from './moments';

/** One reading of the item, as far as it is read. */
export interface AlarmReading {
  /** What several scripts can share: a value, equal ones under one text, or a code; null where nothing stands. */
  readonly reading: string | null;
  /** It is the key or one of its accepted roundings. */
  readonly meetsKey: boolean;
  /** The other convention whose value it is; null if none. */
  readonly convention: string | null;
  /** Marks given over marks available. */
  readonly share: number;
  /** Mean share of the same script over the other items read; null where none is. */
  readonly rest: number | null;
}

export interface AlarmQuestion {
  readonly readings: readonly AlarmReading[];
  /** Of the other items of the paper, as far as they are read. */
  readonly otherFacilities: readonly number[];
}

interface LeadGround {
  readonly n: number;
  /** The commonest reading that is not the key, how often it stands and how often the key is met. */
  readonly reading: string;
  readonly count: number;
  readonly meetKey: number;
  /** How likely so great a lead would be if both were equally common. */
  readonly chance: number;
}

/** A ground with its evidence and what it rests on. */
export type Ground =
  | (LeadGround & { readonly name: 'commonest reading' | 'best quarter' })
  | (LeadGround & { readonly name: 'other convention'; readonly convention: string })
  | { readonly name: 'correlation'; readonly n: number; readonly r: number; readonly highest: number }
  | { readonly name: 'facility'; readonly n: number; readonly facility: number; readonly highest: number; readonly median: number };

export interface Alarm {
  readonly isRaised: boolean;
  readonly n: number;
  readonly grounds: readonly Ground[];
}

/** When a ground is taken to hold. Ours, tuned on simulated papers; no source. */
export interface AlarmLimits {
  /** Below so many readings there is no alarm. */
  readonly leastN: number;
  /** From so many on one ground is enough. */
  readonly aloneFrom: number;
  /** The lead over the key must have a chance no greater, among all and among the best quarter. */
  readonly chance: number;
  readonly chanceInBest: number;
  /** The correlation, with 1.645 standard errors added, is no higher. */
  readonly highestR: number;
  /** The facility, by its upper Wilson limit, is no higher than so much of the median of the others. */
  readonly ofMedian: number;
}

export const ALARM_LIMITS: AlarmLimits = { leastN: 12, aloneFrom: 40, chance: 0.002, chanceInBest: 0.005, highestR: 0, ofMedian: 0.3 };

const Z_95 = 1.6448536269514722;

/**
 * Grounds to doubt the key of an item while reading goes on; raised when two hold, or one with 40 readings. The grounds are ours, no
 * source; a lead is tested by signs (J. Arbuthnott, Phil. Trans. 27, 186, 1710). Counts and shares. Where 10 of 12 read 2.85 and
 * nobody the key 3.10, "commonest reading" holds with a chance of 1/1024, and alone raises nothing.
 */
export function wrongKeyAlarm({ readings, otherFacilities }: AlarmQuestion, limits: AlarmLimits = ALARM_LIMITS): Alarm {
  const n = readings.length;
  if (n < limits.leastN) return { isRaised: false, n, grounds: [] };
  const grounds = [
    ...leadGrounds(readings, limits),
    ...bestQuarterGround(readings, limits),
    ...correlationGround(readings, limits),
    ...facilityGround(readings, otherFacilities, limits),
  ];
  return { isRaised: grounds.length >= 2 || (grounds.length === 1 && n >= limits.aloneFrom), n, grounds };
}

/** The commonest reading is not the key, and whether it is another convention's value. */
function leadGrounds(readings: readonly AlarmReading[], { chance }: AlarmLimits): Ground[] {
  const lead = readingLead(readings);
  if (!lead || lead.chance > chance) return [];
  const { convention, ...evidence } = lead;
  const ground: Ground = { name: 'commonest reading', ...evidence };
  return convention === null ? [ground] : [ground, { name: 'other convention', convention, ...evidence }];
}

/** Among the quarter that is best on the other items, those level at the edge included. */
function bestQuarterGround(readings: readonly AlarmReading[], { chanceInBest }: AlarmLimits): Ground[] {
  const ranked = withRest(readings).sort((one, other) => other.rest - one.rest);
  const edge = ranked[Math.ceil(ranked.length / 4) - 1]?.rest;
  const lead = edge === undefined ? null : readingLead(ranked.filter(({ rest }) => rest >= edge));
  if (!lead || lead.chance > chanceInBest) return [];
  const { n, reading, count, meetKey, chance } = lead;
  return [{ name: 'best quarter', n, reading, count, meetKey, chance }];
}

/** Upper limit by R. A. Fisher, Metron 1 (4), 3 (1921), from memory. */
function correlationGround(readings: readonly AlarmReading[], { highestR }: AlarmLimits): Ground[] {
  const beside = withRest(readings);
  const n = beside.length;
  const r = n < 4 ? null : correlation(beside.map(({ share }) => share), beside.map(({ rest }) => rest));
  if (r === null || r > 0) return [];
  const highest = Math.tanh(Math.atanh(r) + Z_95 / Math.sqrt(n - 3));
  return highest > highestR ? [] : [{ name: 'correlation', n, r, highest }];
}

function facilityGround(readings: readonly AlarmReading[], others: readonly number[], { ofMedian }: AlarmLimits): Ground[] {
  const n = readings.length;
  const median = [...others].sort((one, other) => one - other)[Math.floor(others.length / 2)];
  if (median === undefined) return [];
  const facility = total(readings.map(({ share }) => share)) / n;
  const highest = wilson(Math.round(facility * n), n, Z_95).high;
  return highest > ofMedian * median ? [] : [{ name: 'facility', n, facility, highest, median }];
}

const withRest = (readings: readonly AlarmReading[]): (AlarmReading & { readonly rest: number })[] =>
  readings.filter((one): one is AlarmReading & { readonly rest: number } => one.rest !== null);
