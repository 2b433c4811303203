import { mkdir } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { Piscina } from 'piscina';
import { longestOpeningMs } from './limits';
import type { Counted, PdfPage } from './open-worker';
import { planPages, type PlannedPage } from './plan';

/** A page as one picture on disk, ready to be decoded. */
export interface OpenedPage {
  readonly path: string;
  /** Which page of the file at the path. */
  readonly frame: number;
  /** Advice that stays with the page. */
  readonly note: string | null;
  /** Made for this page alone: whoever took it over removes it. */
  readonly isPassing: boolean;
}

export interface Opener {
  /** Which pages a file holds; throws an InputRefusal where none of it can be taken. The work folder is this file's own. */
  plan(path: string, workDir: string): Promise<PlannedPage[]>;
  /** The pages named, each as a picture or a refusal, in their order. */
  open(pages: readonly PlannedPage[], workDir: string): AsyncGenerator<{ readonly page: PlannedPage; readonly opened: OpenedPage | { readonly refusal: string } }>;
  close(): Promise<void>;
}

const oneBitNote = 'A black-and-white scan: faint pencil may be missing. Scan in grey.';
const pagesAtOnce = 8;
/** The memory of the PDF reader never shrinks: after this many pages or so heavy a file its thread is replaced. */
const pagesOfThread = 64;

const tookTooLong = 'It took longer than a minute to open. Save it as a plain scan and send it again.';

/** Opens files in a thread of its own, which ends when idle, after much work, and when a file takes too long. */
export function createOpener(): Opener {
  let pool: Piscina | undefined;
  let pagesDone = 0;
  let turn: Promise<unknown> = Promise.resolve();

  const start = (): Piscina => {
    const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
    const filename = fileURLToPath(new URL('./open-worker.ts', import.meta.url));
    const started = new Piscina({ filename, name: 'countPages', minThreads: 0, maxThreads: 1, idleTimeout: 10_000, execArgv: ['--import', loader] });
    // What breaks between two files is met by the next, in a new thread.
    started.on('error', () => undefined);
    return started;
  };

  const replace = async (): Promise<void> => {
    const old = pool;
    pool = undefined;
    pagesDone = 0;
    await old?.destroy();
  };

  const run = async <Result>(name: string, task: object, pages: number): Promise<Result | { ok: false; refusal: string }> => {
    try {
      return (await (pool ??= start()).run(task, { name, signal: AbortSignal.timeout(longestOpeningMs) })) as Result;
    } catch (error) {
      if (!(error instanceof Error) || error.name !== 'AbortError') throw error;
      await replace();
      return { ok: false, refusal: tookTooLong };
    } finally {
      pagesDone += pages;
      if (pagesDone >= pagesOfThread) await replace();
    }
  };

  /** One task at a time, so that a thread is never replaced under another task. */
  const inTurn = <Result>(name: string, task: object, pages: number): Promise<Result | { ok: false; refusal: string }> => {
    const mine = turn.then(() => run<Result>(name, task, pages));
    turn = mine.catch(() => undefined);
    return mine;
  };

  async function* openPdf(pages: readonly PlannedPage[], workDir: string): ReturnType<Opener['open']> {
    const [first] = pages;
    if (!first || !('source' in first)) return;
    const outDir = join(workDir, 'pages');
    await mkdir(outDir, { recursive: true });
    const from = first.source.frame;
    const made = await inTurn<readonly PdfPage[]>('pdfPages', { path: first.source.path, from, to: from + pages.length, outDir }, pages.length);
    for (const [index, page] of pages.entries()) {
      const result = 'refusal' in made ? made : (made[index] ?? { ok: false as const, refusal: tookTooLong });
      yield { page, opened: result.ok ? { path: result.path, frame: 0, note: result.isOneBit ? oneBitNote : null, isPassing: true } : { refusal: result.refusal } };
    }
  }

  async function* open(pages: readonly PlannedPage[], workDir: string): ReturnType<Opener['open']> {
    for (let at = 0; at < pages.length; ) {
      const page = pages[at]!;
      if (!('source' in page)) yield { page, opened: { refusal: page.refusal } };
      else if (page.source.kind !== 'pdf') yield { page, opened: { path: page.source.path, frame: page.source.frame, note: page.source.isOneBit ? oneBitNote : null, isPassing: false } };
      else {
        const run = pagesOfRun(pages, at);
        yield* openPdf(run, workDir);
        at += run.length - 1;
      }
      at += 1;
    }
  }

  return {
    plan: (path, workDir) => planPages(path, workDir, (file) => inTurn<Counted>('countPages', file, 0)),
    open,
    close: async () => {
      await turn;
      await replace();
    },
  };
}

/** The pages from one on that follow each other in one PDF, as many as are opened at once. */
function pagesOfRun(pages: readonly PlannedPage[], at: number): readonly PlannedPage[] {
  const first = pages[at]!;
  let end = at + 1;
  while (end < pages.length && end - at < pagesAtOnce) {
    const next = pages[end]!;
    if (!('source' in first) || !('source' in next) || next.source.path !== first.source.path || next.source.frame !== first.source.frame + (end - at)) break;
    end += 1;
  }
  return pages.slice(at, end);
}
