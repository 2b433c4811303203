import type { Agent } from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { DeskLease } from '../../shared/contracts/desk';
import type { AnswerView, LedgerRow } from '../../shared/contracts/ledger';
import { giveEvidence, type Answer } from '../support/evidence';
import { buildPaper, itemDraft } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

describe('readings, marks and rulings', () => {
  let server: TestServer;
  let lead: Agent;
  let one: Agent;
  let two: Agent;
  let sittingId: string;
  let items: readonly string[];
  let answers: Answer[];

  beforeAll(async () => {
    server = await startTestServer();
    [lead, one, two] = await Promise.all([server.signInAs('lead'), server.signInAs('readerOne'), server.signInAs('readerTwo')]);
  });
  afterAll(() => server.close());
  beforeEach(() => {
    // Cl 3p, key 6.10, and Fe 4s, key 3.75: Slater, Phys. Rev. 36, 57 (1930) for iron.
    ({ sittingId, items } = buildPaper(server));
    answers = giveEvidence(server, sittingId);
  });

  const lease = async (agent: Agent, item = 0, count = 20): Promise<DeskLease[]> =>
    (await agent.post('/api/desk/leases').send({ itemId: items[item], count }).expect(200)).body.leases;
  const record = (agent: Agent, held: DeskLease, sent: { text?: string; code?: string; note?: string }, id = uuidv7()) =>
    agent.put(`/api/readings/${id}`).send({ answerId: held.answerId, leaseId: held.id, openedAt: 1, ...sent });
  const view = async (answerId: string): Promise<AnswerView> => (await lead.get(`/api/answers/${answerId}`).expect(200)).body;
  const rows = async (query: Record<string, string> = {}): Promise<LedgerRow[]> =>
    (await lead.get(`/api/sittings/${sittingId}/answers`).query(query).expect(200)).body.rows;
  const rule = (answerId: string, rev: number, body: object) => lead.post(`/api/answers/${answerId}/rulings`).set('If-Match', String(rev)).send(body);
  const type = (answerId: string, sent: { text?: string; code?: string }) =>
    lead.put(`/api/answers/${answerId}/third-reading/${uuidv7()}`).send({ openedAt: 1, ...sent });

  it('never gives one answer to two readers', async () => {
    const mine = await lease(one, 0, 2);
    const theirs = await lease(two, 0, 20);
    const ids = [...mine, ...theirs].map(({ answerId }) => answerId);
    expect(new Set(ids).size).toBe(3);
  });

  it('marks a reading once it is kept, verbatim, with its reason', async () => {
    const [held] = await lease(one);
    if (!held) throw new Error('Nothing to read.');
    expect((await record(one, held, { text: '6,1' }).expect(200)).body).toEqual({ kept: true });
    const seen = await view(held.answerId);
    expect(seen).toMatchObject({ state: 'one-reading', readings: [{ given: { text: '6,1', code: null } }], score: { grains: 3600, why: { head: 'the key, rounded' } } });
  });

  it('stores a repeated reading once, and refuses another under the same id', async () => {
    const [held] = await lease(one);
    if (!held) throw new Error('Nothing to read.');
    const id = uuidv7();
    await record(one, held, { text: '6.10' }, id).expect(200);
    await record(one, held, { text: '6.10' }, id).expect(200);
    await record(one, held, { text: '6.70' }, id).expect(409);
    expect((await view(held.answerId)).readings).toHaveLength(1);
  });

  it('keeps readings sent at once each for itself: a refused one and a repeat among them touch no other', async () => {
    const [first, second, third] = await lease(one);
    if (!first || !second || !third) throw new Error('Three answers to read were expected.');
    const id = uuidv7();
    const sent = [record(one, first, { text: '6.10' }, id), record(one, second, { text: '6..1' }), record(one, third, { text: '6.70' }), record(one, first, { text: '6.10' }, id)];
    const statuses = (await Promise.all(sent)).map(({ status }) => status);
    expect(statuses).toEqual([200, 400, 200, 200]);
    const seen = await Promise.all([first, second, third].map(({ answerId }) => view(answerId)));
    expect(seen.map(({ readings }) => readings.length)).toEqual([1, 0, 1]);
  });

  it('names the place of a text it does not understand, and stores nothing', async () => {
    const [held] = await lease(one);
    if (!held) throw new Error('Nothing to read.');
    const { body } = await record(one, held, { text: '6..1' }).expect(400);
    expect(body.error).toMatchObject({ code: 'invalid_request', message: 'Two points. Keep one: 6.1' });
    expect((await view(held.answerId)).state).toBe('not-read');
  });

  it('gives a reading that was taken back to the same reader again', async () => {
    const [held] = await lease(one);
    if (!held) throw new Error('Nothing to read.');
    const id = uuidv7();
    await record(one, held, { text: '6.70' }, id).expect(200);
    const { body } = await one.post(`/api/readings/${id}/take-back`).expect(200);
    expect(body.lease.answerId).toBe(held.answerId);
    expect((await view(held.answerId)).state).toBe('not-read');
  });

  it('holds what was set aside until a lead has typed and ruled, and returns all of it on taking back', async () => {
    const [held] = await lease(one);
    if (!held) throw new Error('Nothing to read.');
    await record(one, held, { code: 'ask-the-lead', note: '4.55 or 4.95' }).expect(200);
    const before = await view(held.answerId);
    expect(before).toMatchObject({ state: 'set-aside', isCovered: true, score: null, readings: [{ note: null }] });
    await rule(held.answerId, before.rev, { kind: 'value', text: '6.10' }).expect(409);
    const typed: AnswerView = (await type(held.answerId, { text: '6.10' }).expect(200)).body;
    expect(typed).toMatchObject({ isCovered: false, readings: [{ note: '4.55 or 4.95' }], mine: { text: '6.10', grains: 3600 } });
    await rule(held.answerId, typed.rev, { kind: 'value', text: '6.10' }).expect(400);
    const ruled: AnswerView = (await rule(held.answerId, typed.rev, { kind: 'value', text: '6.10', reason: 'legible in the scan' }).expect(200)).body;
    expect(ruled).toMatchObject({ state: 'ruled', score: { grains: 3600 }, ruling: { kind: 'value', isOwn: true } });
    await rule(held.answerId, typed.rev, { kind: 'mark', marks: '0', reason: 'an old rev' }).expect(409);
    const back: AnswerView = (await lead.post(`/api/rulings/${ruled.ruling?.id}/take-back`).expect(200)).body;
    expect(back).toMatchObject({ state: 'set-aside', score: null, ruling: null });
  });

  it('keeps a pair that differs covered, in the ledger too, and finds it by no value', async () => {
    const { body: sitting } = await lead.get(`/api/sittings/${sittingId}`).expect(200);
    await lead.patch(`/api/sittings/${sittingId}`).set('If-Match', String(sitting.rev)).send({ secondPolicy: 'all' }).expect(200);
    const firsts = await lease(one);
    const [first] = firsts;
    if (!first) throw new Error('Nothing to read.');
    await record(one, first, { text: '6.10' }).expect(200);
    const second = (await lease(two)).find(({ answerId }) => answerId === first.answerId);
    if (!second) throw new Error('The second reading was not given out.');
    await record(two, second, { text: '6.70' }).expect(200);
    const [row] = await rows({ show: 'discordant' });
    expect(row).toMatchObject({ isCovered: true, readings: [null, null], value: null, grains: null });
    expect(await rows({ find: '6.*' })).toEqual([]);
    expect((await view(first.answerId)).readings).toMatchObject([{ given: null, grains: null }, { given: null, grains: null }]);
    const typed: AnswerView = (await type(first.answerId, { text: '6.10' }).expect(200)).body;
    expect(typed).toMatchObject({ gap: '0.60', readings: [{ isAsMine: true, grains: 3600 }, { isAsMine: false, grains: 0 }] });
    // It equals one of the two, so no reason is asked.
    const ruled: AnswerView = (await rule(first.answerId, typed.rev, { kind: 'value', text: '6.10' }).expect(200)).body;
    // Once it is taken back, someone who has not typed learns neither reading from what was ruled.
    await lead.post(`/api/rulings/${ruled.ruling?.id}/take-back`).expect(200);
    const external = await server.signInAs('external');
    const history = JSON.stringify((await external.get(`/api/answers/${first.answerId}/history`).expect(200)).body);
    for (const kept of ['6.10', '6.70', '3600']) expect(history).not.toContain(kept);
    expect(JSON.stringify((await lead.get(`/api/answers/${first.answerId}/history`).expect(200)).body)).toContain('6.70');
  });

  it('rules a share of a mark exactly, and only with a reason', async () => {
    const [held] = await lease(one);
    if (!held) throw new Error('Nothing to read.');
    await record(one, held, { text: '9.99' }).expect(200);
    const { rev } = await view(held.answerId);
    await rule(held.answerId, rev, { kind: 'mark', marks: '1/3' }).expect(400);
    await rule(held.answerId, rev, { kind: 'mark', marks: '3.5', reason: 'too many' }).expect(400);
    const ruled = await rule(held.answerId, rev, { kind: 'mark', marks: '1/3', reason: 'benefit of the doubt' }).expect(200);
    expect(ruled.body.score.grains).toBe(400);
  });

  it('puts a replaced ruling in force again when the later one is taken back', async () => {
    const [held] = await lease(one);
    if (!held) throw new Error('Nothing to read.');
    await record(one, held, { text: '9.99' }).expect(200);
    const { rev } = await view(held.answerId);
    const first: AnswerView = (await rule(held.answerId, rev, { kind: 'mark', marks: '1', reason: 'benefit of the doubt' }).expect(200)).body;
    const second: AnswerView = (await rule(held.answerId, first.rev, { kind: 'mark', marks: '0', reason: 'the working shows another' }).expect(200)).body;
    expect(second.score?.grains).toBe(0);
    const back: AnswerView = (await lead.post(`/api/rulings/${second.ruling?.id}/take-back`).expect(200)).body;
    expect(back).toMatchObject({ state: 'ruled', score: { grains: 1200 }, ruling: { reason: 'benefit of the doubt' } });
  });

  it('calls an ion by its charge at the desk', async () => {
    const ion = itemDraft('Mg', '2p', { asked: { symbol: 'Mg', charge: 2, electron: '2p', quantity: 'zeff', convention: 'slater' } });
    const { sittingId: other } = buildPaper(server, { drafts: [ion] });
    const { body } = await one.get('/api/desk/standing').query({ sitting: other }).expect(200);
    expect(body.items[0].label).toBe('Mg²⁺ 2p');
  });

  it('adds up what is marked, names what is missing, and exports it without formulas', async () => {
    for (const item of [0, 1]) {
      for (const held of await lease(one, item)) await record(one, held, { text: item === 0 ? '6.10' : '=3.8' }).expect(200);
    }
    const [last] = answers;
    if (!last) throw new Error('No answer.');
    const { body: totals } = await lead.get(`/api/sittings/${sittingId}/totals`).expect(200);
    expect(totals.rows.map((row: { totalGrains: number }) => row.totalGrains)).toEqual([7200, 7200, 7200]);
    const { body: made } = await lead.post(`/api/sittings/${sittingId}/exports`).send({ kind: 'marks-csv' }).expect(201);
    const file = await lead.get(`/api/exports/${made.id}/file`).expect(200);
    expect(file.text.replace('\uFEFF', '').split('\r\n')[1]).toBe("W4071,expected,6.10,3,'=3.8,3,6,");
    expect(last.candidate).toMatch(/^W407/);
  });

  it('tells a reader no key, band, score, verdict, or which reading of a pair it is', async () => {
    const [held] = await lease(one, 1);
    if (!held) throw new Error('Nothing to read.');
    await record(one, held, { text: '2.85' }).expect(200);
    const answered = await Promise.all([
      one.get('/api/me'),
      one.get('/api/courses'),
      one.get(`/api/courses/${server.courseId}/sittings`),
      one.get(`/api/sittings/${sittingId}`),
      one.get(`/api/sittings/${sittingId}/progress`),
      one.get(`/api/sittings/${sittingId}/candidates`),
      one.get('/api/desk/standing').query({ sitting: sittingId }),
      one.get('/api/desk/recent').query({ sitting: sittingId }),
      one.post('/api/desk/leases').send({ itemId: items[1] }),
    ]);
    const text = answered.map(({ body }) => JSON.stringify(body)).join('\n');
    expect(answered.map(({ status }) => status)).toEqual(answered.map(() => 200));
    // The key of Fe 4s and its roundings: nobody typed them.
    for (const secret of ['3.75', '3.8', '3.7', '15/4']) expect(text).not.toContain(secret);
    const names = new Set([...text.matchAll(/"(\w+)":/g)].map(([, name]) => name));
    for (const name of ['key', 'bands', 'band', 'grains', 'score', 'verdict', 'rule', 'slips', 'canonical', 'ordinal', 'purpose', 'state']) expect(names).not.toContain(name);
  });
});
