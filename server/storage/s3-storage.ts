import { createHash, randomUUID } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { mkdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { S3Client } from '@aws-sdk/client-s3';
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

type Sdk = typeof import('@aws-sdk/client-s3');

interface Connection {
  readonly sdk: Sdk;
  readonly client: S3Client;
}

/** Loads the client with the first blob: a server that keeps scans in its folder never does. */
async function connect({ endpoint, region, accessKeyId, secretAccessKey, usesPathStyle }: S3Settings): Promise<Connection> {
  const sdk = await import('@aws-sdk/client-s3');
  const client = new sdk.S3Client({
    ...(endpoint === null ? {} : { endpoint }),
    region,
    credentials: { accessKeyId, secretAccessKey },
    forcePathStyle: usesPathStyle,
    // Not every store knows the checksums that the client would add; a blob's name is its hash already.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  });
  return { sdk, client };
}

const isNotThere = (error: unknown): boolean => {
  const { httpStatusCode } = (error as { $metadata?: { httpStatusCode?: number } }).$metadata ?? {};
  return httpStatusCode === 404;
};

/** Keeps blobs in a bucket that speaks the S3 protocol, below two levels as in a folder. */
export function createS3Storage(settings: S3Settings): Storage {
  let connection: Promise<Connection> | undefined;
  const connected = (): Promise<Connection> => (connection ??= connect(settings));
  const { bucket, copiesDir } = settings;
  const at = (sha256: string) => ({ Bucket: bucket, Key: `${sha256.slice(0, 2)}/${sha256.slice(2, 4)}/${sha256}` });

  const size = async (sha256: string): Promise<number | null> => {
    const { sdk, client } = await connected();
    try {
      return (await client.send(new sdk.HeadObjectCommand(at(sha256)))).ContentLength ?? null;
    } catch (error) {
      if (isNotThere(error)) return null;
      throw error;
    }
  };

  const keep = async (sha256: string, bytes: number, body: () => Uint8Array | Readable) => {
    const { sdk, client } = await connected();
    if ((await size(sha256)) !== bytes) await client.send(new sdk.PutObjectCommand({ ...at(sha256), Body: body(), ContentLength: bytes }));
    return { sha256, size: bytes };
  };

  const stream = async (sha256: string, range?: ByteRange): Promise<Readable> => {
    const { sdk, client } = await connected();
    const { Body } = await client.send(new sdk.GetObjectCommand({ ...at(sha256), ...(range ? { Range: `bytes=${range.start}-${range.end}` } : {}) }));
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
    remove: async (sha256) => {
      const { sdk, client } = await connected();
      await client.send(new sdk.DeleteObjectCommand(at(sha256)));
    },
  };
}
