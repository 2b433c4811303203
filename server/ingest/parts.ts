import { createHash, randomUUID } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { copyFile, link, mkdir, open, readdir, rename, rm, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { pipeline } from 'node:stream/promises';

/** The parts of files on their way in, one folder a file. */
export interface Parts {
  /** Where requests put what they bring, on the same file system. */
  readonly incoming: string;
  /** Takes over a file as one part; it is on disk when this resolves. */
  keep(uploadId: string, part: number, path: string): Promise<void>;
  /** Joins the parts to one file and tells its hash; the parts stay until dropped. */
  join(uploadId: string, count: number): Promise<{ path: string; sha256: string; size: number }>;
  drop(uploadId: string): Promise<void>;
  /** Removes what earlier requests left behind. */
  sweepIncoming(olderThanMs: number, now: number): Promise<void>;
}

async function syncToDisk(path: string): Promise<void> {
  const file = await open(path, 'r');
  try {
    await file.datasync();
  } finally {
    await file.close();
  }
}

export function createParts(dataDir: string): Parts {
  const folder = join(dataDir, 'parts');
  const incoming = join(folder, 'incoming');
  const partPath = (uploadId: string, part: number): string => join(folder, uploadId, String(part));
  return {
    incoming,
    keep: async (uploadId, part, path) => {
      const target = partPath(uploadId, part);
      await mkdir(dirname(target), { recursive: true });
      await syncToDisk(path);
      await rename(path, target);
    },
    join: async (uploadId, count) => {
      const path = join(folder, uploadId, `whole-${randomUUID()}`);
      if (count === 1) {
        // A second name for the same bytes, which are on disk already; the part stays until dropped.
        await link(partPath(uploadId, 0), path);
      } else {
        await copyFile(partPath(uploadId, 0), path);
        for (let part = 1; part < count; part += 1) await pipeline(createReadStream(partPath(uploadId, part)), createWriteStream(path, { flags: 'a' }));
        await syncToDisk(path);
      }
      const hash = createHash('sha256');
      await pipeline(createReadStream(path), hash);
      return { path, sha256: hash.digest('hex'), size: (await stat(path)).size };
    },
    drop: (uploadId) => rm(join(folder, uploadId), { recursive: true, force: true }),
    sweepIncoming: async (olderThanMs, now) => {
      for (const name of await readdir(incoming).catch(() => [])) {
        const path = join(incoming, name);
        const found = await stat(path).catch(() => null);
        if (found && now - found.mtimeMs > olderThanMs) await rm(path, { force: true });
      }
    },
  };
}
