import type { DeskLease } from '../../contracts/desk';
import type { Code } from '../../marking/scheme';

export interface Said {
  readonly text?: string;
  readonly code?: Code;
  readonly note?: string;
  /** Ids of the method marks struck; only of an item that has some. */
  readonly method?: readonly string[];
}

/** An answer that was read on this page, with what was said. */
export interface DoneAnswer {
  readonly readingId: string;
  readonly lease: DeskLease;
  readonly said: Said;
  readonly at: number;
}

export interface WorkList {
  /** Still to read, the first one next. */
  readonly held: readonly DeskLease[];
  /** Read on this page, the newest last. */
  readonly done: readonly DoneAnswer[];
  /** How far back one looks, 0 for the answer to read. Negative: past it, at answers that come later. */
  readonly back: number;
}

export const emptyWork: WorkList = { held: [], done: [], back: 0 };
const remembered = 50;

/**
 * Adds leases that are not here yet; the order the server gave stays. Left out are answers whose reading has not reached the
 * server, and those read since it was asked: its answer was made before it knew of them.
 */
export function withLeases(work: WorkList, leases: readonly DeskLease[], unsent: ReadonlySet<string>, askedAt = Infinity): WorkList {
  const readSince = work.done.filter(({ at }) => at >= askedAt).map(({ lease }) => lease.answerId);
  const known = new Set([...work.held.map(({ answerId }) => answerId), ...unsent, ...readSince]);
  return { ...work, held: [...work.held, ...leases.filter(({ answerId }) => !known.has(answerId))] };
}

/** Moves the answer on view from what is to read to what is read. */
export function withReading(work: WorkList, done: DoneAnswer): WorkList {
  return { held: work.held.filter(({ answerId }) => answerId !== done.lease.answerId), done: [...work.done, done].slice(-remembered), back: 0 };
}

/** Takes a reading the server refused off what is read: its answer may come again. */
export const withoutReading = (work: WorkList, readingId: string): WorkList => ({ ...work, done: work.done.filter((done) => done.readingId !== readingId), back: 0 });

/** Puts an answer that was taken back first in line; one that went to somebody else only leaves the list. */
export function withTakenBack(work: WorkList, readingId: string, lease: DeskLease | null): WorkList {
  const rest = lease === null ? work.held : [lease, ...work.held.filter(({ answerId }) => answerId !== lease.answerId)];
  return { held: rest, done: work.done.filter((done) => done.readingId !== readingId), back: 0 };
}

export type OnView = { readonly kind: 'next' | 'later'; readonly lease: DeskLease } | { readonly kind: 'done'; readonly done: DoneAnswer } | { readonly kind: 'none' };

/** What the desk shows: the next answer, or one looked back or on at. */
export function onView({ held, done, back }: WorkList): OnView {
  if (back > 0) {
    const one = done[done.length - back];
    return one ? { kind: 'done', done: one } : { kind: 'none' };
  }
  const lease = held[-back];
  return lease ? { kind: back === 0 ? 'next' : 'later', lease } : { kind: 'none' };
}

/** Looks further back (1) or on (-1), as far as there is something. */
export function looking(work: WorkList, step: 1 | -1): WorkList {
  const back = Math.min(work.done.length, Math.max(-(work.held.length - 1), work.back + step));
  return { ...work, back: work.held.length === 0 ? Math.max(0, back) : back };
}
