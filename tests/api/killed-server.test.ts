import { readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import sharp from 'sharp';
import type { Agent } from 'supertest';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { openDatabase } from '../../db/client';
import type { UploadView } from '../../shared/contracts/scans';
import { startChildServer, type ChildServer } from '../support/child-server';
import { plainZip, scannedPdf } from '../support/hostile-files';
import { beginBatch } from '../support/scans';
import { seededFolder, type SeededFolder } from '../support/seeded-folder';

const singles = 90;
const zipped = 90;
const inPdf = 20;
const kills = 20;
const numberOf = (index: number): string => `W${String(index).padStart(3, '0')}`;

/** Numbers that look random and are the same each time (mulberry32, public domain). */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

/** A small page with its number in its pixels, so that no two are alike. */
function pageOf(index: number, size = { width: 420, height: 594 }): Promise<Buffer> {
  const mark = Buffer.from(Array.from({ length: 16 }, (_, bit) => ((index >> bit) & 1 ? 0 : 220)));
  return sharp({ create: { ...size, channels: 3, background: 'white' } }).composite([{ input: mark, raw: { width: 16, height: 1, channels: 1 }, left: 0, top: 0 }, { input: Buffer.alloc(400, index % 200), raw: { width: 20, height: 20, channels: 1 }, left: 40, top: 2 * index }]).jpeg().toBuffer();
}

interface Sent {
  readonly fileName: string;
  readonly bytes: Buffer;
  uploadId?: string;
  isComplete?: boolean;
}

let folder: SeededFolder;
let server: ChildServer;
beforeAll(async () => {
  folder = await seededFolder(Array.from({ length: singles + zipped }, (_, index) => numberOf(index)));
});
afterAll(async () => {
  await server.kill();
  rmSync(folder.dataDir, { recursive: true, force: true });
});

/** Sends a file as the app does: what was answered is not asked again, what was not is. Throws when the server goes away. */
async function send(agent: Agent, batchId: string, file: Sent): Promise<void> {
  if (file.isComplete) return;
  if (file.uploadId === undefined) file.uploadId = ((await agent.post(`/api/batches/${batchId}/uploads`).send({ fileName: file.fileName, size: file.bytes.length }).expect(201)).body as UploadView).id;
  const { body } = await agent.get(`/api/uploads/${file.uploadId}`).expect(200);
  const upload = body as UploadView;
  if (upload.state === 'sending' && upload.parts.length === 0) await agent.put(`/api/uploads/${upload.id}/parts/0`).attach('file', file.bytes, 'part').expect(200);
  await agent.post(`/api/uploads/${upload.id}/complete`).expect(202);
  file.isComplete = true;
}

/** Goes on sending until all is sent or the server is gone. */
async function sendAll(agent: Agent, batchId: string, files: readonly Sent[]): Promise<void> {
  for (const file of files) {
    try {
      await send(agent, batchId, file);
    } catch (error) {
      if (error instanceof Error && /ECONN|socket|hang up|aborted|EPIPE/i.test(`${error.message} ${'code' in error ? String(error.code) : ''}`)) return;
      throw error;
    }
  }
}

it('has every page exactly once though the server is killed 20 times while they come in', async () => {
  const size = { width: 1050, height: 1485 };
  const files: Sent[] = [
    { fileName: 'stack.pdf', bytes: scannedPdf(await Promise.all(Array.from({ length: inPdf }, (_, index) => pageOf(300 + index, size))), size) },
    { fileName: 'row.zip', bytes: plainZip(Object.fromEntries(await Promise.all(Array.from({ length: zipped }, async (_, index) => [`${numberOf(singles + index)}-p1.jpg`, await pageOf(singles + index)] as const)))) },
    ...(await Promise.all(Array.from({ length: singles }, async (_, index) => ({ fileName: `${numberOf(index)}-p1.jpg`, bytes: await pageOf(index) })))),
  ];
  const random = seeded(20261201);
  server = await startChildServer(folder.dataDir);
  // The same address each time, so that the session goes on.
  const { port } = new URL(server.address);
  const agent = await server.signInAs('readerOne');
  const batchId = (await beginBatch(agent, folder.sittingId)).id;
  for (let kill = 0; kill < kills; kill += 1) {
    const sending = sendAll(agent, batchId, files);
    await new Promise((resolve) => setTimeout(resolve, 50 + random() * 900));
    await server.kill();
    await sending;
    server = await startChildServer(folder.dataDir, { PORT: port });
  }
  await sendAll(agent, batchId, files);
  expect(files.every(({ isComplete }) => isComplete)).toBe(true);
  for (;;) {
    const { body } = await agent.get(`/api/batches/${batchId}`).expect(200);
    const batch = body as { files: Record<string, number>; stuck: number };
    expect(batch.stuck).toBe(0);
    if (batch.files.received === 0) break;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  await agent.get(`/api/sittings/${folder.sittingId}/loose-pages`).expect(200);
  await server.kill();

  const db = openDatabase(join(folder.dataDir, 'meniscus.sqlite'));
  const ask = <Row>(sql: string): Row[] => db.$client.prepare(sql).all() as Row[];
  expect(ask('select state, count(*) as n from upload where sha256 is not null group by state')).toEqual([{ state: 'done', n: files.length }]);
  expect(ask('select state, count(*) as n from page_image group by state order by state')).toEqual([{ state: 'loose', n: inPdf }, { state: 'placed', n: singles + zipped }]);
  expect(ask('select count(distinct original) as n from page_image')).toEqual([{ n: singles + zipped + inPdf }]);
  expect(ask('select count(*) as n from page where image is not null')).toEqual([{ n: singles + zipped }]);
  expect(ask('select state, count(*) as n from job group by state')).toEqual([{ state: 'done', n: files.length }]);
  const kept = new Set(readdirSync(join(folder.dataDir, 'blobs'), { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile()).map(({ name }) => name));
  expect(ask<{ sha256: string }>('select sha256 from blob').filter(({ sha256 }) => !kept.has(sha256))).toEqual([]);
  expect(readdirSync(join(folder.dataDir, 'parts')).filter((name) => name !== 'incoming' && ask<{ id: string }>('select id from upload').every(({ id }) => id !== name))).toEqual([]);
  db.$client.close();
}, 180_000);
