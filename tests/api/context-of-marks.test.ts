import type { Agent } from 'supertest';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { DeskItem, DeskLease } from '../../shared/contracts/desk';
import type { AnswerView, getTotals, LedgerRow } from '../../shared/contracts/ledger';
import type { ResponseOf } from '../../shared/contracts/route';
import { GRAINS_PER_MARK } from '../../shared/marking/grains';
import { allRight, chainPaper, oneErrorCarriedOn } from '../support/chain-paper';
import { giveEvidence } from '../support/evidence';
import { buildPaper, itemDraft, type WantedItem } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

interface Sent {
  readonly text?: string;
  readonly code?: string;
  readonly note?: string;
  readonly method?: readonly string[];
}

const candidates = ['W4071', 'W4072', 'W4073', 'W4074', 'W4075', 'W4076'];

describe('marks that rest on more than their own answer', () => {
  let server: TestServer;
  let lead: Agent;
  let one: Agent;
  let two: Agent;
  let sittingId: string;
  let items: readonly string[];
  /** Answers by candidate, in paper order. */
  let answers: Map<string, string[]>;

  beforeAll(async () => {
    server = await startTestServer();
    [lead, one, two] = await Promise.all([server.signInAs('lead'), server.signInAs('readerOne'), server.signInAs('readerTwo')]);
  });
  afterAll(() => server.close());

  function build(drafts: readonly WantedItem[]): void {
    ({ sittingId, items } = buildPaper(server, { drafts, candidates }));
    const found = giveEvidence(server, sittingId);
    answers = new Map(candidates.map((candidate) => [candidate, items.map((item) => found.find((answer) => answer.candidate === candidate && answer.itemId === item)?.id ?? '')]));
  }

  const answerOf = (candidate: string, item: number): string => answers.get(candidate)?.[item - 1] ?? '';
  const leaseOf = async (agent: Agent, answerId: string, item: number): Promise<DeskLease> => {
    const { body } = await agent.post('/api/desk/leases').send({ itemId: items[item - 1], count: 20 }).expect(200);
    const held = (body.leases as DeskLease[]).find((lease) => lease.answerId === answerId);
    if (!held) throw new Error('The answer was not given out.');
    return held;
  };
  async function read(agent: Agent, candidate: string, item: number, sent: Sent, status = 200): Promise<string> {
    const answerId = answerOf(candidate, item);
    const { id: leaseId } = await leaseOf(agent, answerId, item);
    const id = uuidv7();
    await agent.put(`/api/readings/${id}`).send({ answerId, leaseId, openedAt: 1, ...sent }).expect(status);
    return id;
  }
  /** A reader reads the items in the order given; what is undefined stays unread. */
  async function readAll(candidate: string, texts: readonly (string | undefined)[], order = texts.map((_, index) => index + 1)): Promise<void> {
    for (const item of order) {
      const text = texts[item - 1];
      if (text !== undefined) await read(one, candidate, item, { text });
    }
  }
  const view = async (candidate: string, item: number): Promise<AnswerView> => (await lead.get(`/api/answers/${answerOf(candidate, item)}`).expect(200)).body;
  const rowOf = async (candidate: string, item: number): Promise<LedgerRow | undefined> =>
    ((await lead.get(`/api/sittings/${sittingId}/answers`).query({ find: candidate }).expect(200)).body.rows as LedgerRow[]).find((row) => row.itemNumber === item);
  const totalOf = async (candidate: string) =>
    ((await lead.get(`/api/sittings/${sittingId}/totals`).expect(200)).body as ResponseOf<typeof getTotals>).rows.find((row) => row.candidateNumber === candidate);
  const marksOf = async (candidate: string): Promise<(number | null)[]> => (await totalOf(candidate))?.marks.map(({ grains }) => (grains === null ? null : grains / GRAINS_PER_MARK)) ?? [];
  const type = (candidate: string, item: number, sent: Sent) => lead.put(`/api/answers/${answerOf(candidate, item)}/third-reading/${uuidv7()}`).send({ openedAt: 1, ...sent });
  const rule = (answer: AnswerView, body: object) => lead.post(`/api/answers/${answer.answerId}/rulings`).set('If-Match', String(answer.rev)).send(body);

  describe('a chain of three items', () => {
    beforeEach(() => build(chainPaper));

    it('gives all marks to a paper that is right, and full value to what follows from one error', async () => {
      await readAll('W4071', allRight);
      await readAll('W4072', oneErrorCarriedOn);
      expect(await marksOf('W4071')).toEqual([2, 2, 3, 2, 2]);
      // One penalty: sigma alone. What follows from it has all that its value gives.
      expect(await marksOf('W4072')).toEqual([0, 2, 3, 2, 2]);
      expect((await view('W4072', 2)).score?.why.head).toBe('follows from own 11.25');
      expect((await view('W4072', 3)).score?.why.head).toBe('follows from own 5.75');
      // Someone who makes another error on the way pays for that one too, and only there.
      await readAll('W4073', ['11.25', '6.75', '-68.88 eV']);
      // -13.605693 x (6.75 / 3)^2 = -68.88 eV, by hand.
      expect((await marksOf('W4073')).slice(0, 3)).toEqual([0, 0, 3]);
    });

    it('lets a mark wait while its source is unread, and the total with it', async () => {
      await readAll('W4071', [undefined, ...oneErrorCarriedOn.slice(1)]);
      expect(await marksOf('W4071')).toEqual([null, null, 3, 2, 2]);
      expect(await totalOf('W4071')).toMatchObject({ totalGrains: null, missing: [1, 2] });
      expect(await view('W4071', 2)).toMatchObject({ waitsFor: 1, score: null, follows: [{ itemNumber: 1, answerId: answerOf('W4071', 1), canonical: null }], readings: [{ grains: null }] });
      expect(await rowOf('W4071', 2)).toMatchObject({ why: 'waits for item 1', waitsFor: 1, grains: null });
      await read(one, 'W4071', 1, { text: '11.25' });
      expect(await marksOf('W4071')).toEqual([0, 2, 3, 2, 2]);
      expect(await view('W4071', 2)).toMatchObject({ waitsFor: null, follows: [{ canonical: '11.25', label: 'Cl 3p' }] });
    });

    it('does not wait with a mark that cannot rise, nor carry anything on from a blank', async () => {
      await readAll('W4071', [undefined, '6.10']);
      expect((await marksOf('W4071')).slice(0, 2)).toEqual([null, 2]);
      await read(one, 'W4072', 1, { code: 'blank' });
      await readAll('W4072', [undefined, '5.75']);
      expect((await marksOf('W4072')).slice(0, 2)).toEqual([0, 0]);
    });

    it('holds what follows while its source is held, and a ruling on the source settles both in one act', async () => {
      await read(one, 'W4071', 1, { code: 'ask-the-lead', note: '11.25 or 17.25' });
      await readAll('W4071', [undefined, ...oneErrorCarriedOn.slice(1)]);
      expect(await marksOf('W4071')).toEqual([null, null, 3, 2, 2]);
      const before = (await view('W4071', 2)).rev;
      const typed: AnswerView = (await type('W4071', 1, { text: '11.25' }).expect(200)).body;
      const ruled: AnswerView = (await rule(typed, { kind: 'value', text: '11.25', reason: 'The page shows it.' }).expect(200)).body;
      expect(await marksOf('W4071')).toEqual([0, 2, 3, 2, 2]);
      expect((await view('W4071', 2)).rev).toBeGreaterThan(before);
      await lead.post(`/api/rulings/${ruled.ruling?.id}/take-back`).expect(200);
      expect(await marksOf('W4071')).toEqual([null, null, 3, 2, 2]);
      expect(await totalOf('W4071')).toMatchObject({ totalGrains: null, missing: [1, 2] });
    });

    it('returns every mark, and the very scores, when a ruling on a source that stood is taken back', async () => {
      const scores = (): unknown[] => answers.get('W4071')?.map((id) => server.context.db.$client.prepare('select score from answer where id = ?').pluck().get(id)) ?? [];
      await readAll('W4071', oneErrorCarriedOn);
      const before = { marks: await marksOf('W4071'), total: (await totalOf('W4071'))?.totalGrains, scores: scores() };
      const ruled: AnswerView = (await rule(await view('W4071', 1), { kind: 'value', text: '10.90', reason: 'The digits were misread.' }).expect(200)).body;
      // The key is met, so 5.75 no longer follows from an own value.
      expect(await marksOf('W4071')).toEqual([2, 0, 3, 2, 2]);
      await lead.post(`/api/rulings/${ruled.ruling?.id}/take-back`).expect(200);
      expect({ marks: await marksOf('W4071'), total: (await totalOf('W4071'))?.totalGrains, scores: scores() }).toEqual(before);
    });

    it('carries nothing on from a mark that was ruled by hand over a code', async () => {
      await read(one, 'W4071', 1, { code: 'two-answers' });
      await readAll('W4071', [undefined, '5.75']);
      const typed: AnswerView = (await type('W4071', 1, { code: 'two-answers' }).expect(200)).body;
      await rule(typed, { kind: 'mark', marks: '1', reason: 'One of them is right.' }).expect(200);
      expect((await marksOf('W4071')).slice(0, 2)).toEqual([1, 0]);
      expect((await view('W4071', 2)).follows).toMatchObject([{ itemNumber: 1, canonical: '@two-answers' }]);
    });
  });

  describe('a unit that is left out', () => {
    beforeEach(() => build(chainPaper));

    it('costs once, at the first item in paper order, in whatever order the readings come', async () => {
      const without = ['10.90', '6.10', '-56.25', '-13.98', '193.2'];
      const orders = [[3, 4, 5], [3, 5, 4], [4, 3, 5], [4, 5, 3], [5, 3, 4], [5, 4, 3]];
      for (const [index, order] of orders.entries()) await readAll(candidates[index] ?? '', without, [...order, 2, 1]);
      for (const candidate of candidates) expect(await marksOf(candidate), candidate).toEqual([2, 2, 2.5, 2, 2]);
      expect((await view('W4076', 3)).score?.why.head).toBe('the key, rounded, no unit');
      expect((await view('W4076', 4)).score?.why.detail).toContain('paid for earlier on this paper');
    });

    it('moves to the next item when the first is taken back, and returns', async () => {
      const first = await read(one, 'W4071', 3, { text: '-56.25' });
      await readAll('W4071', ['10.90', '6.10', undefined, '-13.98', '193.2']);
      expect(await marksOf('W4071')).toEqual([2, 2, 2.5, 2, 2]);
      await one.post(`/api/readings/${first}/take-back`).expect(200);
      expect(await marksOf('W4071')).toEqual([2, 2, null, 1.5, 2]);
      await read(one, 'W4071', 3, { text: '-56.25 eV' });
      expect(await marksOf('W4071')).toEqual([2, 2, 3, 1.5, 2]);
    });
  });

  describe('method marks', () => {
    beforeEach(() => build(chainPaper));
    const readTwice = async (): Promise<void> => {
      const { body } = await lead.get(`/api/sittings/${sittingId}`).expect(200);
      await lead.patch(`/api/sittings/${sittingId}`).set('If-Match', String(body.rev)).send({ secondPolicy: 'all' }).expect(200);
    };

    it('are kept with the reading and added to the value, to a blank as well', async () => {
      await read(one, 'W4071', 2, { text: '6.10', method: ['groups'] });
      await read(one, 'W4072', 2, { code: 'blank', method: ['groups'] });
      await read(one, 'W4073', 2, { text: '6.10' });
      expect([(await marksOf('W4071'))[1], (await marksOf('W4072'))[1], (await marksOf('W4073'))[1]]).toEqual([3, 1, 2]);
      expect(await view('W4071', 2)).toMatchObject({ readings: [{ method: ['groups'] }], score: { why: { head: 'the key, method' } } });
      const { body } = await one.get('/api/desk/recent').query({ sitting: sittingId, item: items[1] }).expect(200);
      expect(body.readings.map(({ candidateNumber, method }: { candidateNumber: string; method: string[] }) => [candidateNumber, method])).toEqual([['W4073', []], ['W4072', ['groups']], ['W4071', ['groups']]]);
    });

    it('are refused where the item has no such one, and a repeat with other ones is another reading', async () => {
      await read(one, 'W4071', 2, { text: '6.10', method: ['sum'] }, 400);
      await read(one, 'W4071', 1, { text: '10.90', method: ['groups'] }, 400);
      const answerId = answerOf('W4071', 2);
      const { id: leaseId } = await leaseOf(one, answerId, 2);
      const id = uuidv7();
      const put = (method: readonly string[]) => one.put(`/api/readings/${id}`).send({ answerId, leaseId, openedAt: 1, text: '6.10', method });
      await put(['groups']).expect(200);
      await put(['groups', 'groups']).expect(200);
      await put([]).expect(409);
    });

    it('make a pair discordant though the value agrees, and a ruling carries those of the third reading', async () => {
      await readTwice();
      await read(one, 'W4071', 1, { text: '10.90' });
      await read(two, 'W4071', 1, { text: '10.90' });
      await read(one, 'W4071', 2, { text: '6.10', method: ['groups'] });
      await read(two, 'W4071', 2, { text: '6,10', method: [] });
      expect(await rowOf('W4071', 2)).toMatchObject({ state: 'discordant', isCovered: true, readings: [null, null], why: '' });
      expect(await view('W4071', 2)).toMatchObject({ isCovered: true, gap: null, readings: [{ given: null, method: [] }, { given: null, method: [] }] });
      const typed: AnswerView = (await type('W4071', 2, { text: '6.10', method: ['groups'] }).expect(200)).body;
      expect(typed).toMatchObject({ gap: null, mine: { method: ['groups'], grains: 3600 }, readings: [{ isAsMine: true, method: ['groups'], grains: 3600 }, { isAsMine: false, method: [], grains: 2400 }] });
      expect(await rowOf('W4071', 2)).toMatchObject({ isCovered: false, why: 'only the method marks differ' });
      // It is one of the two, ticks included: no reason is asked. Without the tick it would be the other.
      const ruled: AnswerView = (await rule(typed, { kind: 'value', text: '6.10', method: ['groups'] }).expect(200)).body;
      expect(ruled).toMatchObject({ state: 'ruled', ruling: { method: ['groups'] }, score: { grains: 3600 } });
      const back: AnswerView = (await lead.post(`/api/rulings/${ruled.ruling?.id}/take-back`).expect(200)).body;
      expect(back).toMatchObject({ state: 'discordant', score: null, ruling: null });
    });

    it('agree where both strike the same', async () => {
      await readTwice();
      for (const reader of [one, two]) await read(reader, 'W4071', 2, { text: '6.10', method: ['groups'] });
      expect(await view('W4071', 2)).toMatchObject({ state: 'concordant', score: { grains: 3600 } });
    });

    it('stay without their worth in all that a reader is told', async () => {
      await read(one, 'W4071', 2, { text: '6.10', method: ['groups'] });
      const answered = await Promise.all([
        one.get('/api/desk/standing').query({ sitting: sittingId }),
        one.get('/api/desk/recent').query({ sitting: sittingId }),
        one.post('/api/desk/leases').send({ itemId: items[1] }),
        one.get(`/api/sittings/${sittingId}`),
        one.get(`/api/sittings/${sittingId}/progress`),
      ]);
      expect(answered.map(({ status }) => status)).toEqual(answered.map(() => 200));
      const told = (answered[0]?.body.items as DeskItem[]).map(({ methodMarks }) => methodMarks);
      expect(told).toEqual([[], [{ id: 'groups', text: 'Writes the groups as Slater does' }], [], [], []]);
      const names = new Set([...answered.map(({ body }) => JSON.stringify(body)).join('\n').matchAll(/"(\w+)":/g)].map(([, name]) => name));
      for (const name of ['grains', 'marks', 'worth', 'followThrough', 'follows', 'waitsFor', 'unitRule', 'unitCost', 'score', 'why']) expect(names).not.toContain(name);
    });
  });

  describe('printed numbers', () => {
    const options = [{ symbol: 'Li', charge: 0, electron: '2s' }, { symbol: 'F', charge: 0, electron: '2p' }, { symbol: 'C', charge: 0, electron: '2p' }];
    beforeEach(() =>
      build([itemDraft('', '', { kind: 'order', printed: { question: 'increasing', options, partMarks: [] }, crossedOut: 'last', twoAnswers: 'last' }), itemDraft()]),
    );

    it('are read in their order and lie on no scale', async () => {
      // Slater, Phys. Rev. 36, 57 (1930), by hand: Li 2s 1.30, F 2p 5.20, C 2p 3.25; increasing is 1 3 2.
      await read(one, 'W4071', 1, { text: '1,32' });
      expect(await view('W4071', 1)).toMatchObject({ kind: 'order', readings: [{ given: { text: '1,32' } }], score: { grains: 3600 }, scheme: { scale: null } });
      expect(await rowOf('W4071', 1)).toMatchObject({ key: null, value: null, grains: 3600 });
      await read(one, 'W4072', 1, { text: '1 3 2 kg' }, 400);
    });

    it('tell a reader of which item the last answer is typed, and nothing else of the scheme', async () => {
      const { body } = await one.get('/api/desk/standing').query({ sitting: sittingId }).expect(200);
      expect((body.items as DeskItem[]).map(({ kind, typesLast }) => [kind, typesLast])).toEqual([
        ['order', { twoAnswers: true, crossedOut: true }],
        ['numeric', { twoAnswers: false, crossedOut: false }],
      ]);
    });
  });
});
