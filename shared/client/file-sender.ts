import type { UploadView } from '../contracts/scans';
import { ApiError, OfflineError } from './api';

export type SendingState = 'waiting' | 'sending' | 'offline' | 'refused' | 'sent';

export interface SendingFile {
  readonly key: string;
  readonly batchId: string;
  readonly fileName: string;
  readonly size: number;
  readonly sentBytes: number;
  readonly state: SendingState;
  /** What the server said of it, in its words. */
  readonly problem: string | null;
}

/** What the sender needs of the server; the interface itself, or a stand-in. */
export interface SendingEnds {
  /** The file as it stands in the batch, resumed where one of the same name and size was broken off. */
  begin(batchId: string, file: { readonly name: string; readonly size: number }): Promise<UploadView>;
  part(uploadId: string, part: number, bytes: Blob): Promise<UploadView>;
  complete(uploadId: string): Promise<UploadView>;
  wait(ms: number): Promise<void>;
}

const lanes = 3;
const longestPauseMs = 15_000;

type Slot = { file: File; view: SendingFile; uploadId: string | null };

/** Sends files in parts, three at a time; a lost connection is waited out and sending goes on where it was. */
export class FileSender {
  private readonly slots: Slot[] = [];
  private readonly listeners = new Set<() => void>();
  private shown: readonly SendingFile[] = [];
  private busy = 0;
  private count = 0;

  constructor(private readonly ends: SendingEnds) {}

  readonly snapshot = (): readonly SendingFile[] => this.shown;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  add(batchId: string, files: readonly File[]): void {
    for (const file of files) {
      this.count += 1;
      this.slots.push({ file, uploadId: null, view: { key: `${this.count}`, batchId, fileName: file.name, size: file.size, sentBytes: 0, state: 'waiting', problem: null } });
    }
    this.tell();
    this.fill();
  }

  /** Sends a refused file once more. */
  again(key: string): void {
    const slot = this.slots.find(({ view }) => view.key === key);
    if (slot?.view.state !== 'refused') return;
    this.change(slot, { state: 'waiting', problem: null });
    this.fill();
  }

  /** Forgets files: those given up, those whose batch was cancelled. */
  drop(which: (file: SendingFile) => boolean): void {
    for (let index = this.slots.length - 1; index >= 0; index -= 1) if (which(this.slots[index]!.view)) this.slots.splice(index, 1);
    this.tell();
  }

  private tell(): void {
    this.shown = this.slots.map(({ view }) => view);
    for (const listener of this.listeners) listener();
  }

  private change(slot: Slot, changes: Partial<SendingFile>): void {
    slot.view = { ...slot.view, ...changes };
    this.tell();
  }

  private fill(): void {
    for (const slot of this.slots) {
      if (this.busy >= lanes) return;
      if (slot.view.state !== 'waiting') continue;
      this.busy += 1;
      this.change(slot, { state: 'sending' });
      void this.send(slot).finally(() => {
        this.busy -= 1;
        this.fill();
      });
    }
  }

  private async send(slot: Slot): Promise<void> {
    try {
      const begun = await this.patiently(slot, () => this.ends.begin(slot.view.batchId, slot.file));
      const here = new Set(begun.parts);
      const parts = Math.ceil(begun.size / begun.partSize);
      for (let part = 0; part < parts && begun.state === 'sending'; part += 1) {
        const bytes = slot.file.slice(part * begun.partSize, (part + 1) * begun.partSize);
        if (!here.has(part)) await this.patiently(slot, () => this.ends.part(begun.id, part, bytes));
        this.change(slot, { sentBytes: slot.view.sentBytes + bytes.size });
      }
      await this.patiently(slot, () => this.ends.complete(begun.id));
      this.change(slot, { state: 'sent', sentBytes: slot.view.size });
    } catch (error) {
      this.change(slot, { state: 'refused', sentBytes: 0, problem: error instanceof ApiError ? error.message : 'The file could not be read from this device. Choose it again.' });
    }
  }

  /** Tries until the server answers; only what it answers ends the trying. */
  private async patiently<Answer>(slot: Slot, act: () => Promise<Answer>): Promise<Answer> {
    for (let tries = 0; ; tries += 1) {
      try {
        const answer = await act();
        if (slot.view.state === 'offline') this.change(slot, { state: 'sending' });
        return answer;
      } catch (error) {
        if (!(error instanceof OfflineError)) throw error;
        this.change(slot, { state: 'offline' });
        await this.ends.wait(Math.min(longestPauseMs, 500 * 2 ** tries));
      }
    }
  }
}
