import { createRequire } from 'node:module';
import { availableParallelism } from 'node:os';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { Piscina } from 'piscina';
import type { PictureResult, PictureTask } from './picture-worker';

export interface Pictures {
  make(task: PictureTask): Promise<PictureResult>;
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
  return {
    make: (task) => {
      pool ??= start();
      return pool.run(task) as Promise<PictureResult>;
    },
    close: async () => {
      await pool?.destroy();
      pool = undefined;
    },
  };
}
