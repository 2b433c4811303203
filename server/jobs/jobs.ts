/** Work done later. A handler is idempotent: after a crash it may run again. It calls `beat` whenever some of the work is on disk. */
export type JobHandler = (payload: Record<string, unknown>, beat: () => void) => Promise<void>;

export interface Jobs {
  /** Registers what does the work of one kind. Called at start, before run(). */
  handle(kind: string, handler: JobHandler): void;
  /** Writes the job row; call it inside the transaction of the act. Nothing new while an open job has the same key. */
  add(kind: string, dedupeKey: string, payload: Record<string, unknown>): void;
  /** Begins to work off jobs; jobs of an earlier process are taken up again. */
  run(): void;
  /** Resolves when no job waits or runs: for tests. */
  settle(): Promise<void>;
  stop(): Promise<void>;
}
