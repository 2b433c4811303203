import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import sharp from 'sharp';
import type { Agent } from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { insertJob } from '../../db/queries/jobs';
import { partBytes, type BatchView, type UploadView } from '../../shared/contracts/scans';
import { buildPaper, type BuiltPaper } from '../support/paper';
import { pageJpeg } from '../support/pictures';
import { beginBatch, bringIn, sendFile } from '../support/scans';
import { startTestServer, type TestServer } from '../support/test-server';

describe('scans', () => {
  let server: TestServer;
  let paper: BuiltPaper;
  let reader: Agent;
  let lead: Agent;
  let batchId: string;
  beforeAll(async () => {
    server = await startTestServer();
    paper = buildPaper(server, { candidates: ['W4071', 'W4072', 'W4073', 'W4074', 'W4075'] });
    reader = await server.signInAs('readerOne');
    lead = await server.signInAs('lead');
    batchId = (await beginBatch(reader, paper.sittingId)).id;
  });
  afterAll(() => server.close());

  const loosePages = async () => (await reader.get(`/api/sittings/${paper.sittingId}/loose-pages`).expect(200)).body as { pages: { id: string; fileName: string; why: string; rev: number; likely: unknown }[]; places: { candidateId: string; candidateNumber: string; image: unknown }[] };
  const toRead = async (): Promise<number[]> => {
    const { body } = await reader.get('/api/desk/standing').query({ sitting: paper.sittingId }).expect(200);
    return (body as { items: { toRead: number }[] }).items.map((item) => item.toRead);
  };

  it('places a page by its file name and makes its answers readable, with cut-outs 3 mm wider than their boxes', async () => {
    const original = await pageJpeg(1);
    const upload = await bringIn(server, reader, batchId, 'W4071-p1.jpg', original);
    expect(upload).toMatchObject({ state: 'done', pages: [{ state: 'placed', place: 'W4071, page 1' }] });
    expect(await toRead()).toEqual([1, 1]);
    const { body } = await reader.post('/api/desk/leases').send({ itemId: paper.items[0] }).expect(200);
    const [lease] = (body as { leases: { answerId: string; pageImageId: string; crops: { box: string; widthPx: number; heightPx: number }[] }[] }).leases;
    const [crop] = lease?.crops ?? [];
    // Box 60 by 18 mm on 620 px for 210 mm: 66 and 24 mm with the margin.
    expect(crop).toMatchObject({ widthPx: 195, heightPx: 71 });
    const picture = await reader.get(`/api/answers/${lease?.answerId}/crop`).query({ box: crop?.box }).expect(200);
    expect(picture.headers).toMatchObject({ 'content-type': 'image/jpeg', 'cache-control': 'private, no-cache', 'x-content-type-options': 'nosniff' });
    expect(await sharp(picture.body as Buffer).metadata()).toMatchObject({ width: 195, height: 71 });
    const kept = await reader.get(`/api/page-images/${lease?.pageImageId}/file`).query({ size: 'original' }).expect(200);
    expect((kept.body as Buffer).equals(original)).toBe(true);
    const part = await reader.get(`/api/page-images/${lease?.pageImageId}/file`).set('Range', 'bytes=0-99').expect(206);
    expect(part.body).toHaveLength(100);
    await reader.get(`/api/page-images/${lease?.pageImageId}/file`).set('If-None-Match', part.headers.etag ?? '').expect(304);
    await (await server.signInAs('outsider')).get(`/api/answers/${lease?.answerId}/crop`).query({ box: crop?.box }).expect(404);
  });

  it('names a picture that is here already and keeps it once', async () => {
    const again = await bringIn(server, reader, batchId, 'W4072-p1.jpg', await pageJpeg(1));
    expect(again).toMatchObject({ state: 'duplicate', problem: 'The same file as W4071-p1.jpg of bundle A. It was not kept twice.', pages: [] });
  });

  it.each([
    ['a text named as a picture', 'notes.jpg', Buffer.from('nothing to see'), 'This is not a picture of a page. Send PDF, JPEG, PNG, TIFF or WebP, or a ZIP of them.'],
    ['a drawing that could run', 'W4073-p1.png', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="900" height="900"/>'), 'This is a drawing (SVG), not the scan of a page. Send PDF, JPEG, PNG, TIFF or WebP, or a ZIP of them.'],
    ['a PDF that is none', 'W4073-p1.pdf', Buffer.from('%PDF-1.7\n%stuff and more'), 'The PDF is incomplete or damaged. Scan or save it again.'],
    ['a phone format', 'W4073-p1.heic', Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypheic00000000')]), 'This phone format (HEIC) is not read. Set the camera to JPEG, or send PDF, JPEG, PNG, TIFF or WebP.'],
  ])('refuses %s by its content', async (_name, fileName, bytes, problem) => {
    expect(await bringIn(server, reader, batchId, fileName, bytes)).toMatchObject({ state: 'refused', problem });
  });

  it('refuses a broken or a tiny picture by name, and the rest goes on', async () => {
    const whole = await pageJpeg(2);
    const [broken, tiny, fine] = await Promise.all([
      sendFile(reader, batchId, 'W4072-p1.jpg', whole.subarray(0, whole.length / 2)),
      sendFile(reader, batchId, 'W4073-p1.jpg', await pageJpeg(3, { width: 100, height: 141 })),
      sendFile(reader, batchId, 'W4074 P1.JPG', await pageJpeg(4)),
    ]);
    await server.context.jobs.settle();
    const { body } = await reader.get(`/api/batches/${batchId}`).expect(200);
    const byId = new Map((body as BatchView).uploads.map((upload) => [upload.id, upload]));
    expect(byId.get(broken?.id ?? '')).toMatchObject({ state: 'refused', problem: 'The file is incomplete or damaged. Scan or upload it again.' });
    expect(byId.get(tiny?.id ?? '')).toMatchObject({ state: 'refused', problem: 'The picture is 100 by 141 pixels: too small to read. Scan at 150 dpi or more.' });
    expect(byId.get(fine?.id ?? '')).toMatchObject({ state: 'done', pages: [{ place: 'W4074, page 1' }] });
    expect((body as BatchView).uploads[0]?.state).toBe('refused');
  });

  it('sends what has no place to sorting, and places it by hand once', async () => {
    await bringIn(server, reader, batchId, 'scan0001.jpg', await pageJpeg(5));
    await bringIn(server, reader, batchId, 'W4071-p1-again.jpg', await pageJpeg(6));
    await bringIn(server, reader, batchId, 'W4071_p1.jpg', await pageJpeg(7));
    const { pages, places } = await loosePages();
    const missing = places.filter(({ image }) => image === null);
    expect(pages.map(({ fileName, why }) => [fileName, why])).toEqual([
      ['scan0001.jpg', 'The file name gives no candidate and page.'],
      ['W4071-p1-again.jpg', 'The file name gives no candidate and page.'],
      ['W4071_p1.jpg', 'Page 1 of W4071 is in already.'],
    ]);
    expect(missing.map(({ candidateNumber }) => candidateNumber)).toEqual(['W4072', 'W4073', 'W4075']);
    const [page] = pages;
    const to = { candidateId: missing[0]?.candidateId, pageNo: 1 };
    await reader.post(`/api/page-images/${page?.id}/place`).set('If-Match', String(page?.rev)).send(to).expect(200);
    const late = await lead.post(`/api/page-images/${page?.id}/place`).set('If-Match', String(page?.rev)).send(to).expect(409);
    expect((late.body as { error: { message: string } }).error.message).toBe('Someone sorted this page a moment ago. Yours was not stored.');
    const taken = await reader.post(`/api/page-images/${pages[1]?.id}/place`).set('If-Match', '1').send(to).expect(409);
    expect((taken.body as { error: { message: string } }).error.message).toBe('Page 1 of W4072 is in already. Take that page out first, or choose another place.');
    await reader.post(`/api/page-images/${pages[1]?.id}/discard`).set('If-Match', '1').expect(200);
    await reader.post(`/api/page-images/${pages[2]?.id}/turn`).set('If-Match', '1').send({ by: 1 }).expect(200, { ...(await reader.get(`/api/page-images/${pages[2]?.id}`)).body, turns: 1, widthPx: 877, heightPx: 620, rev: 2 });
    expect((await loosePages()).pages.map(({ fileName }) => fileName)).toEqual(['W4071_p1.jpg']);
    expect(await toRead()).toEqual([3, 3]);
  });

  it('takes a page out with the readings made from it only for a lead who says so', async () => {
    const { body } = await reader.post('/api/desk/leases').send({ itemId: paper.items[1], count: 1 }).expect(200);
    const [lease] = (body as { leases: { id: string; answerId: string; pageImageId: string; pageImageRev: number }[] }).leases;
    await reader.put(`/api/readings/${uuidv7()}`).send({ answerId: lease?.answerId, leaseId: lease?.id, text: '3.75', openedAt: 1 }).expect(200);
    const out = (agent: Agent, reopen: boolean) => agent.post(`/api/page-images/${lease?.pageImageId}/loosen`).set('If-Match', String(lease?.pageImageRev)).send({ reopen });
    expect(((await out(lead, false)).body as { error: { code: string } }).error.code).toBe('conflict');
    expect(((await out(reader, true)).body as { error: { code: string } }).error.code).toBe('not_allowed');
    await out(lead, true).expect(200);
    const answer = await lead.get(`/api/answers/${lease?.answerId}`).expect(200);
    expect(answer.body).toMatchObject({ state: 'not-read', score: null, crops: [] });
    expect(await toRead()).toEqual([2, 2]);
  });

  it('does not count a reading that comes by a lease on a page which was taken out meanwhile', async () => {
    const { body } = await reader.post('/api/desk/leases').send({ itemId: paper.items[0], count: 1 }).expect(200);
    const [lease] = (body as { leases: { id: string; answerId: string; pageImageId: string; pageImageRev: number }[] }).leases;
    const loosened = await reader.post(`/api/page-images/${lease?.pageImageId}/loosen`).set('If-Match', String(lease?.pageImageRev)).send({ reopen: false }).expect(200);
    await reader.put(`/api/readings/${uuidv7()}`).send({ answerId: lease?.answerId, leaseId: lease?.id, text: '6.10', openedAt: 1 }).expect(200);
    const answer = await lead.get(`/api/answers/${lease?.answerId}`).expect(200);
    expect(answer.body).toMatchObject({ state: 'not-read', score: null });
    const { places } = await loosePages();
    const page = loosened.body as { id: string; rev: number };
    const place = places.find(({ candidateNumber }) => candidateNumber === (answer.body as { candidateNumber: string }).candidateNumber);
    await reader.post(`/api/page-images/${page.id}/place`).set('If-Match', String(page.rev)).send({ candidateId: place?.candidateId, pageNo: 1 }).expect(200);
    expect((await lead.get(`/api/answers/${lease?.answerId}`)).body).toMatchObject({ state: 'not-read', readings: [] });
  });

  it('takes a file in parts that resume, and completes it only when all are there', async () => {
    const { data, info } = await sharp({ create: { width: 1800, height: 2500, channels: 3, background: 'white', noise: { type: 'gaussian', mean: 128, sigma: 60 } } }).png({ compressionLevel: 0 }).toBuffer({ resolveWithObject: true });
    expect(info.size).toBeGreaterThan(partBytes);
    const begun = await reader.post(`/api/batches/${batchId}/uploads`).send({ fileName: 'W4073-p1.png', size: data.length }).expect(201);
    const { id } = begun.body as UploadView;
    await reader.put(`/api/uploads/${id}/parts/1`).attach('file', data.subarray(partBytes), 'part').expect(200);
    const early = await reader.post(`/api/uploads/${id}/complete`).expect(409);
    expect((early.body as { error: { message: string } }).error.message).toBe('W4073-p1.png: 1 of 2 parts are here. Send the rest first.');
    await reader.put(`/api/uploads/${id}/parts/0`).attach('file', data.subarray(0, 1000), 'part').expect(400);
    expect(((await reader.get(`/api/uploads/${id}`)).body as UploadView).parts).toEqual([1]);
    await reader.put(`/api/uploads/${id}/parts/0`).attach('file', data.subarray(0, partBytes), 'part').expect(200);
    await reader.put(`/api/uploads/${id}/parts/2`).attach('file', Buffer.from('x'), 'part').expect(400);
    await reader.post(`/api/uploads/${id}/complete`).expect(202);
    await server.context.jobs.settle();
    const { body } = await reader.get(`/api/uploads/${id}`).expect(200);
    expect(body).toMatchObject({ state: 'done', pages: [{ place: 'W4073, page 1' }] });
    const kept = await reader.get(`/api/page-images/${(body as UploadView).pages[0]?.id}/file`).query({ size: 'original' }).expect(200);
    expect((kept.body as Buffer).equals(data)).toBe(true);
  });

  it('does not take a part larger than 8 MiB', async () => {
    const begun = await reader.post(`/api/batches/${batchId}/uploads`).send({ fileName: 'big.jpg', size: partBytes + 5 }).expect(201);
    const big = await reader.put(`/api/uploads/${(begun.body as UploadView).id}/parts/0`).attach('file', Buffer.alloc(partBytes + 1), 'part');
    expect(big.status).toBe(413);
  });

  it('splits a file of many pages and asks whose each is', async () => {
    const [one, two] = await Promise.all([20, 22].map(async (seed) => sharp(await pageJpeg(seed)).raw().toBuffer()));
    const stack = await sharp(Buffer.concat([one!, two!]), { raw: { width: 620, height: 877 * 2, channels: 3, pageHeight: 877 } }).tiff().toBuffer();
    expect(await bringIn(server, reader, batchId, 'stack.tif', stack)).toMatchObject({
      state: 'done',
      pages: [{ index: 0, state: 'loose', why: 'The file holds 2 pages. Say whose each is.' }, { index: 1, state: 'loose' }],
    });
  });

  it('does not place a page of someone who is marked absent', async () => {
    const { body } = await lead.get(`/api/sittings/${paper.sittingId}/candidates`).expect(200);
    const absent = (body as { candidates: { id: string; number: string; rev: number }[] }).candidates.find(({ number }) => number === 'W4075');
    await lead.patch(`/api/candidates/${absent?.id}`).set('If-Match', String(absent?.rev)).send({ attendance: 'absent' }).expect(200);
    const upload = await bringIn(server, reader, batchId, 'W4075-p1.jpg', await pageJpeg(21));
    expect(upload.pages).toMatchObject([{ state: 'loose', why: 'The class list says that W4075 is absent.' }]);
  });

  it('makes the pages of a file once, though its job runs again as after a crash', async () => {
    const upload = await bringIn(server, reader, batchId, 'other.jpg', await pageJpeg(30));
    insertJob(server.context.db, { id: uuidv7(), kind: 'ingest-upload', dedupeKey: 'again', payload: { uploadId: upload.id }, runAt: 0 });
    await server.context.jobs.settle();
    expect(((await reader.get(`/api/uploads/${upload.id}`)).body as UploadView).pages).toEqual(upload.pages);
  });

  it('gives up files on their way when a batch is cancelled, and takes no more', async () => {
    const { id } = await beginBatch(reader, paper.sittingId, 'B');
    const begun = await reader.post(`/api/batches/${id}/uploads`).send({ fileName: 'late.jpg', size: 10 }).expect(201);
    await (await server.signInAs('readerTwo')).patch(`/api/batches/${id}`).send({ state: 'cancelled' }).expect(403);
    await reader.patch(`/api/batches/${id}`).send({ state: 'cancelled' }).expect(200);
    await reader.put(`/api/uploads/${(begun.body as UploadView).id}/parts/0`).attach('file', Buffer.alloc(10), 'x').expect(409);
    await reader.post(`/api/batches/${id}/uploads`).send({ fileName: 'later.jpg', size: 10 }).expect(409);
  });

  it('lets nobody without the right send parts', async () => {
    const begun = await reader.post(`/api/batches/${batchId}/uploads`).send({ fileName: 'mine.jpg', size: 10 }).expect(201);
    const address = `/api/uploads/${(begun.body as UploadView).id}/parts/0`;
    await server.nobody().put(address).attach('file', Buffer.alloc(10), 'x').expect(401);
    await (await server.signInAs('outsider')).put(address).attach('file', Buffer.alloc(10), 'x').expect(404);
    await (await server.signInAs('external')).put(address).attach('file', Buffer.alloc(10), 'x').expect(403);
    await (await server.signInAs('officer')).put(address).attach('file', Buffer.alloc(10), 'x').expect(403);
  });
});

it('takes up a received file again after a restart', async () => {
  const first = await startTestServer();
  const { sittingId } = buildPaper(first);
  const reader = await first.signInAs('readerOne');
  const batch = await beginBatch(reader, sittingId);
  await first.context.jobs.stop();
  const upload = await sendFile(reader, batch.id, 'W4071-p1.jpg', await pageJpeg(1));
  expect(upload.state).toBe('received');
  first.context.jobs.run();
  await first.context.jobs.settle();
  const { body } = await reader.get(`/api/uploads/${upload.id}`).expect(200);
  expect(body).toMatchObject({ state: 'done', pages: [{ place: 'W4071, page 1' }] });
  expect(await first.context.storage.size(first.context.db.$client.prepare('select sha256 from upload').pluck().get() as string)).toBe(upload.size);
  expect(readdirSync(join(first.context.config.dataDir, 'parts'))).toEqual(['incoming']);
  await first.close();
});
