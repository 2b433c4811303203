import type { Readable } from 'node:stream';

export interface StoredBlob {
  readonly sha256: string;
  readonly size: number;
}

/** Bytes by their hash. A blob is on disk, whole, before put answers. */
export interface Storage {
  put(bytes: Uint8Array): Promise<StoredBlob>;
  /** Takes over a file of the same file system; it is gone from its old place afterwards. */
  putFile(path: string, sha256: string): Promise<StoredBlob>;
  /** Throws when the blob is not there. */
  read(sha256: string): Promise<Buffer>;
  stream(sha256: string, range?: { start: number; end: number }): Readable;
  size(sha256: string): Promise<number | null>;
  /** Path of a blob for a worker on this machine. */
  localPath(sha256: string): string;
}
