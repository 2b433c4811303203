import { createHash, randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { copyFile, link, mkdir, open, readFile, rename, rm, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import type { Storage, StoredBlob } from './storage';

async function syncToDisk(path: string): Promise<void> {
  const file = await open(path, 'r');
  try {
    await file.datasync();
  } finally {
    await file.close();
  }
}

const linkOrCopy = (from: string, to: string): Promise<void> => link(from, to).catch(() => copyFile(from, to));

/** Keeps blobs as files named by their hash, below two levels of folders. */
export function createLocalStorage(folder: string): Storage {
  const pathOf = (sha256: string) => join(folder, sha256.slice(0, 2), sha256.slice(2, 4), sha256);

  const sizeOf = async (sha256: string): Promise<number | null> => {
    try {
      return (await stat(pathOf(sha256))).size;
    } catch {
      return null;
    }
  };

  /** Lets `fill` write a blob beside its place and moves it there once it is on disk. */
  const keep = async (sha256: string, size: number, fill: (passing: string) => Promise<void>): Promise<StoredBlob> => {
    if ((await sizeOf(sha256)) === size) return { sha256, size };
    const target = pathOf(sha256);
    await mkdir(dirname(target), { recursive: true });
    const passing = `${target}.${randomUUID()}`;
    try {
      await fill(passing);
      await rename(passing, target);
    } catch (error) {
      await rm(passing, { force: true });
      throw error;
    }
    return { sha256, size };
  };

  const put = (bytes: Uint8Array): Promise<StoredBlob> =>
    keep(createHash('sha256').update(bytes).digest('hex'), bytes.length, async (passing) => {
      const file = await open(passing, 'wx');
      try {
        await file.writeFile(bytes);
        await file.datasync();
      } finally {
        await file.close();
      }
    });

  const putFile = async (path: string, sha256: string): Promise<StoredBlob> =>
    keep(sha256, (await stat(path)).size, async (passing) => {
      await linkOrCopy(path, passing);
      await syncToDisk(passing);
    });

  return {
    put,
    putFile,
    read: (sha256) => readFile(pathOf(sha256)),
    stream: async (sha256, range) => createReadStream(pathOf(sha256), range),
    size: sizeOf,
    withLocalCopy: (sha256, work) => work(pathOf(sha256)),
    remove: (sha256) => rm(pathOf(sha256), { force: true }),
  };
}
