import { createRequire } from 'node:module';
import { availableParallelism } from 'node:os';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { Piscina } from 'piscina';
import type { PictureResult, PictureTask, SheetResult, SheetTask } from './picture-worker';

export interface Pictures {
  make(task: PictureTask): Promise<PictureResult>;
  /** Reads the codes of a page as well; without any it is made as by `make`. */
  makeSheet(task: SheetTask): Promise<SheetResult>;
  close(): Promise<void>;
}

/** Worker threads that make pictures of pages; they start with the first page and end when idle. */
export function createPictures(threads = Math.max(1, availableParallelism() - 1)): Pictures {
  let pool: Piscina | undefined;
  const start = (): Piscina => {
    const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
    const filename = fileURLToPath(new URL('./picture-worker.ts', import.meta.url));
    return new Piscina({ filename, minThreads: 0, maxThreads: threads, idleTimeout: 30_000, execArgv: ['--import', loader] });
  };
  const started = (): Piscina => (pool ??= start());
  return {
    make: (task) => started().run(task) as Promise<PictureResult>,
    makeSheet: (task) => started().run(task, { name: 'makeSheet' }) as Promise<SheetResult>,
    close: async () => {
      await pool?.destroy();
      pool = undefined;
    },
  };
}
