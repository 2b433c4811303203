import { eq } from 'drizzle-orm';
import type { Agent } from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { insertPageImage, setPlaceImage, updatePageImage } from '../../db/queries/page-images';
import { saveStrip, scriptOfCandidate } from '../../db/queries/people-and-paper';
import { page, script as scripts } from '../../db/schema';
import { createBatch } from '../../server/services/batches';
import { candidatesOf, changeAttendance } from '../../server/services/candidates';
import { printFor } from '../../server/services/printings';
import { beginUpload } from '../../server/services/uploads';
import type { PeopleAndPaper } from '../../shared/contracts/people-and-paper';
import { actorOf, buildPaper, itemDraft } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

describe('people and paper', () => {
  let server: TestServer;
  let lead: Agent;
  let reader: Agent;
  let other: Agent;
  beforeAll(async () => {
    server = await startTestServer();
    [lead, reader, other] = await Promise.all([server.signInAs('lead'), server.signInAs('readerOne'), server.signInAs('readerTwo')]);
  });
  afterAll(() => server.close());

  let sittingId: string;
  let items: readonly string[];
  let candidates: ReturnType<typeof candidatesOf>;
  beforeEach(() => {
    ({ sittingId, items } = buildPaper(server, { drafts: [itemDraft(), itemDraft('Fe', '4s')] }));
    candidates = candidatesOf(server.context, actorOf(server, 'lead'), sittingId);
  });

  const candidate = (index: number) => candidates[index] ?? expect.fail('There are three candidates.');
  const scriptOf = (index: number) => scriptOfCandidate(server.context.db, candidate(index).id) ?? expect.fail('Everyone has a script.');
  const overview = async (): Promise<PeopleAndPaper> => (await lead.get(`/api/sittings/${sittingId}/people-and-paper`).expect(200)).body;

  /** A page of a script with an image and the strip of its number, as bringing in scans leaves them. */
  async function bringIn(scriptId: string): Promise<void> {
    const { context } = server;
    const uploadId = beginUpload(context, actorOf(server, 'readerOne'), createBatch(context, actorOf(server, 'readerOne'), sittingId, 'A').id, { fileName: 'page.jpg', size: 10 }).id;
    const image = uuidv7();
    const place = context.db.select().from(page).where(eq(page.script, scriptId)).get() ?? expect.fail('A script has pages.');
    if (place.image !== null) updatePageImage(context.db, place.image, { state: 'loose', page: null });
    insertPageImage(context.db, { id: image, upload: uploadId, index: 0, sitting: sittingId, state: 'placed', page: place.id });
    setPlaceImage(context.db, place.id, image);
    const { sha256 } = await context.storage.put(new Uint8Array([0xff, 0xd8, ...Buffer.from(image)]));
    saveStrip(context.db, { script: scriptId, pageImage: image, blob: sha256, widthPx: 300, heightPx: 80 });
  }

  const read = (scriptId: string, text: string | null) => reader.put(`/api/number-readings/${uuidv7()}`).send({ scriptId, text });

  it('has hand-written numbers read without the printed one, once each, and compares them', async () => {
    for (const index of [0, 1, 2]) await bringIn(scriptOf(index).id);
    const { body } = await reader.get(`/api/sittings/${sittingId}/number-strips`).expect(200);
    expect(body.strips).toHaveLength(3);
    for (const { number } of candidates) expect(JSON.stringify(body)).not.toContain(number);
    const [first] = body.strips;
    await reader.get(`/api/scripts/${first.scriptId}/number-strip?v=${first.version}`).expect(200).expect('Content-Type', 'image/jpeg');
    await read(scriptOf(0).id, ' w-4071 ').expect(200);
    await read(scriptOf(1).id, null).expect(200);
    await read(scriptOf(2).id, 'W4099').expect(200);
    const seen = await overview();
    expect(seen.numbers).toEqual({ unread: 0, agree: 1, settled: 0 });
    expect(seen.unwritten.map(({ candidateNumber }) => candidateNumber)).toEqual(['W4072']);
    expect(seen.differ).toMatchObject([{ candidateNumber: 'W4073', read: 'W4099', claimed: null, isExchange: false }]);
    expect((await reader.get(`/api/sittings/${sittingId}/number-strips`).expect(200)).body).toEqual({ strips: [], left: 0 });
  });

  it('keeps a number reading under its id: a repeat changes nothing, another one is refused', async () => {
    await bringIn(scriptOf(0).id);
    const id = uuidv7();
    const send = (text: string | null, who = reader) => who.put(`/api/number-readings/${id}`).send({ scriptId: scriptOf(0).id, text });
    await send('W4071').expect(200);
    await send('W4071').expect(200);
    await send('W4072').expect(409);
    await send('W4071', other).expect(404);
  });

  it('tells two exchanged sheets, and swaps them with a trace; readings stay with the paper', async () => {
    for (const index of [0, 1]) await bringIn(scriptOf(index).id);
    const [one, two] = [scriptOf(0), scriptOf(1)];
    await read(one.id, 'W4072').expect(200);
    await read(two.id, 'W4071').expect(200);
    expect((await overview()).differ).toMatchObject([{ isExchange: true, claimed: { candidateNumber: 'W4072', scriptId: two.id } }, { isExchange: true, claimed: { scriptId: one.id } }]);
    const swap = { withScriptId: two.id, seen: candidate(0).id, seenOther: candidate(1).id, reason: 'neighbours exchanged sheets' };
    const { body }: { body: PeopleAndPaper } = await lead.post(`/api/scripts/${one.id}/swap`).send(swap).expect(200);
    expect([body.differ, body.numbers.agree, body.traces.map(({ act, was, candidateNumber }) => [act, was, candidateNumber]).sort()]).toEqual([[], 2, [['swapped', 'W4071', 'W4072'], ['swapped', 'W4072', 'W4071']]]);
    expect(scriptOf(0).id).toBe(two.id);
    // Seen before the swap: refused, nothing changes.
    await lead.post(`/api/scripts/${one.id}/swap`).send(swap).expect(409);
    expect(scriptOf(0).id).toBe(two.id);
  });

  it('binds a spare sheet to a candidate without pages, and sets the empty script aside', async () => {
    printFor(server.context, actorOf(server, 'lead'), sittingId, { paperSize: 'a4', spares: 1, for: 'all' });
    const spare = spareOf() ?? expect.fail('A spare sheet was printed.');
    await bringIn(spare);
    await read(spare, 'W4072').expect(200);
    expect((await overview()).spares).toMatchObject([{ scriptId: spare, read: 'W4072' }]);
    const empty = scriptOf(1).id;
    const { body }: { body: PeopleAndPaper } = await lead.post(`/api/scripts/${spare}/bind`).send({ candidateId: candidate(1).id, seen: null, reason: 'used a spare sheet' }).expect(200);
    expect(scriptOf(1).id).toBe(spare);
    expect(scriptOf(1).id).not.toBe(empty);
    expect(body).toMatchObject({ spares: [], numbers: { agree: 1 } });
    expect(body.without.map(({ candidateNumber }) => candidateNumber)).toEqual(['W4071', 'W4073']);
    // Marks and ledger know one script a candidate.
    const { body: totals } = await lead.get(`/api/sittings/${sittingId}/totals`).expect(200);
    expect(totals.rows).toHaveLength(3);
    expect((await lead.get(`/api/sittings/${sittingId}/answers`).expect(200)).body.total).toBe(6);
  });

  const spareOf = (): string | undefined => server.context.db.select().from(scripts).where(eq(scripts.sitting, sittingId)).all().find(({ origin }) => origin === 'spare')?.id;

  it('does not bind over pages that are in, nor across sittings', async () => {
    for (const index of [0, 1]) await bringIn(scriptOf(index).id);
    const bind = (index: number, candidateId: string) => lead.post(`/api/scripts/${scriptOf(index).id}/bind`).send({ candidateId, seen: candidate(index).id, reason: 'wrong sheet' });
    const { body } = await bind(0, candidate(1).id).expect(409);
    expect(body.error.message).toBe(`W4072 has pages in on script ${scriptOf(1).number} already. Swap the two instead.`);
    const elsewhere = buildPaper(server, { candidates: ['W4090'] });
    await bind(0, candidatesOf(server.context, actorOf(server, 'lead'), elsewhere.sittingId)[0]?.id ?? '').expect(404);
    // The one who gives a sheet away gets an empty one.
    await bind(0, candidate(2).id).expect(200);
    expect((await overview()).without.map(({ candidateNumber }) => candidateNumber)).toEqual(['W4071']);
  });

  it('keeps a sheet where it is when a lead has looked, until another candidate or image asks again', async () => {
    await bringIn(scriptOf(0).id);
    await read(scriptOf(0).id, 'W4O71').expect(200);
    const { body } = await lead.post(`/api/scripts/${scriptOf(0).id}/number-settled`).send({ seen: candidate(0).id, reason: 'a letter O for a zero' }).expect(200);
    expect(body).toMatchObject({ differ: [], numbers: { settled: 1 } });
    await bringIn(scriptOf(0).id);
    expect(await overview()).toMatchObject({ numbers: { unread: 1, settled: 0 } });
  });

  it('lists pages of someone absent, and the pages that a script lacks', async () => {
    await bringIn(scriptOf(0).id);
    changeAttendance(server.context, actorOf(server, 'lead'), candidate(0).id, candidate(0).rev, 'absent');
    expect((await overview()).unexpected).toMatchObject([{ candidateNumber: 'W4071', attendance: 'absent' }]);
  });

  describe('a script by hand', () => {
    const byHand = (index: number) => lead.post(`/api/candidates/${candidate(index).id}/by-hand`).send({ reason: 'large print' });
    const sheet = (first: string, second: string) => ({ openedAt: 1, readings: [{ id: uuidv7(), itemId: items[0], text: first }, { id: uuidv7(), itemId: items[1], ...(second.startsWith('@') ? { code: second.slice(1) } : { text: second }) }] });

    it('is typed by two people, each once and key-blind, and then marked; a difference goes to the lead', async () => {
      await byHand(0).expect(200);
      const script = scriptOf(0).id;
      const { body: open } = await reader.get(`/api/scripts/${script}/by-hand`).expect(200);
      expect(open.items.map(({ label }: { label: string }) => label)).toEqual(['Cl 3p', 'Fe 4s']);
      for (const kept of ['6.10', '3.75', 'grains', 'bands']) expect(JSON.stringify(open)).not.toContain(kept);
      const typed = sheet('6.10', '3.75');
      await reader.put(`/api/scripts/${script}/by-hand`).send(typed).expect(200);
      await reader.put(`/api/scripts/${script}/by-hand`).send(typed).expect(200);
      await reader.put(`/api/scripts/${script}/by-hand`).send(sheet('6.10', '3.75')).expect(409);
      expect((await reader.get(`/api/sittings/${sittingId}/by-hand`).expect(200)).body.scripts).toEqual([]);
      expect((await overview()).byHand).toMatchObject([{ candidateNumber: 'W4071', typed: 1, wanted: 2 }]);
      expect((await other.get(`/api/sittings/${sittingId}/by-hand`).expect(200)).body.scripts).toHaveLength(1);
      await other.put(`/api/scripts/${script}/by-hand`).send(sheet('6.10', '3.57')).expect(200);
      const { body: rows } = await lead.get(`/api/sittings/${sittingId}/answers?find=W4071`).expect(200);
      expect(rows.rows.map(({ state }: { state: string }) => state)).toEqual(['concordant', 'discordant']);
    });

    it('comes to no desk, and takes nothing by halves', async () => {
      await byHand(0).expect(200);
      const { body } = await reader.post('/api/desk/leases').send({ itemId: items[0], count: 5 }).expect(200);
      expect(body.leases).toEqual([]);
      const script = scriptOf(0).id;
      const half = sheet('6.10', '3.75');
      const { body: refusal } = await reader.put(`/api/scripts/${script}/by-hand`).send({ ...half, readings: half.readings.slice(0, 1) }).expect(400);
      expect(refusal.error.message).toBe('Item 2 has no value. Type one, or say that the box is blank.');
      await reader.put(`/api/scripts/${script}/by-hand`).send(sheet('6.10', '3.7.5')).expect(400);
      expect((await overview()).byHand).toMatchObject([{ typed: 0 }]);
    });

    it('is not made where pages are in, nor twice, and is found by nobody where it is none', async () => {
      await bringIn(scriptOf(0).id);
      await byHand(0).expect(409);
      await byHand(1).expect(200);
      await byHand(1).expect(409);
      await reader.get(`/api/scripts/${scriptOf(2).id}/by-hand`).expect(404);
    });
  });

  it('is for leads to change: a reader reads numbers and types, nothing else', async () => {
    await bringIn(scriptOf(0).id);
    const script = scriptOf(0).id;
    await reader.get(`/api/sittings/${sittingId}/people-and-paper`).expect(403);
    await reader.post(`/api/scripts/${script}/bind`).send({ candidateId: candidate(1).id, seen: candidate(0).id, reason: 'mine' }).expect(403);
    await reader.post(`/api/candidates/${candidate(1).id}/by-hand`).send({ reason: 'mine' }).expect(403);
    const external = await server.signInAs('external');
    await external.get(`/api/sittings/${sittingId}/people-and-paper`).expect(200);
    await external.put(`/api/number-readings/${uuidv7()}`).send({ scriptId: script, text: 'W4071' }).expect(403);
  });
});
