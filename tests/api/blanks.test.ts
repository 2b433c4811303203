import { eq } from 'drizzle-orm';
import type { Agent } from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import * as tables from '../../db/schema';
import { withdrawLeases } from '../../db/queries/desk';
import { leaseMs } from '../../server/services/desk';
import type { DeskLease } from '../../shared/contracts/desk';
import type { AnswerView } from '../../shared/contracts/ledger';
import { giveEvidence, type Answer } from '../support/evidence';
import { buildPaper } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

type Ink = 'blank' | 'unsure' | 'written' | null;

describe('boxes that look empty', () => {
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
    ({ sittingId, items } = buildPaper(server, { candidates: ['W4071', 'W4072', 'W4073', 'W4074'] }));
    answers = giveEvidence(server, sittingId);
    for (const candidate of ['W4071', 'W4072', 'W4073']) ink(candidate, 'blank');
    ink('W4074', 'written');
  });

  const answerOf = (candidate: string, item = 0): string => answers.find((answer) => answer.candidate === candidate && answer.itemId === items[item])?.id ?? '';
  const ink = (candidate: string, judged: Ink, change: { evidence?: 'in' | 'doubtful' } = {}): void =>
    void server.context.db.update(tables.crop).set({ ink: judged, ...change }).where(eq(tables.crop.answer, answerOf(candidate))).run();
  const twoPeople = (): void => void server.context.db.update(tables.sitting).set({ secondPolicy: 'all' }).where(eq(tables.sitting.id, sittingId)).run();
  const ask = (agent: Agent, query: Record<string, string> = {}) => agent.get(`/api/sittings/${sittingId}/blank-suggestions`).query(query);
  const sheet = async (agent: Agent, query: Record<string, string> = {}): Promise<DeskLease[]> => (await ask(agent, query).expect(200)).body.suggestions;
  const rowOf = ({ answerId, id }: DeskLease) => ({ readingId: uuidv7(), answerId, leaseId: id });
  const send = (agent: Agent, readings: readonly object[], giveBack: readonly string[] = []) => agent.post(`/api/sittings/${sittingId}/blank-readings`).send({ readings, giveBack, openedAt: 1 });
  const outcomes = async (agent: Agent, readings: readonly object[]): Promise<string[]> => (await send(agent, readings).expect(200)).body.rows.map(({ outcome }: { outcome: string }) => outcome);
  const view = async (answerId: string): Promise<AnswerView> => (await lead.get(`/api/answers/${answerId}`).expect(200)).body;
  const numbers = (held: readonly DeskLease[]): string[] => held.map(({ candidateNumber }) => candidateNumber).sort();

  it('are suggested by candidate, and a written box never is', async () => {
    const { body } = await ask(one).expect(200);
    expect(numbers(body.suggestions)).toEqual(['W4071', 'W4072', 'W4073']);
    expect(body).toMatchObject({ itemId: items[0], cursor: null, items: [{ id: items[0], number: 1, count: 3 }] });
    expect(body.suggestions[0].crops).toEqual([{ box: expect.any(String), version: expect.any(String), use: 'answer', widthPx: 600, heightPx: 180, isDoubtful: false }]);
  });

  it.each([
    ['unsure, as on every page of black and white only', 'unsure', 'in'],
    ['never judged', null, 'in'],
    ['of a frame not seen whole', 'blank', 'doubtful'],
  ] as const)('are not suggested where the ink is %s', async (_why, judged, evidence) => {
    ink('W4072', judged, { evidence });
    expect(numbers(await sheet(one))).toEqual(['W4071', 'W4073']);
  });

  it('become readings of the person who confirms them, and score as any blank', async () => {
    const held = await sheet(one);
    expect((await view(answerOf('W4071'))).state).toBe('not-read');
    expect(await outcomes(one, held.map(rowOf))).toEqual(['recorded', 'recorded', 'recorded']);
    expect(await view(answerOf('W4071'))).toMatchObject({ state: 'blank', readings: [{ given: { text: null, code: 'blank' } }], score: { grains: 0 } });
    const acts = server.context.db.select().from(tables.auditEntry).where(eq(tables.auditEntry.sitting, sittingId)).all();
    expect(acts.filter(({ act }) => act === 'reading-recorded')).toHaveLength(3);
    expect(await sheet(one)).toEqual([]);
  });

  it('need two people where every answer does: each sees them once, none sees the other', async () => {
    twoPeople();
    const held = await sheet(one);
    await outcomes(one, held.map(rowOf));
    expect(await sheet(one)).toEqual([]);
    const second = await sheet(two);
    expect(numbers(second)).toEqual(['W4071', 'W4072', 'W4073']);
    expect(Object.keys(second[0] ?? {}).sort()).toEqual(Object.keys(held[0] ?? {}).sort());
    await outcomes(two, second.map(rowOf));
    expect((await view(answerOf('W4072'))).readings).toHaveLength(2);
  });

  it('are held for one reader until the lease runs out, and the sheet renews its own', async () => {
    const mine = await sheet(one, { limit: '2' });
    expect(numbers(await sheet(two))).toHaveLength(1);
    expect((await sheet(one, { limit: '2' })).map(({ id }) => id)).toEqual(mine.map(({ id }) => id));
    expect((await two.post('/api/desk/leases').send({ itemId: items[0], count: 20 }).expect(200)).body.leases).toHaveLength(2);
    server.clock.advance(leaseMs + 1);
    expect(await sheet(two)).toHaveLength(3);
    expect(await outcomes(two, mine.map(rowOf))).toEqual(['gone', 'gone']);
  });

  it('go on after the last of the sheet before', async () => {
    const first = (await ask(one, { limit: '2' }).expect(200)).body;
    const next = (await ask(one, { limit: '2', cursor: first.cursor }).expect(200)).body;
    expect(numbers([...first.suggestions, ...next.suggestions])).toEqual(['W4071', 'W4072', 'W4073']);
    expect(next.cursor).toBeNull();
  });

  it('are recorded once however often they are sent, and each row says what became of it', async () => {
    const [first, second, third] = await sheet(one);
    if (!first || !second || !third) throw new Error('Three boxes were expected.');
    const rows = [rowOf(first), rowOf(second)];
    expect(await outcomes(one, rows)).toEqual(['recorded', 'recorded']);
    expect(await outcomes(one, rows)).toEqual(['recorded', 'recorded']);
    withdrawLeases(server.context.db, third.answerId, server.clock.now());
    expect(await outcomes(one, [rowOf(first), rowOf(third)])).toEqual(['already-read', 'gone']);
    expect((await view(first.answerId)).readings).toHaveLength(1);
    await send(one, [rows[0] ?? {}, rows[0] ?? {}]).expect(400);
  });

  it('never take a box with ink, held at the desk as it may be', async () => {
    const { leases } = (await one.post('/api/desk/leases').send({ itemId: items[0], count: 20 }).expect(200)).body as { leases: DeskLease[] };
    const written = leases.find(({ candidateNumber }) => candidateNumber === 'W4074');
    expect(await outcomes(one, written ? [rowOf(written)] : [])).toEqual(['gone']);
  });

  it('are taken back like any reading', async () => {
    const [first] = await sheet(one);
    if (!first) throw new Error('A box was expected.');
    const row = rowOf(first);
    await outcomes(one, [row]);
    const { lease } = (await one.post(`/api/readings/${row.readingId}/take-back`).expect(200)).body;
    expect(lease).toMatchObject({ answerId: first.answerId });
    expect((await view(first.answerId)).state).toBe('not-read');
    expect(numbers(await sheet(one))).toContain(first.candidateNumber);
  });

  it('found written are given back, and any reader may have them', async () => {
    const held = await sheet(one);
    await send(one, [], held.map(({ id }) => id)).expect(200);
    expect(await sheet(two)).toHaveLength(3);
    await send(one, [], (await sheet(two)).map(({ id }) => id)).expect(200);
    expect(await sheet(one)).toEqual([]);
  });

  it('wait for a reader as one line with their number', async () => {
    const lines = (await one.get('/api/waiting').expect(200)).body.lines as { kind: string; sittingId: string; count: number }[];
    expect(lines.find((line) => line.kind === 'blanks' && line.sittingId === sittingId)?.count).toBe(3);
  });
});

describe('a box whose frame was not seen whole', () => {
  it('says so at the desk and in the sheet of the lead', async () => {
    const server = await startTestServer();
    const { sittingId, items } = buildPaper(server);
    const [first] = giveEvidence(server, sittingId);
    server.context.db.update(tables.crop).set({ evidence: 'doubtful', sidesConfirmed: 3 }).where(eq(tables.crop.answer, first?.id ?? '')).run();
    const reader = await server.signInAs('readerOne');
    const { leases } = (await reader.post('/api/desk/leases').send({ itemId: items.find((id) => id === first?.itemId), count: 20 }).expect(200)).body as { leases: DeskLease[] };
    expect(leases.filter(({ crops }) => crops.some(({ isDoubtful }) => isDoubtful)).map(({ answerId }) => answerId)).toEqual([first?.id]);
    const lead = await server.signInAs('lead');
    const { body } = await lead.get(`/api/answers/${first?.id ?? ''}`).expect(200);
    expect((body as AnswerView).crops).toMatchObject([{ isDoubtful: true }]);
    await server.close();
  });
});
