import type { Agent } from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { eq } from 'drizzle-orm';
import { inTransaction } from '../../db/client';
import { boxesOfLayout, findLayout, layoutPages } from '../../db/queries/layouts';
import { placeOf } from '../../db/queries/page-images';
import { updatePrinting } from '../../db/queries/printings';
import { answer, auditEntry, page, printedScript, script } from '../../db/schema';
import { fillPlace } from '../../server/services/page-places';
import { candidatesOf } from '../../server/services/candidates';
import { createSitting } from '../../server/services/sittings';
import { createItem } from '../../server/services/items';
import { importClassList } from '../../server/services/class-list';
import { insertPageImage } from '../../db/queries/page-images';
import { createBatch } from '../../server/services/batches';
import { beginUpload } from '../../server/services/uploads';
import { v7 as uuidv7 } from 'uuid';
import { actorOf, buildPaper, itemDraft, type BuiltPaper } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

describe('printing answer sheets', () => {
  let server: TestServer;
  let lead: Agent;
  let paper: BuiltPaper;
  beforeAll(async () => {
    server = await startTestServer();
    lead = await server.signInAs('lead');
  });
  beforeEach(() => void (paper = buildPaper(server)));
  afterAll(() => server.close());

  const print = (body: object = {}, sittingId = paper.sittingId) => lead.post(`/api/sittings/${sittingId}/printings`).send(body);
  const made = async (body: object = {}) => {
    const sent = await print(body).expect(202);
    await server.context.jobs.settle();
    return sent.body as { id: string; layout: number };
  };
  const scripts = () => server.context.db.select().from(script).where(eq(script.sitting, paper.sittingId)).all().sort((a, b) => a.number - b.number);
  const printings = async (agent = lead) => (await agent.get(`/api/sittings/${paper.sittingId}/printings`).expect(200)).body.printings;
  const preview = async (query: object = {}) => (await lead.get(`/api/sittings/${paper.sittingId}/sheet-preview`).query(query).expect(200)).body;

  /** A page of a candidate comes in. */
  const bringIn = (number: string): void => {
    const { context } = server;
    const { db } = context;
    const candidate = candidatesOf(context, actorOf(server, 'lead'), paper.sittingId).find((one) => one.number === number);
    const batch = createBatch(context, actorOf(server, 'lead'), paper.sittingId, 'A');
    const upload = beginUpload(context, actorOf(server, 'lead'), batch.id, { fileName: 'page.jpg', size: 10 });
    const place = placeOf(db, candidate?.id ?? '', 1);
    if (!place) throw new Error(`${number} has no page 1.`);
    const image = uuidv7();
    inTransaction(db, () => {
      insertPageImage(db, { id: image, upload: upload.id, index: 0, sitting: paper.sittingId, state: 'placed', page: place.page });
      fillPlace(context, place, image, { crops: [], sheet: null });
    });
  };

  it('makes a layout, boxes, scripts, spares and one file', async () => {
    const first = (await print({ spares: 2 }).expect(202)).body;
    expect(first).toMatchObject({ layout: 2, paperSize: 'a4', candidates: 3, spares: 2, pagesEach: 2, state: 'making', of: 5, size: null });
    expect((await lead.get(`/api/printings/${first.id}/file`).expect(409)).body.error.message).toBe('The sheets are still being made.');
    await server.context.jobs.settle();
    expect(await printings()).toMatchObject([{ id: first.id, state: 'made', done: 5, of: 5, size: expect.any(Number) }]);
    const { headers } = await lead.get(`/api/printings/${first.id}/file`).expect(200);
    expect(headers).toMatchObject({ 'content-type': 'application/pdf', 'content-disposition': expect.stringMatching(/^attachment; filename="answer-sheets-\d+-layout-2\.pdf"$/), 'cache-control': expect.stringContaining('private') });
    const layout = findLayout(server.context.db, paper.sittingId, 2);
    expect(layout).toMatchObject({ origin: 'printed' });
    expect(layoutPages(server.context.db, layout?.id ?? '')).toHaveLength(2);
    expect(boxesOfLayout(server.context.db, layout?.id ?? '').map(({ use }) => use).sort()).toEqual(['answer', 'answer', 'number', 'working', 'working']);
    expect(scripts().map(({ origin, layout: of, candidate }) => [origin, of === layout?.id, candidate !== null])).toEqual([...Array(3).fill(['printed', true, true]), ...Array(2).fill(['spare', true, false])]);
    const acts = server.context.db.select().from(auditEntry).all().filter(({ sitting, act }) => sitting === paper.sittingId && act === 'sheets-printed');
    expect(acts).toHaveLength(1);
    expect(JSON.stringify(acts)).not.toContain('W407');
  });

  it('gives spares places and answers, of which nothing is due before they are somebody’s', async () => {
    const progress = async () => (await lead.get(`/api/sittings/${paper.sittingId}/progress`).expect(200)).body;
    await made();
    const before = await progress();
    await made({ for: 'without-sheet', spares: 1 });
    const spare = scripts().at(-1);
    expect(server.context.db.select().from(page).where(eq(page.script, spare?.id ?? '')).all()).toHaveLength(2);
    expect(server.context.db.select().from(answer).where(eq(answer.script, spare?.id ?? '')).all().map(({ readingsDue }) => readingsDue)).toEqual([0, 0]);
    const after = await progress();
    expect([after.pages, after.answers]).toEqual([before.pages, before.answers]);
    expect(after.sheetsPrinted).toBe(3);
    expect((await lead.get(`/api/sittings/${paper.sittingId}/answers`).query({ limit: 50, offset: 0 }).expect(200)).body.total).toBe(6);
  });

  it('prints again on a layout of its own, and leaves a script alone whose page is in', async () => {
    const first = await made();
    bringIn('W4072');
    const boxesBefore = boxesOfLayout(server.context.db, findLayout(server.context.db, paper.sittingId, 2)?.id ?? '');
    const second = await made({ paperSize: 'letter' });
    expect(second).toMatchObject({ layout: 3, candidates: 2 });
    expect(await printings()).toMatchObject([{ layout: 3, paperSize: 'letter', candidates: 2 }, { layout: 2, candidates: 3 }]);
    const [old, next] = [2, 3].map((ordinal) => findLayout(server.context.db, paper.sittingId, ordinal)?.id ?? '');
    expect(scripts().map(({ layout }) => layout)).toEqual([next, old, next]);
    expect(boxesOfLayout(server.context.db, old ?? '')).toEqual(boxesBefore);
    expect(server.context.db.select().from(printedScript).where(eq(printedScript.printing, first.id)).all()).toHaveLength(3);
    expect(await preview()).toMatchObject({ candidates: 2, withPagesIn: 1, printings: 2 });
    await lead.get(`/api/printings/${first.id}/file`).expect(200);
  });

  it('prints only for those without a sheet, and not for those who are away', async () => {
    const candidates = candidatesOf(server.context, actorOf(server, 'lead'), paper.sittingId);
    await lead.patch(`/api/candidates/${candidates[2]?.id}`).set('If-Match', '1').send({ attendance: 'withdrawn' }).expect(200);
    expect(await made()).toMatchObject({ candidates: 2 });
    inTransaction(server.context.db, () => importClassList(server.context, actorOf(server, 'lead'), paper.sittingId, 'W4099'));
    expect(await preview()).toMatchObject({ candidates: 3, withoutSheet: 1, away: 1 });
    expect(await made({ for: 'without-sheet' })).toMatchObject({ layout: 3, candidates: 1 });
    const refused = await print({ for: 'without-sheet' }).expect(400);
    expect(refused.body.error.message).toBe('There is nobody to print for. Add candidates to the class list, or ask for spare sheets.');
  });

  it('is taken once for one key, and not while another is under way', async () => {
    const send = () => lead.post(`/api/sittings/${paper.sittingId}/printings`).set('Idempotency-Key', `print-${paper.sittingId}`).send({ spares: 1 });
    const [one, other] = [await send(), await send()];
    expect([one.status, other.status, other.body.id]).toEqual([202, 202, one.body.id]);
    await server.context.jobs.settle();
    updatePrinting(server.context.db, one.body.id, { state: 'making' });
    expect((await print().expect(409)).body.error.message).toBe('Sheets of this sitting are being made. Wait until they are done.');
    expect(scripts()).toHaveLength(4);
  });

  it('takes up a printing again after a restart, with the same bytes', async () => {
    const { id } = await made();
    const [first] = await printings();
    const etag = (await lead.get(`/api/printings/${id}/file`).expect(200)).headers.etag;
    updatePrinting(server.context.db, id, { state: 'making', done: 1, blob: null });
    inTransaction(server.context.db, () => server.context.jobs.add('print-sheets', id, { printingId: id }));
    await server.context.jobs.settle();
    expect(await printings()).toEqual([first]);
    expect((await lead.get(`/api/printings/${id}/file`).expect(200)).headers.etag).toBe(etag);
  });

  it('says that a file could not be made, and lets sheets be printed again', async () => {
    const { printer } = server.context;
    const { print: works } = printer;
    printer.print = () => Promise.reject(new Error('The disk is full.'));
    const { body } = await print().expect(202);
    await server.context.jobs.settle();
    printer.print = works;
    expect(await printings()).toMatchObject([{ id: body.id, state: 'failed', size: null }]);
    expect((await lead.get(`/api/printings/${body.id}/file`).expect(409)).body.error.message).toBe('This file could not be made. Print again.');
    expect(await made()).toMatchObject({ layout: 3, candidates: 3 });
  });

  it('shows one candidate’s sheets before anything is made, with codes that are nobody’s', async () => {
    const before = scripts().length;
    const shown = await preview({ paperSize: 'letter' });
    expect(shown).toMatchObject({ isLocked: true, widthMm: 215.9, heightMm: 279.4, candidates: 3, withoutSheet: 3, problem: null, items: 2 });
    expect(shown.pages).toHaveLength(2);
    expect(shown.pages[0].codes).toHaveLength(6);
    expect(shown.pages[0].words.map(({ text }: { text: string }) => text)).toEqual(expect.arrayContaining(['W4071', 'script 00001', 'layout 2']));
    expect(scripts()).toHaveLength(before);
    expect(await printings()).toEqual([]);
    await lead.get(`/api/sittings/${paper.sittingId}/sheet-preview`).query({ paperSize: 'a3' }).expect(400);
  });

  it('locks a paper for printing without drawn regions, and prints it', async () => {
    const { context, courseId } = server;
    const actor = actorOf(server, 'lead');
    const { id } = createSitting(context, actor, courseId, { title: 'Drawn nowhere', heldOn: '2026-05-06', secondPolicy: 'none', totalRounding: 'none' });
    createItem(context, actor, id, itemDraft());
    importClassList(context, actor, id, 'W4071\nW4072');
    expect((await print({}, id).expect(409)).body.error.message).toBe('The paper is still open to change. Lock it first.');
    await lead.post(`/api/sittings/${id}/lock`).expect(400);
    expect((await lead.post(`/api/sittings/${id}/lock`).send({ isForPrinting: true }).expect(200)).body).toMatchObject({ scripts: 2, answers: 2 });
    expect((await print({}, id).expect(202)).body).toMatchObject({ layout: 2, candidates: 2, pagesEach: 2 });
    await server.context.jobs.settle();
    const { body } = await lead.get(`/api/sittings/${id}/progress`).expect(200);
    expect(body).toMatchObject({ itemsPlaced: 1, layoutPages: 2, pages: { due: 4 } });
  });

  it('refuses a sitting without candidates unless spares are asked for', async () => {
    paper = buildPaper(server, { candidates: [] });
    await print().expect(400);
    await print({ spares: 501 }).expect(400);
    expect(await made({ spares: 3 })).toMatchObject({ candidates: 0, spares: 3 });
  });

  it('lets an external examiner look and nobody but a lead print or take the file', async () => {
    const { id } = await made();
    const [reader, external, officer, outsider] = await Promise.all((['readerOne', 'external', 'officer', 'outsider'] as const).map((name) => server.signInAs(name)));
    expect(await printings(external)).toHaveLength(1);
    await external?.get(`/api/sittings/${paper.sittingId}/sheet-preview`).expect(200);
    for (const [agent, status] of [[reader, 403], [external, 403], [officer, 403], [outsider, 404]] as const) {
      await agent?.post(`/api/sittings/${paper.sittingId}/printings`).send({}).expect(status);
      await agent?.get(`/api/printings/${id}/file`).expect(status);
    }
    for (const [agent, status] of [[reader, 403], [outsider, 404]] as const) {
      await agent?.get(`/api/sittings/${paper.sittingId}/printings`).expect(status);
      await agent?.get(`/api/sittings/${paper.sittingId}/sheet-preview`).expect(status);
    }
    await lead.get(`/api/printings/${uuidv7()}/file`).expect(404);
  });
});
