import type { Code } from '../marking/scheme';
import { ApiError, OfflineError } from './api';

/** A reading as it waits on the device. */
export interface KeptReading {
  readonly id: string;
  readonly sittingId: string;
  readonly itemId: string;
  readonly answerId: string;
  readonly leaseId: string;
  readonly candidateNumber: string;
  readonly text?: string;
  readonly code?: Code;
  readonly note?: string;
  /** Ids of the method marks struck; readings kept before there were any name none. */
  readonly method?: readonly string[];
  readonly openedAt: number;
  readonly keptAt: number;
  /** What the server said when it would not take it. */
  readonly refusal?: string;
}

/** Keeps readings of one person on the device, each under its id, so that two windows do not disturb each other. */
export interface ReadingStore {
  all(): Promise<KeptReading[]>;
  put(reading: KeptReading): Promise<void>;
  remove(id: string): Promise<void>;
}

export interface QueueEnds {
  readonly store: ReadingStore;
  send(reading: KeptReading): Promise<void>;
  /** Until it is worth trying again. */
  wait(ms: number): Promise<void>;
}

export interface QueueView {
  readonly waiting: readonly KeptReading[];
  readonly refused: readonly KeptReading[];
  readonly isOffline: boolean;
  readonly needsSignIn: boolean;
  /** How many the server has taken since the page was opened. */
  readonly recorded: number;
  /** Ids of those, the newest last. */
  readonly recordedIds: readonly string[];
}

const longestPauseMs = 15_000;
/** What the server says when it cannot take anything just now: the reading itself is not at fault. */
const isForNow = (error: unknown): boolean => error instanceof OfflineError || (error instanceof ApiError && (error.code === 'internal' || error.code === 'not_ready' || error.code === 'too_many_requests'));
const rememberedIds = 50;

/**
 * Readings on their way from the device to the server, in order. One is on the device before the next answer is shown, and
 * leaves it only after the server has it on disk; sent again after a lost answer it is the same reading by its id.
 */
export class ReadingQueue {
  private kept: KeptReading[] = [];
  private view: QueueView = { waiting: [], refused: [], isOffline: false, needsSignIn: false, recorded: 0, recordedIds: [] };
  private readonly listeners = new Set<() => void>();
  private isPumping = false;

  constructor(private readonly ends: QueueEnds) {}

  readonly snapshot = (): QueueView => this.view;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  /** Takes up what an earlier page left on the device. */
  async resume(): Promise<void> {
    const found = await this.ends.store.all();
    const known = new Set(this.kept.map(({ id }) => id));
    this.kept = [...found.filter(({ id }) => !known.has(id)), ...this.kept].sort((one, other) => one.keptAt - other.keptAt);
    this.tell({});
    void this.pump();
  }

  /** Keeps a reading on the device; it is there when this resolves, and on its way. */
  async keep(reading: KeptReading): Promise<void> {
    await this.ends.store.put(reading);
    this.kept.push(reading);
    this.tell({});
    void this.pump();
  }

  /** Gives up a reading the server has refused, after the person has looked at it. */
  async forget(id: string): Promise<void> {
    await this.drop(id);
    this.tell({});
  }

  /** Sends a refused reading once more, as it is. */
  async sendAgain(id: string): Promise<void> {
    const found = this.kept.find((reading) => reading.id === id);
    if (found?.refusal === undefined) return;
    const { refusal: _said, ...again } = found;
    await this.ends.store.put(again);
    this.kept = this.kept.map((one) => (one.id === id ? again : one));
    this.tryAgain();
  }

  /** Sends nothing until its person is signed in again: under another person's session nothing may go. */
  pause(): void {
    this.tell({ needsSignIn: true });
  }

  /** After a sign-in or when the connection is back. */
  tryAgain(): void {
    this.tell({ needsSignIn: false });
    void this.pump();
  }

  private async drop(id: string): Promise<void> {
    this.kept = this.kept.filter((reading) => reading.id !== id);
    await this.ends.store.remove(id);
  }

  private tell(changes: Partial<QueueView>): void {
    this.view = { ...this.view, ...changes, waiting: this.kept.filter(({ refusal }) => refusal === undefined), refused: this.kept.filter(({ refusal }) => refusal !== undefined) };
    for (const listener of this.listeners) listener();
  }

  private async pump(): Promise<void> {
    if (this.isPumping) return;
    this.isPumping = true;
    try {
      for (let tries = 0; ; ) {
        const next = this.kept.find(({ refusal }) => refusal === undefined);
        if (!next || this.view.needsSignIn) return;
        const isGone = await this.sendOne(next);
        tries = isGone ? 0 : tries + 1;
        if (!isGone && !this.view.needsSignIn) await this.ends.wait(Math.min(longestPauseMs, 500 * 2 ** (tries - 1)));
      }
    } finally {
      this.isPumping = false;
    }
  }

  /** Whether the reading is done with, taken or refused. */
  private async sendOne(reading: KeptReading): Promise<boolean> {
    try {
      await this.ends.send(reading);
      await this.drop(reading.id);
      this.tell({ isOffline: false, recorded: this.view.recorded + 1, recordedIds: [...this.view.recordedIds, reading.id].slice(-rememberedIds) });
      return true;
    } catch (error) {
      if (isForNow(error)) this.tell({ isOffline: true });
      else if (error instanceof ApiError && error.code === 'not_signed_in') this.tell({ needsSignIn: true, isOffline: false });
      else {
        const refused = { ...reading, refusal: error instanceof Error ? error.message : 'It was refused.' };
        this.kept = this.kept.map((one) => (one.id === reading.id ? refused : one));
        await this.ends.store.put(refused);
        this.tell({ isOffline: false });
        return true;
      }
      return false;
    }
  }
}
