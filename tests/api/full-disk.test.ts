import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, expect, it } from 'vitest';
import type { BatchSummary, UploadView } from '../../shared/contracts/scans';
import { plainZip } from '../support/hostile-files';
import { buildPaper } from '../support/paper';
import { pageJpeg } from '../support/pictures';
import { beginBatch, sendFile } from '../support/scans';
import { startTestServer, type TestServer } from '../support/test-server';

let server: TestServer;
afterEach(() => server.close());

const messageOf = (body: unknown): string => (body as { error: { message: string } }).error.message;

it('begins no batch on a disk without room, and says how much is left', async () => {
  server = await startTestServer({ KEEP_FREE_MB: '99999999999' });
  const { sittingId } = buildPaper(server);
  const reader = await server.signInAs('readerOne');
  const refused = await reader.post(`/api/sittings/${sittingId}/batches`).send({ bundle: 'A' }).expect(507);
  expect(messageOf(refused.body)).toMatch(/^The disk of the server has [\d.,]+ GB left, too little to take scans\. Tell whoever looks after it\.$/);
});

it('keeps a file whose pages find the disk full, says so, and goes on where it was', async () => {
  server = await startTestServer();
  const { sittingId } = buildPaper(server, { candidates: ['W1', 'W2', 'W3'] });
  const { storage, jobs } = server.context;
  const reader = await server.signInAs('readerOne');
  const { id } = await beginBatch(reader, sittingId);
  const { putFile } = storage;
  let room = 1;
  Object.assign(storage, {
    putFile: (path: string, sha256: string) => {
      room -= 1;
      return room < 0 ? Promise.reject(Object.assign(new Error('ENOSPC: no space left on device, write'), { code: 'ENOSPC' })) : putFile(path, sha256);
    },
  });
  const [one, two, three] = await Promise.all([1, 2, 3].map((seed) => pageJpeg(seed)));
  const { id: uploadId } = await sendFile(reader, id, 'row.zip', plainZip({ 'W1-p1.jpg': one!, 'W2-p1.jpg': two!, 'W3-p1.jpg': three! }));
  await jobs.settle();
  const stuck = (await reader.get(`/api/uploads/${uploadId}`).expect(200)).body as UploadView;
  expect(stuck).toMatchObject({ state: 'received', of: 3, stuck: 'The disk of the server is full. Its pages could not be kept.' });
  expect(stuck.pages).toHaveLength(1);
  expect((await reader.get(`/api/batches/${id}`).expect(200)).body).toMatchObject({ stuck: 1, making: { done: 1, of: 3 } });
  room = 99;
  await reader.post(`/api/uploads/${uploadId}/retry`).expect(202);
  await jobs.settle();
  const done = (await reader.get(`/api/uploads/${uploadId}`).expect(200)).body as UploadView;
  expect(done).toMatchObject({ state: 'done', stuck: null, pages: [{ place: 'W1, page 1' }, { place: 'W2, page 1' }, { place: 'W3, page 1' }] });
});

it('gives up files in the making when their batch is cancelled, and keeps the pages that came in', async () => {
  server = await startTestServer();
  const { sittingId } = buildPaper(server, { candidates: ['W1', 'W2', 'W3'] });
  const { jobs, config, opener } = server.context;
  const reader = await server.signInAs('readerOne');
  const { id } = await beginBatch(reader, sittingId);
  const { open } = opener;
  let goOn: () => void = () => undefined;
  const held = new Promise<void>((resolve) => (goOn = resolve));
  Object.assign(opener, {
    async *open(...of: Parameters<typeof open>) {
      let n = 0;
      for await (const page of open(...of)) {
        yield page;
        n += 1;
        if (n === 2) await held;
      }
    },
  });
  const pages = await Promise.all([1, 2, 3].map((seed) => pageJpeg(seed)));
  const { id: uploadId } = await sendFile(reader, id, 'row.zip', plainZip(Object.fromEntries(pages.map((page, index) => [`W${index + 1}-p1.jpg`, page]))));
  const inPlace = async (): Promise<number> => ((await reader.get(`/api/batches/${id}`).expect(200)).body as BatchSummary).pages.placed;
  while ((await inPlace()) < 1) await new Promise((resolve) => setTimeout(resolve, 20));
  await reader.patch(`/api/batches/${id}`).send({ state: 'cancelled' }).expect(200);
  const came = await inPlace();
  goOn();
  await jobs.settle();
  expect((await reader.get(`/api/uploads/${uploadId}`).expect(200)).body).toMatchObject({ state: 'cancelled' });
  expect(await inPlace()).toBe(came);
  expect(came).toBeLessThan(3);
  expect(readdirSync(join(config.dataDir, 'parts'))).toEqual(['incoming']);
});
