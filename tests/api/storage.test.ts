import { createHash } from 'node:crypto';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readConfig } from '../../server/config/config';
import { createLocalStorage } from '../../server/storage/local-storage';
import { createS3Storage } from '../../server/storage/s3-storage';
import type { Storage } from '../../server/storage/storage';
import type { UploadView } from '../../shared/contracts/scans';
import { startBucketServer, type BucketServer } from '../support/bucket-server';
import { buildPaper } from '../support/paper';
import { pageJpeg } from '../support/pictures';
import { beginBatch, bringIn, sendFile } from '../support/scans';
import { startTestServer, type TestServer } from '../support/test-server';

let folder: string;
let bucket: BucketServer;
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'meniscus-storage-'));
  bucket = await startBucketServer();
});
afterAll(async () => {
  await bucket.close();
  rmSync(folder, { recursive: true, force: true });
});

const keys = { region: 'us-east-1', accessKeyId: 'key', secretAccessKey: 'secret', usesPathStyle: true };

const kinds: readonly (readonly [string, () => Storage])[] = [
  ['a folder', () => createLocalStorage(join(folder, 'blobs'))],
  ['a bucket', () => createS3Storage({ ...keys, endpoint: bucket.endpoint, bucket: 'scans', copiesDir: join(folder, 'copies') })],
];

describe.each(kinds)('storage in %s', (_name, make) => {
  const bytes = Buffer.from('a page of an answer');
  const sha256 = createHash('sha256').update(bytes).digest('hex');

  it('keeps bytes under their hash, whole and in parts, until they are removed', async () => {
    const storage = make();
    expect(await storage.size(sha256)).toBeNull();
    await expect(storage.read(sha256)).rejects.toThrow();
    expect(await storage.put(bytes)).toEqual({ sha256, size: bytes.length });
    expect(await storage.put(bytes)).toEqual({ sha256, size: bytes.length });
    expect(await storage.size(sha256)).toBe(bytes.length);
    expect((await storage.read(sha256)).equals(bytes)).toBe(true);
    const part: Buffer[] = [];
    for await (const piece of await storage.stream(sha256, { start: 2, end: 5 })) part.push(piece as Buffer);
    expect(Buffer.concat(part).toString()).toBe('page');
    expect(await storage.withLocalCopy(sha256, async (path) => readFileSync(path, 'utf8'))).toBe(bytes.toString());
    await storage.remove(sha256);
    await storage.remove(sha256);
    expect(await storage.size(sha256)).toBeNull();
  });

  it('keeps a file and leaves it where it is', async () => {
    const path = join(folder, 'page.jpg');
    writeFileSync(path, bytes);
    const storage = make();
    await storage.putFile(path, sha256);
    expect(readFileSync(path).equals(bytes)).toBe(true);
    expect((await storage.read(sha256)).equals(bytes)).toBe(true);
  });
});

it('sends what is known once, and says which variables are missing', async () => {
  const storage = createS3Storage({ ...keys, endpoint: bucket.endpoint, bucket: 'once', copiesDir: join(folder, 'copies') });
  await storage.put(Buffer.from('x'));
  await storage.put(Buffer.from('x'));
  expect(bucket.seen.filter((line) => line.startsWith('PUT /once/'))).toHaveLength(1);
  expect(() => readConfig({ STORAGE: 's3', DATA_DIR: folder })).toThrow('S3_BUCKET, S3_ACCESS_KEY_ID and S3_SECRET_ACCESS_KEY');
});

describe('scans in a bucket', () => {
  let server: TestServer;
  beforeAll(async () => {
    server = await startTestServer({ STORAGE: 's3', S3_ENDPOINT: bucket.endpoint, S3_BUCKET: 'sitting', S3_ACCESS_KEY_ID: 'key', S3_SECRET_ACCESS_KEY: 'secret' });
  });
  afterAll(() => server.close());

  it('come in, are shown in parts and by hash, and wait for a store that is away', async () => {
    const { sittingId } = buildPaper(server, { candidates: ['W4071', 'W4072'] });
    const reader = await server.signInAs('readerOne');
    const { id } = await beginBatch(reader, sittingId);
    const original = await pageJpeg(1);
    const upload = await bringIn(server, reader, id, 'W4071-p1.jpg', original);
    expect(upload).toMatchObject({ state: 'done', pages: [{ place: 'W4071, page 1' }] });
    const address = `/api/page-images/${upload.pages[0]?.id}/file`;
    const whole = await reader.get(address).query({ size: 'original' }).expect(200);
    expect((whole.body as Buffer).equals(original)).toBe(true);
    expect(whole.headers).toMatchObject({ 'x-content-type-options': 'nosniff', 'cache-control': 'private, no-cache', 'accept-ranges': 'bytes' });
    const part = await reader.get(address).query({ size: 'original' }).set('Range', 'bytes=10-19').expect(206);
    expect((part.body as Buffer).equals(original.subarray(10, 20))).toBe(true);
    expect(part.headers['content-range']).toBe(`bytes 10-19/${original.length}`);
    await reader.get(address).set('Range', `bytes=${original.length * 9}-`).expect(416);
    await reader.get(address).set('If-None-Match', whole.headers.etag ?? '').query({ size: 'original' }).expect(304);

    bucket.isDown = true;
    const waiting = await sendFile(reader, id, 'W4072-p1.jpg', await pageJpeg(2));
    await server.context.jobs.settle();
    const stuck = (await reader.get(`/api/uploads/${waiting.id}`).expect(200)).body as UploadView;
    expect(stuck).toMatchObject({ state: 'received', stuck: expect.stringMatching(/\.$/) as string });
    expect((await reader.get(`/api/batches/${id}`).expect(200)).body).toMatchObject({ stuck: 1 });
    bucket.isDown = false;
    await (await server.signInAs('external')).post(`/api/uploads/${waiting.id}/retry`).expect(403);
    await (await server.signInAs('outsider')).post(`/api/uploads/${waiting.id}/retry`).expect(404);
    await reader.post(`/api/uploads/${waiting.id}/retry`).expect(202);
    await server.context.jobs.settle();
    expect((await reader.get(`/api/uploads/${waiting.id}`).expect(200)).body).toMatchObject({ state: 'done', stuck: null, pages: [{ place: 'W4072, page 1' }] });
    await reader.post(`/api/uploads/${waiting.id}/retry`).expect(409);
  });
});
