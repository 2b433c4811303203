import { createRequire } from 'node:module';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import type { SheetOrder } from './sheets-pdf';

export interface Printer {
  /** Writes a file of sheets and answers with its hash. */
  print(order: SheetOrder, onDone: (done: number) => void): Promise<string>;
  close(): Promise<void>;
}

/** A worker thread that writes sheets; it starts with the first printing and ends when idle. */
export function createPrinter(): Printer {
  let pool: Piscina | undefined;
  const start = (): Piscina => {
    const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
    const filename = fileURLToPath(new URL('./print-worker.ts', import.meta.url));
    return new Piscina({ filename, minThreads: 0, maxThreads: 1, idleTimeout: 30_000, execArgv: ['--import', loader] });
  };
  return {
    print: async (order, onDone) => {
      pool ??= start();
      const { port1, port2 } = new MessageChannel();
      port1.on('message', onDone);
      try {
        return (await pool.run({ ...order, port: port2 }, { transferList: [port2] })) as string;
      } finally {
        port1.close();
      }
    },
    close: async () => {
      await pool?.destroy();
      pool = undefined;
    },
  };
}
