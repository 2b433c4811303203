import type { Code } from './scheme';

/** One live reading as far as settling is concerned. */
export interface SettlingReading {
  readonly id: string;
  readonly canonical: string;
  readonly code: Code | null;
  /** Ids of the method marks struck, in the order of the scheme, with commas. */
  readonly method: string;
}

/** Two readings that agree, as titres do: the same form or code, and the same method marks. */
export const isConcordant = (one: Pick<SettlingReading, 'canonical' | 'method'>, other: Pick<SettlingReading, 'canonical' | 'method'>): boolean =>
  one.canonical === other.canonical && one.method === other.method;

export interface SettlingRuling {
  readonly id: string;
  /** The form that was ruled; null for a ruled mark, which changes no value. */
  readonly canonical: string | null;
}

export interface SettlementFacts {
  /** Live readings, oldest first. */
  readonly readings: readonly SettlingReading[];
  readonly ruling: SettlingRuling | null;
  /** How many readings the policy asks for: 0 while there is nothing to read from, or nobody to mark. */
  readonly wanted: number;
  /** Whether the scheme itself says what a code is worth. */
  readonly schemeDecides: (code: Code) => boolean;
}

export type SettledState =
  | 'ruled'
  | 'set-aside'
  | 'cannot-read'
  | 'not-read'
  | 'one-reading'
  | 'discordant'
  | 'concordant'
  | 'blank';

export interface Settlement {
  readonly state: SettledState;
  /** How many more readings are due. */
  readonly due: number;
  /** The form that stands, and whether a reading or a ruling gave it; null while none does. */
  readonly canonical: string | null;
  readonly from: 'reading' | 'ruling' | null;
  /** Whether a mark stands now. */
  readonly isMarked: boolean;
}

const held = (state: SettledState, due = 0): Settlement => ({ state, due, canonical: null, from: null, isMarked: false });

const settledBy = (state: SettledState, canonical: string): Settlement => ({ state, due: 0, canonical, from: 'reading', isMarked: true });

/**
 * The state of one answer; the first that holds: ruled, set aside, can't read, not read, one reading with another due,
 * discordant, then concordant, blank, or one reading with none due. One reading of 6.10, one wanted: 6.10 stands.
 */
export function settlement({ readings, ruling, wanted, schemeDecides }: SettlementFacts): Settlement {
  const [first] = readings;
  const agreed = first !== undefined && readings.every((reading) => isConcordant(reading, first));
  if (ruling) {
    const standing = ruling.canonical ?? (agreed ? first.canonical : null);
    return { state: 'ruled', due: 0, canonical: standing, from: ruling.canonical === null && standing !== null ? 'reading' : 'ruling', isMarked: true };
  }
  const undecided = readings.flatMap(({ code }) => (code !== null && code !== 'blank' && !schemeDecides(code) ? [code] : []));
  if (undecided.some((code) => code !== 'cannot-read')) return held('set-aside');
  if (undecided.length > 0) return held('cannot-read');
  if (first === undefined) return held('not-read', wanted);
  if (readings.length < wanted) return held('one-reading', wanted - readings.length);
  if (!agreed) return held('discordant');
  if (first.code === 'blank') return settledBy('blank', first.canonical);
  return settledBy(readings.length > 1 ? 'concordant' : 'one-reading', first.canonical);
}
