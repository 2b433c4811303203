import type { Readable } from 'node:stream';

export interface StoredBlob {
  readonly sha256: string;
  readonly size: number;
}

export interface ByteRange {
  readonly start: number;
  /** The last byte, counted in. */
  readonly end: number;
}

/** Bytes by their hash. A blob is kept, whole, before put answers. */
export interface Storage {
  put(bytes: Uint8Array): Promise<StoredBlob>;
  /** Keeps a file of this machine under its hash; it stays where it is. */
  putFile(path: string, sha256: string): Promise<StoredBlob>;
  /** Throws when the blob is not there. */
  read(sha256: string): Promise<Buffer>;
  stream(sha256: string, range?: ByteRange): Promise<Readable>;
  size(sha256: string): Promise<number | null>;
  /** Gives a worker on this machine the bytes as a file, for as long as the work takes. */
  withLocalCopy<Result>(sha256: string, work: (path: string) => Promise<Result>): Promise<Result>;
  /** Removes a blob that nothing names any more; one that is not there is no error. */
  remove(sha256: string): Promise<void>;
}
