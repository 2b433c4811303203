import { createHash, randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, readFile, rename, stat, unlink } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import type { Storage, StoredBlob } from './storage';

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

  const put = async (bytes: Uint8Array): Promise<StoredBlob> => {
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    const target = pathOf(sha256);
    if ((await sizeOf(sha256)) === bytes.length) return { sha256, size: bytes.length };
    await mkdir(dirname(target), { recursive: true });
    const passing = `${target}.${randomUUID()}`;
    const file = await open(passing, 'wx');
    try {
      await file.writeFile(bytes);
      await file.datasync();
    } finally {
      await file.close();
    }
    await rename(passing, target);
    return { sha256, size: bytes.length };
  };

  const putFile = async (path: string, sha256: string): Promise<StoredBlob> => {
    const { size } = await stat(path);
    const target = pathOf(sha256);
    if ((await sizeOf(sha256)) === size) {
      await unlink(path);
      return { sha256, size };
    }
    await mkdir(dirname(target), { recursive: true });
    const file = await open(path, 'r');
    try {
      await file.datasync();
    } finally {
      await file.close();
    }
    await rename(path, target);
    return { sha256, size };
  };

  return {
    put,
    putFile,
    read: (sha256) => readFile(pathOf(sha256)),
    stream: (sha256, range) => createReadStream(pathOf(sha256), range),
    size: sizeOf,
    localPath: pathOf,
  };
}
