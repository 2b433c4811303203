import { binomialAtMost } from './distributions';

interface Read {
  readonly reading: string | null;
  readonly meetsKey: boolean;
  readonly convention: string | null;
}

/** The commonest reading that is not the key, against those that meet it. */
export interface ReadingLead {
  readonly n: number;
  readonly reading: string;
  readonly convention: string | null;
  readonly count: number;
  readonly meetKey: number;
  /** How likely it would be so far ahead if both were equally common; 1 where it is not ahead. */
  readonly chance: number;
}

/**
 * How far the commonest reading but the key leads it: a one-sided sign test of the two counts (J. Arbuthnott, Phil. Trans. 27, 186,
 * 1710, from memory). Of two readings level with each other the one whose text comes first. Ten against none: 1/1024.
 */
export function readingLead(readings: readonly Read[]): ReadingLead | null {
  const counts = new Map<string, { reading: string; convention: string | null; count: number }>();
  let meetKey = 0;
  for (const { reading, convention, meetsKey } of readings) {
    if (meetsKey) meetKey += 1;
    else if (reading !== null) {
      const known = counts.get(reading);
      if (known) known.count += 1;
      else counts.set(reading, { reading, convention, count: 1 });
    }
  }
  const [first] = [...counts.values()].sort((one, other) => other.count - one.count || (one.reading < other.reading ? -1 : 1));
  if (!first) return null;
  return { n: readings.length, ...first, meetKey, chance: first.count <= meetKey ? 1 : binomialAtMost(meetKey, meetKey + first.count, 0.5) };
}
