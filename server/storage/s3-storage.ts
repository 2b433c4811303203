import { createHash, randomUUID } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { mkdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { DeleteObjectCommand, GetObjectCommand, HeadObjectCommand, PutObjectCommand, S3Client, S3ServiceException } from '@aws-sdk/client-s3';
import type { ByteRange, Storage } from './storage';

export interface S3Settings {
  readonly endpoint: string | null;
  readonly region: string;
  readonly bucket: string;
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
  /** The bucket in the path and not in the host name, as most stores but the first ask for. */
  readonly usesPathStyle: boolean;
  /** Where local copies lie for as long as they are needed. */
  readonly copiesDir: string;
}

function clientOf({ endpoint, region, accessKeyId, secretAccessKey, usesPathStyle }: S3Settings): S3Client {
  return new S3Client({
    ...(endpoint === null ? {} : { endpoint }),
    region,
    credentials: { accessKeyId, secretAccessKey },
    forcePathStyle: usesPathStyle,
    // Not every store knows the checksums that the client would add; a blob's name is its hash already.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  });
}

const isNotThere = (error: unknown): boolean => error instanceof S3ServiceException && error.$metadata.httpStatusCode === 404;

/** Keeps blobs in a bucket that speaks the S3 protocol, below two levels as in a folder. */
export function createS3Storage(settings: S3Settings): Storage {
  const client = clientOf(settings);
  const { bucket, copiesDir } = settings;
  const at = (sha256: string) => ({ Bucket: bucket, Key: `${sha256.slice(0, 2)}/${sha256.slice(2, 4)}/${sha256}` });

  const size = async (sha256: string): Promise<number | null> => {
    try {
      return (await client.send(new HeadObjectCommand(at(sha256)))).ContentLength ?? null;
    } catch (error) {
      if (isNotThere(error)) return null;
      throw error;
    }
  };

  const keep = async (sha256: string, bytes: number, body: () => Uint8Array | Readable) => {
    if ((await size(sha256)) !== bytes) await client.send(new PutObjectCommand({ ...at(sha256), Body: body(), ContentLength: bytes }));
    return { sha256, size: bytes };
  };

  const stream = async (sha256: string, range?: ByteRange): Promise<Readable> => {
    const { Body } = await client.send(new GetObjectCommand({ ...at(sha256), ...(range ? { Range: `bytes=${range.start}-${range.end}` } : {}) }));
    if (!Body) throw new Error(`The store has no bytes for ${sha256}.`);
    return Body as Readable;
  };

  return {
    size,
    stream,
    put: (bytes) => keep(createHash('sha256').update(bytes).digest('hex'), bytes.length, () => bytes),
    putFile: async (path, sha256) => keep(sha256, (await stat(path)).size, () => createReadStream(path)),
    read: async (sha256) => {
      const pieces: Buffer[] = [];
      for await (const piece of await stream(sha256)) pieces.push(piece as Buffer);
      return Buffer.concat(pieces);
    },
    withLocalCopy: async (sha256, work) => {
      await mkdir(copiesDir, { recursive: true });
      const path = join(copiesDir, randomUUID());
      try {
        await pipeline(await stream(sha256), createWriteStream(path));
        return await work(path);
      } finally {
        await rm(path, { force: true });
      }
    },
    remove: async (sha256) => void (await client.send(new DeleteObjectCommand(at(sha256)))),
  };
}
