import { randomUUID } from 'node:crypto';
import sharp from 'sharp';
import type { Agent } from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { buildPaper, itemDraft, layoutFor, type BuiltPaper } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

describe('regions of a paper', () => {
  let server: TestServer;
  let lead: Agent;
  let paper: BuiltPaper;
  let boxes: string;
  beforeAll(async () => {
    server = await startTestServer();
    lead = await server.signInAs('lead');
  });
  beforeEach(() => {
    paper = buildPaper(server, { locked: false });
    boxes = `/api/sittings/${paper.sittingId}/layouts/1/boxes`;
  });
  afterAll(() => server.close());

  const sample = (page: number) => `/api/sittings/${paper.sittingId}/layouts/1/pages/${page}/sample`;
  const picture = (width = 600, height = 850) => sharp({ create: { width, height, channels: 3, background: '#eee' } }).png().toBuffer();

  it('starts with one A4 page and every item without its box', async () => {
    const fresh = buildPaper(server, { drafts: [], locked: false });
    await lead.post(`/api/sittings/${fresh.sittingId}/items`).send(itemDraft()).expect(201);
    const { body } = await lead.get(`/api/sittings/${fresh.sittingId}/layouts/1/boxes`).expect(200);
    expect(body).toMatchObject({ isLocked: false, pages: [{ pageNo: 1, widthMm: 210, heightMm: 297, sample: null }], boxes: [], itemsWithoutBox: [{ number: 1, label: 'Cl 3p' }] });
  });

  it('stores pages and boxes whole, under the rev that was seen', async () => {
    const [one, two] = paper.items;
    const sent = {
      pages: [{ widthMm: 210, heightMm: 297 }, { widthMm: 297, heightMm: 210 }],
      boxes: [
        { pageNo: 1, item: one, use: 'answer', x: 120, y: 20, w: 60, h: 18 },
        { pageNo: 1, item: one, use: 'working', x: 20, y: 20, w: 90, h: 30.5 },
        { pageNo: 2, item: two, use: 'answer', x: 237, y: 192, w: 60, h: 18 },
        { pageNo: 1, item: null, use: 'number', x: 120, y: 5, w: 60, h: 10 },
      ],
    };
    const saved = await lead.put(boxes).set('If-Match', '1').send(sent).expect(200);
    expect(saved.body).toMatchObject({ rev: 2, itemsWithoutBox: [], pages: [{ pageNo: 1 }, { pageNo: 2, widthMm: 297 }] });
    expect(saved.body.boxes).toHaveLength(4);
    const late = await lead.put(boxes).set('If-Match', '1').send(layoutFor([])).expect(409);
    expect(late.body.error.current.boxes).toHaveLength(4);
    const kept = saved.body.boxes.slice(0, 1);
    const fewer = await lead.put(boxes).set('If-Match', '2').send({ pages: sent.pages.slice(0, 1), boxes: kept }).expect(200);
    expect(fewer.body).toMatchObject({ pages: [{ pageNo: 1 }], boxes: kept });
  });

  it.each([
    [{ x: 160 }, 'Item 1, answer box on page 1: the box reaches beyond page 1.'],
    [{ w: 4.9 }, 'Item 1, answer box on page 1: a box is at least 5 mm wide and high.'],
    [{ pageNo: 2 }, 'Item 1, answer box on page 2: there is no page 2.'],
    [{ item: randomUUID() }, 'A box without item, answer box on page 1: the paper has no such item.'],
    [{ item: null }, 'A box without item, answer box on page 1: say to which item the box belongs.'],
    [{ use: 'number' }, 'Box for the candidate number on page 1: the box for the candidate number belongs to no item.'],
    [{ y: -1 }, 'Item 1, answer box on page 1: the box reaches beyond page 1.'],
  ])('names the box that is wrong: %j', async (change, message) => {
    const sent = layoutFor(paper.items);
    const { body } = await lead.put(boxes).set('If-Match', '1').send({ ...sent, boxes: [{ ...sent.boxes[0], ...change }] }).expect(400);
    expect(body.error.fields).toEqual({ 'boxes.0': message });
  });

  it('takes one answer box an item', async () => {
    const sent = layoutFor([paper.items[0] ?? '', paper.items[0] ?? '']);
    const { body } = await lead.put(boxes).set('If-Match', '1').send(sent).expect(400);
    expect(body.error.message).toBe('Item 1, answer box on page 1: the item has an answer box already.');
  });

  it('keeps a picture of each page, upright, bounded and as JPEG', async () => {
    const sideways = await sharp({ create: { width: 3000, height: 2100, channels: 3, background: '#eee' } }).jpeg().withMetadata({ orientation: 6 }).toBuffer();
    await lead.post(sample(1)).attach('file', sideways, 'page.jpg').expect(200);
    const { body } = await lead.post(sample(2)).attach('file', await picture(), 'page.png').expect(200);
    expect(body.pages).toMatchObject([{ pageNo: 1, sample: expect.any(String) }, { pageNo: 2, sample: expect.any(String) }]);
    const file = await lead.get(sample(1)).expect(200).expect('Content-Type', 'image/jpeg').expect('Cache-Control', /private/);
    expect(await sharp(file.body as Buffer).metadata()).toMatchObject({ format: 'jpeg', width: 1400, height: 2000 });
    await lead.get(sample(1)).set('If-None-Match', String(file.headers.etag)).expect(304);
    await lead.get(sample(3)).expect(404);
  });

  it('keeps a sample when boxes are stored again', async () => {
    const { body } = await lead.post(sample(1)).attach('file', await picture(), 'page.png').expect(200);
    const saved = await lead.put(boxes).set('If-Match', String(body.rev)).send(layoutFor(paper.items)).expect(200);
    expect(saved.body.pages[0].sample).toBe(body.pages[0].sample);
  });

  describe('someone else’s', () => {
    it('lets an external examiner look, and nobody but a lead write', async () => {
      await lead.post(sample(1)).attach('file', await picture(), 'page.png').expect(200);
      const external = await server.signInAs('external');
      await external.get(boxes).expect(200);
      await external.get(sample(1)).expect(200);
      for (const name of ['external', 'readerOne', 'officer'] as const) {
        const other = await server.signInAs(name);
        await other.put(boxes).set('If-Match', '2').send(layoutFor(paper.items)).expect(403);
        await other.post(sample(1)).attach('file', await picture(), 'page.png').expect(403);
      }
      const reader = await server.signInAs('readerOne');
      await reader.get(boxes).expect(403);
      await reader.get(sample(1)).expect(403);
      const outsider = await server.signInAs('outsider');
      await outsider.get(boxes).expect(404);
      await outsider.get(sample(1)).expect(404);
      await outsider.put(boxes).set('If-Match', '2').send(layoutFor(paper.items)).expect(404);
      await outsider.post(sample(1)).attach('file', await picture(), 'page.png').expect(404);
    });
  });

  describe('edge cases', () => {
    it('refuses what is no picture, a drawing in SVG, a broken picture, and no file at all', async () => {
      const whole = await picture();
      const svg = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="10" height="10"/>');
      for (const bytes of [Buffer.from('hello'), svg, whole.subarray(0, whole.length / 2), Buffer.alloc(0)]) {
        const { body } = await lead.post(sample(1)).attach('file', bytes, 'page.png').expect(400);
        expect(body.error.fields).toHaveProperty('file');
      }
      await lead.post(sample(1)).field('other', 'x').expect(400);
      await lead.post(sample(1)).attach('wrong', whole, 'page.png').expect(400);
    });

    it('refuses a file over 20 MB, a page out of order, another ordinal and mad numbers', async () => {
      await lead.post(sample(1)).attach('file', Buffer.alloc(21 * 1024 * 1024), 'page.png').expect(413);
      await lead.post(sample(3)).attach('file', await picture(), 'page.png').expect(404);
      await lead.get(`/api/sittings/${paper.sittingId}/layouts/2/boxes`).expect(400);
      await lead.put(boxes).set('If-Match', '1').send({ pages: [], boxes: [] }).expect(400);
      await lead.put(boxes).set('If-Match', '1').send({ pages: [{ widthMm: 1e9, heightMm: 297 }], boxes: [] }).expect(400);
      await lead.put(boxes).set('If-Match', '1').set('Content-Type', 'application/json').send('{"pages":[{"widthMm":210,"heightMm":297}],"boxes":[{"pageNo":1,"item":null,"use":"number","x":null,"y":1,"w":9,"h":9}]}').expect(400);
    });
  });
});
