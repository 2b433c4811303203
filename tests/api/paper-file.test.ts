import { PDFDocument } from 'pdf-lib';
import type { Agent } from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { auditEntry, membership } from '../../db/schema';
import type { PaperFile } from '../../shared/contracts/paper-file';
import { buildPaper, itemDraft } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

describe('a paper as a file', () => {
  let server: TestServer;
  let lead: Agent;
  beforeAll(async () => {
    server = await startTestServer();
    lead = await server.signInAs('lead');
  });
  afterAll(() => server.close());

  const drafts = [
    itemDraft('Cl', '3p', { bands: [{ name: 'near', kind: 'absolute', width: '0.05', marks: '2' }], slips: [{ id: 'counts-itself', marks: '1' }], alternatives: [{ name: 'core count', convention: 'core-count', value: '', marks: '1', reason: 'taught last year' }] }),
    itemDraft('Mg', '2p', { asked: { symbol: 'Mg', charge: 2, electron: '2p', quantity: 'sigma', convention: 'slater' }, prompt: 'Find σ by Slater’s rules, to two decimals.' }),
  ];
  const fileOf = async (sittingId: string) => (await lead.get(`/api/sittings/${sittingId}/paper.json`).expect(200)).body as PaperFile;
  const tagOf = async (sittingId: string) => (await lead.get(`/api/sittings/${sittingId}/paper.json`)).headers.etag ?? '';
  const put = async (sittingId: string, file: unknown) => lead.put(`/api/sittings/${sittingId}/paper.json`).set('If-Match', await tagOf(sittingId)).send(file as object);

  it('goes out and comes in as it was, keys worked anew', async () => {
    const from = buildPaper(server, { drafts, locked: false });
    const to = buildPaper(server, { locked: false });
    const file = await fileOf(from.sittingId);
    expect(file.items).toEqual(drafts);
    expect(JSON.stringify(file)).not.toContain('6.10');
    const taken = await put(to.sittingId, file);
    expect([taken.status, { ...(taken.body as PaperFile), title: '' }]).toEqual([200, { ...file, title: '' }]);
    const items = await lead.get(`/api/sittings/${to.sittingId}/items`).expect(200);
    // Slater's coefficients (Phys. Rev. 36, 57, 1930): Cl 3p 6.10; sigma of Mg2+ 2p is 7 x 0.35 + 2 x 0.85 = 4.15.
    expect((items.body as { items: { worked: { key: { text: string } } }[] }).items.map(({ worked }) => worked.key.text)).toEqual(['6.10', '4.15']);
  });

  it('names item and field of what is wrong, and changes nothing', async () => {
    const { sittingId } = buildPaper(server, { locked: false });
    const before = await fileOf(sittingId);
    const bad = await put(sittingId, { ...before, items: [itemDraft(), itemDraft('Fe', '4p')] });
    expect(bad.status).toBe(400);
    expect(bad.body).toMatchObject({ error: { message: 'Item 2: Iron has no 4p electron in its ground state.', fields: { 'items.1.asked.electron': 'Iron has no 4p electron in its ground state.' } } });
    const both = await put(sittingId, { ...before, items: [itemDraft('Xx', '1s'), itemDraft(), itemDraft('Cl', '3p', { marks: '1/7' })] });
    expect(Object.keys((both.body as { error: { fields: object } }).error.fields)).toEqual(['items.0.asked.symbol', 'items.2.marks']);
    expect((await put(sittingId, { ...before, items: [{ ...itemDraft(), key: '5.00' }] })).status).toBe(400);
    expect((await put(sittingId, { ...before, pages: [] })).body).toMatchObject({ error: { message: 'Item 1, answer box on page 1: there is no page 1.' } });
    expect((await put(sittingId, { ...before, boxes: [{ ...before.boxes[0], item: 9 }] })).body).toMatchObject({ error: { fields: { 'boxes.0.item': 'There is no such item.' } } });
    expect((await put(sittingId, { ...before, version: 2 })).status).toBe(400);
    expect(await fileOf(sittingId)).toEqual(before);
  });

  it('is not taken over a file that another lead took meanwhile, and leaves its acts in the trail', async () => {
    const { sittingId } = buildPaper(server, { locked: false });
    const file = await fileOf(sittingId);
    const seen = await tagOf(sittingId);
    await lead.put(`/api/sittings/${sittingId}/paper.json`).set('If-Match', seen).send({ ...file, items: [itemDraft('Fe', '4s'), itemDraft()] }).expect(200);
    const late = await lead.put(`/api/sittings/${sittingId}/paper.json`).set('If-Match', seen).send({ ...file, items: [] }).expect(409);
    expect((late.body as { error: { current: unknown } }).error.current).toMatchObject({ items: [itemDraft('Fe', '4s'), itemDraft()] });
    await lead.put(`/api/sittings/${sittingId}/paper.json`).send(file).expect(400);
    const acts = server.context.db.select().from(auditEntry).all().filter(({ sitting }) => sitting === sittingId).map(({ act }) => act);
    expect(acts.filter((act) => act === 'item-removed')).toHaveLength(2);
    expect(acts.at(-1)).toBe('layout-changed');
  });

  it('is not taken over an edit of one item that another lead made since it was read', async () => {
    const { sittingId, items } = buildPaper(server, { locked: false });
    const file = await fileOf(sittingId);
    const seen = await tagOf(sittingId);
    server.context.db.insert(membership).values({ id: uuidv7(), person: server.people.readerTwo, course: server.courseId, role: 'lead', from: 0 }).run();
    const other = await server.signInAs('readerTwo');
    const { rev } = (await other.get(`/api/items/${items[0]}`).expect(200)).body as { rev: number };
    await other.put(`/api/items/${items[0]}`).set('If-Match', String(rev)).send(itemDraft('Cl', '3p', { marks: '5' })).expect(200);
    const late = await lead.put(`/api/sittings/${sittingId}/paper.json`).set('If-Match', seen).send(file).expect(409);
    expect(late.body).toMatchObject({ error: { message: 'Someone changed this paper meanwhile. The file was not taken.', current: { items: [{ marks: '5' }, {}] } } });
    expect((await fileOf(sittingId)).items[0]).toMatchObject({ marks: '5' });
    await lead.put(`/api/sittings/${sittingId}/paper.json`).set('If-Match', await tagOf(sittingId)).send(file).expect(200);
    await lead.put(`/api/sittings/${sittingId}/paper.json`).set('If-Match', 'then?').send(file).expect(400);
  });

  it('is not taken by a locked paper', async () => {
    const { sittingId } = buildPaper(server);
    expect((await put(sittingId, await fileOf(sittingId))).status).toBe(409);
  });

  it('has its schema in the open', async () => {
    const { body } = await server.nobody().get('/api/schemas/paper-1.json').expect(200);
    expect(body).toMatchObject({ $id: 'paper-1.json', type: 'object', properties: { format: { const: 'meniscus-paper' }, version: { const: 1 } } });
  });

  it('prints as a PDF with its own fonts, questions first, then the scheme', async () => {
    const { sittingId } = buildPaper(server, { drafts, locked: false });
    const { body, headers } = await lead.get(`/api/sittings/${sittingId}/paper.pdf`).buffer(true).parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    }).expect(200);
    expect(headers['content-type']).toBe('application/pdf');
    const document = await PDFDocument.load(body as Buffer);
    expect(document.getPageCount()).toBe(2);
    expect(document.getTitle()).toBe('CHM 214, Paper 2, spring sitting: paper and mark scheme');
    const fontFiles = document.context.enumerateIndirectObjects().filter(([, object]) => object.toString().includes('/FontFile2'));
    expect(fontFiles.length).toBeGreaterThanOrEqual(4);
    const names = document.context.enumerateIndirectObjects().map(([, object]) => object.toString()).join('\n');
    for (const name of ['AtkinsonHyperlegibleNext', 'AtkinsonHyperlegibleMono', 'STIXTwoText']) expect(names).toContain(name);
  });

  describe('someone else’s', () => {
    it('is kept from readers and outsiders; an external examiner looks only', async () => {
      const { sittingId } = buildPaper(server, { locked: false });
      const file = await fileOf(sittingId);
      for (const [name, look, write] of [['readerOne', 403, 403], ['external', 200, 403], ['officer', 403, 403], ['outsider', 404, 404]] as const) {
        const agent = await server.signInAs(name);
        for (const kind of ['json', 'pdf']) await agent.get(`/api/sittings/${sittingId}/paper.${kind}`).expect(look);
        await agent.put(`/api/sittings/${sittingId}/paper.json`).set('If-Match', 'a1').send({ ...file, items: [], boxes: [] }).expect(write);
      }
      expect(await fileOf(sittingId)).toEqual(file);
    });
  });
});
