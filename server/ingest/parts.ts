import { createHash, randomUUID } from 'node:crypto';
import { createReadStream, createWriteStream, statfsSync } from 'node:fs';
import { copyFile, link, mkdir, open, readdir, rename, rm, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { pipeline } from 'node:stream/promises';

/** Files on their way in, one folder a file: its parts, then the whole file until its pages are made. */
export interface Parts {
  /** Where requests put what they bring, on the same file system. */
  readonly incoming: string;
  /** Takes over a file as one part; it is on disk when this resolves. */
  keep(uploadId: string, part: number, path: string): Promise<void>;
  /** Joins the parts to the whole file and tells its hash; the parts stay until they are dropped. */
  join(uploadId: string, count: number): Promise<{ path: string; sha256: string; size: number }>;
  /** The whole file, while it waits for its pages; null once it was dropped. */
  whole(uploadId: string): Promise<string | null>;
  /** Removes the parts of a file that is whole. */
  dropParts(uploadId: string, count: number): Promise<void>;
  /** A folder for what is taken out of a file, gone with it. */
  workDir(uploadId: string): Promise<string>;
  drop(uploadId: string): Promise<void>;
  /** Bytes that can still be written. */
  free(): number;
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

async function hashOf(path: string): Promise<string> {
  const hash = createHash('sha256');
  await pipeline(createReadStream(path), hash);
  return hash.digest('hex');
}

export function createParts(dataDir: string): Parts {
  const folder = join(dataDir, 'parts');
  const incoming = join(folder, 'incoming');
  const partPath = (uploadId: string, part: number): string => join(folder, uploadId, String(part));
  const wholePath = (uploadId: string): string => join(folder, uploadId, 'whole');

  const joinParts = async (uploadId: string, count: number, path: string): Promise<void> => {
    if (count === 1) {
      // A second name for the same bytes, which are on disk already.
      await link(partPath(uploadId, 0), path);
      return;
    }
    await copyFile(partPath(uploadId, 0), path);
    for (let part = 1; part < count; part += 1) await pipeline(createReadStream(partPath(uploadId, part)), createWriteStream(path, { flags: 'a' }));
    await syncToDisk(path);
  };

  return {
    incoming,
    keep: async (uploadId, part, path) => {
      const target = partPath(uploadId, part);
      await mkdir(dirname(target), { recursive: true });
      await syncToDisk(path);
      await rename(path, target);
    },
    join: async (uploadId, count) => {
      const passing = join(folder, uploadId, `joined-${randomUUID()}`);
      const path = wholePath(uploadId);
      try {
        await joinParts(uploadId, count, passing);
        await rename(passing, path);
      } finally {
        await rm(passing, { force: true });
      }
      return { path, sha256: await hashOf(path), size: (await stat(path)).size };
    },
    whole: async (uploadId) => ((await stat(wholePath(uploadId)).catch(() => null)) ? wholePath(uploadId) : null),
    dropParts: async (uploadId, count) => {
      for (let part = 0; part < count; part += 1) await rm(partPath(uploadId, part), { force: true });
    },
    workDir: async (uploadId) => {
      const path = join(folder, uploadId, 'open');
      await mkdir(path, { recursive: true });
      return path;
    },
    drop: (uploadId) => rm(join(folder, uploadId), { recursive: true, force: true }),
    free: () => {
      const { bavail, bsize } = statfsSync(dataDir);
      return bavail * bsize;
    },
    sweepIncoming: async (olderThanMs, now) => {
      for (const name of await readdir(incoming).catch(() => [])) {
        const path = join(incoming, name);
        const found = await stat(path).catch(() => null);
        if (found && now - found.mtimeMs > olderThanMs) await rm(path, { force: true });
      }
    },
  };
}
