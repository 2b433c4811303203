import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Agent } from 'supertest';
import type { ItemDraft } from '../../shared/contracts/items';
import { auditEntry, itemScheme } from '../../db/schema';
import { buildPaper, itemDraft, layoutFor, type BuiltPaper } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

describe('building a paper', () => {
  let server: TestServer;
  let lead: Agent;
  let paper: BuiltPaper;
  beforeAll(async () => {
    server = await startTestServer();
    lead = await server.signInAs('lead');
  });
  beforeEach(() => void (paper = buildPaper(server, { locked: false })));
  afterAll(() => server.close());

  const items = async () => (await lead.get(`/api/sittings/${paper.sittingId}/items`).expect(200)).body.items;

  it('computes the key of an item and proposes its wording', async () => {
    const { body } = await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft('Mg', '2p', { asked: { symbol: 'Mg', charge: 2, electron: '2p', quantity: 'zeff', convention: 'slater' } })).expect(201);
    // By hand from Slater's coefficients (Phys. Rev. 36, 57, 1930): 12 - (7 x 0.35 + 2 x 0.85) = 7.85.
    expect(body).toMatchObject({
      number: 3,
      prompt: 'By Slater’s rules, find Z_eff for a 2p electron of an Mg²⁺ ion, to two decimals.',
      maxGrains: 3600,
      hasAnswerBox: false,
      worked: { key: { value: '157/20', text: '7.85' }, electrons: ['1s', '2s', '2p'], roundings: ['7.8', '7.9'], problems: [] },
    });
  });

  it('stores a draft under the rev that was seen, and refuses an older one with what is there now', async () => {
    const [id] = paper.items;
    const bands = [{ name: 'near', kind: 'absolute' as const, width: '0,1', marks: '2' }];
    const saved = await lead.put(`/api/items/${id}`).set('If-Match', '1').send(itemDraft('Cl', '3p', { bands, marks: '2.5', prompt: 'Find it.' })).expect(200);
    expect(saved.body).toMatchObject({ rev: 2, prompt: 'Find it.', maxGrains: 3000, draft: { marks: '2.5', bands: [{ width: '0.10', marks: '2' }] }, worked: { bands: [{ from: '6.00', to: '6.20' }] } });
    const late = await lead.put(`/api/items/${id}`).set('If-Match', '1').send(itemDraft()).expect(409);
    expect(late.body.error.current).toMatchObject({ rev: 2, prompt: 'Find it.' });
  });

  it('never takes a key from the request', async () => {
    const refused = await lead.post(`/api/sittings/${paper.sittingId}/items`).send({ ...itemDraft(), key: { value: '5', text: '5.00', decimals: 2 } }).expect(400);
    expect(refused.body.error.code).toBe('invalid_request');
  });

  it('names the field that keeps an item from being stored', async () => {
    const { body } = await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft('Fe', '4p', { marks: '1/7' })).expect(400);
    expect(body.error.fields).toMatchObject({ 'asked.electron': 'Iron has no 4p electron in its ground state.', marks: expect.stringContaining('cannot be kept exactly') });
  });

  it('stores bands out of order and says which of them is wrong', async () => {
    const bands = [
      { name: 'wide', kind: 'absolute' as const, width: '0.2', marks: '2' },
      { name: 'narrow', kind: 'absolute' as const, width: '0.1', marks: '1' },
    ];
    const { body } = await lead.put(`/api/items/${paper.items[0]}`).set('If-Match', '1').send(itemDraft('Cl', '3p', { bands })).expect(200);
    expect(body.worked.problems).toEqual([{ path: 'bands.0.marks', message: 'The narrower band must give more marks than the wider one.' }]);
    const refused = await lead.post(`/api/sittings/${paper.sittingId}/lock`).expect(400);
    expect(refused.body.error.message).toMatch(/^Item 1: The narrower band/);
  });

  it('asks for an electron of a typed configuration, and says what is wrong with one', async () => {
    const excited = (configuration: string) => itemDraft('Ne', '3s', { asked: { symbol: 'Ne', charge: 0, electron: '3s', quantity: 'zeff', convention: 'slater', configuration } });
    const { body } = await lead.post(`/api/sittings/${paper.sittingId}/items`).send(excited('1s2 2s2 2p5 3s1')).expect(201);
    // By hand from Slater's coefficients (Phys. Rev. 36, 57, 1930): 10 - (7 x 0.85 + 2 x 1.00) = 2.05.
    expect(body).toMatchObject({
      prompt: 'By Slater’s rules, find Z_eff for a 3s electron of an Ne atom with the configuration 1s2 2s2 2p5 3s1, to two decimals.',
      draft: { asked: { configuration: '1s2 2s2 2p5 3s1' } },
      worked: { key: { text: '2.05' }, electrons: ['1s', '2s', '2p', '3s'] },
    });
    const wrong = async (configuration: string) => (await lead.post(`/api/sittings/${paper.sittingId}/items`).send(excited(configuration)).expect(400)).body.error.fields['asked.configuration'];
    expect(await wrong('1s2 2s2 2p6 3s1')).toBe('This configuration has 11 electrons; Ne has 10.');
    expect(await wrong('1s2 2s2 2q5')).toContain('2q');
    expect(await wrong('')).toBe('Write the configuration, or ask for the ground state.');
  });

  it('works a draft without storing it', async () => {
    const { body } = await lead.post('/api/keys').send({ sittingId: paper.sittingId, draft: itemDraft('Fe', '4p') }).expect(200);
    expect(body).toMatchObject({ key: null, scale: null, electrons: ['1s', '2s', '2p', '3s', '3p', '3d', '4s'], problems: [{ path: 'asked.electron', message: 'Iron has no 4p electron in its ground state.' }] });
    expect(await items()).toHaveLength(2);
  });

  it('removes an item with its boxes and numbers the rest again', async () => {
    await lead.delete(`/api/items/${paper.items[0]}`).set('If-Match', '1').expect(204);
    expect(await items()).toMatchObject([{ id: paper.items[1], number: 1 }]);
    expect((await lead.get(`/api/sittings/${paper.sittingId}/layouts/1/boxes`)).body.boxes).toHaveLength(1);
    await lead.get(`/api/items/${paper.items[0]}`).expect(404);
  });

  it('orders items, and refuses an order of other items', async () => {
    const turned = [...paper.items].reverse();
    const { body } = await lead.put(`/api/sittings/${paper.sittingId}/item-order`).send({ items: turned }).expect(200);
    expect(body.items.map(({ id, number }: { id: string; number: number }) => [id, number])).toEqual([[turned[0], 1], [turned[1], 2]]);
    await lead.put(`/api/sittings/${paper.sittingId}/item-order`).send({ items: [turned[0], turned[0]] }).expect(409);
    await lead.put(`/api/sittings/${paper.sittingId}/item-order`).send({ items: [turned[0]] }).expect(409);
  });

  describe('spot test', () => {
    const test = async (text: string, draft?: ReturnType<typeof itemDraft>) =>
      (await lead.post(`/api/items/${paper.items[0]}/spot-test`).send({ text, ...(draft && { draft }) }).expect(200)).body;

    it('marks a value as an answer would be marked and stores nothing', async () => {
      expect(await test('6.10')).toMatchObject({ outcome: 'marked', grains: 3600, rule: 'key' });
      expect(await test('6.1')).toMatchObject({ grains: 3600, rule: 'rounding', head: 'the key, rounded' });
      expect(await test('6.12')).toMatchObject({ grains: 0, rule: 'nothing', numbers: { distance: '0.02' }, value: 6.12 });
      expect(await test('6.')).toMatchObject({ outcome: 'unfinished', grains: null });
      expect(await test('6.1.0')).toMatchObject({ outcome: 'refused', detail: 'Two points. Keep one: 6.1' });
      expect(server.context.db.select().from(itemScheme).all()).toEqual([]);
    });

    it('uses the draft sent along while the paper is open', async () => {
      const bands = [{ name: 'near', kind: 'absolute' as const, width: '0.1', marks: '2' }];
      expect(await test('6.12', itemDraft('Cl', '3p', { bands }))).toMatchObject({ grains: 2400, rule: 'band' });
    });
  });

  describe('the lock', () => {
    it('freezes paper and layout and makes scripts, pages and answers', async () => {
      const { body } = await lead.post(`/api/sittings/${paper.sittingId}/lock`).expect(200);
      expect(body).toMatchObject({ schemeOrdinal: 1, scripts: 3, answers: 6, lockedAt: expect.any(Number) });
      const { body: list } = await lead.get(`/api/sittings/${paper.sittingId}/candidates`);
      expect(list.candidates).toMatchObject([
        { number: 'W4071', scriptNumber: 1, pagesDue: 1, pagesIn: 0 },
        { number: 'W4072', scriptNumber: 2 },
        { number: 'W4073', scriptNumber: 3 },
      ]);
      const [id] = paper.items;
      await lead.put(`/api/items/${id}`).set('If-Match', '1').send(itemDraft()).expect(409);
      await lead.delete(`/api/items/${id}`).set('If-Match', '1').expect(409);
      await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft()).expect(409);
      await lead.put(`/api/sittings/${paper.sittingId}/item-order`).send({ items: paper.items }).expect(409);
      await lead.put(`/api/sittings/${paper.sittingId}/layouts/1/boxes`).set('If-Match', '1').send(layoutFor(paper.items)).expect(409);
      await lead.post(`/api/sittings/${paper.sittingId}/layouts/1/pages/1/sample`).attach('file', Buffer.from('x'), 'x.jpg').expect(409);
      await lead.post(`/api/sittings/${paper.sittingId}/lock`).expect(409);
      const acts = server.context.db.select().from(auditEntry).all().filter(({ sitting }) => sitting === paper.sittingId);
      expect(acts.filter(({ act }) => act === 'paper-locked')).toHaveLength(1);
    });

    it('gives equal items one scheme row, whatever the order of their fields', async () => {
      const before = server.context.db.select().from(itemScheme).all().length;
      const twin = buildPaper(server, { drafts: [itemDraft('Ar', '3p'), itemDraft('Ar', '3p')] });
      expect(server.context.db.select().from(itemScheme).all()).toHaveLength(before + 1);
      expect((await lead.get(`/api/sittings/${twin.sittingId}/items`)).body.items[0].worked.key.text).toBe('6.75');
    });

    it('refuses a paper without items and an item without its box', async () => {
      const empty = buildPaper(server, { drafts: [], locked: false });
      const none = await lead.post(`/api/sittings/${empty.sittingId}/lock`).expect(400);
      expect(none.body.error.message).toBe('The paper has no item yet.');
      await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft('O', '2p')).expect(201);
      const refused = await lead.post(`/api/sittings/${paper.sittingId}/lock`).expect(400);
      expect(refused.body.error.fields).toEqual({ 'items.3': 'Item 3 has no answer box on a page.' });
    });

    it('gives candidates who are imported later their scripts too', async () => {
      await lead.post(`/api/sittings/${paper.sittingId}/lock`).expect(200);
      const text = 'W4071\nW4099\n';
      const { body: preview } = await lead.post(`/api/sittings/${paper.sittingId}/class-list/preview`).send({ text }).expect(200);
      const { body } = await lead.post(`/api/sittings/${paper.sittingId}/class-list/confirm`).send({ text, hash: preview.hash }).expect(200);
      expect(body).toEqual({ added: 1, changed: 0, unchanged: 1, scripts: 1 });
      const { body: list } = await lead.get(`/api/sittings/${paper.sittingId}/candidates`);
      expect(list.candidates.at(-1)).toMatchObject({ number: 'W4099', scriptNumber: 4, pagesDue: 1 });
    });
  });

  describe('someone else’s', () => {
    it('never shows items to a reader, and lets an external examiner look only', async () => {
      const reader = await server.signInAs('readerOne');
      const external = await server.signInAs('external');
      const outsider = await server.signInAs('outsider');
      const [id] = paper.items;
      await external.get(`/api/sittings/${paper.sittingId}/items`).expect(200);
      await external.get(`/api/items/${id}`).expect(200);
      const writes = (agent: Agent) => [
        agent.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft()),
        agent.put(`/api/items/${id}`).set('If-Match', '1').send(itemDraft()),
        agent.delete(`/api/items/${id}`).set('If-Match', '1'),
        agent.put(`/api/sittings/${paper.sittingId}/item-order`).send({ items: paper.items }),
        agent.post('/api/keys').send({ sittingId: paper.sittingId, draft: itemDraft() }),
        agent.post(`/api/items/${id}/spot-test`).send({ text: '6.10' }),
        agent.post(`/api/sittings/${paper.sittingId}/lock`),
      ];
      for (const request of writes(external)) await request.expect(403);
      const readerTries = [reader.get(`/api/sittings/${paper.sittingId}/items`), reader.get(`/api/items/${id}`), ...writes(reader)];
      for (const request of readerTries) {
        const { text } = await request.expect(403);
        expect(text).not.toMatch(/6\.10|61\/10/);
      }
      for (const request of [outsider.get(`/api/sittings/${paper.sittingId}/items`), outsider.get(`/api/items/${id}`), ...writes(outsider)]) await request.expect(404);
    });
  });

  describe('edge cases', () => {
    it.each([
      [{ marks: '' }, 'marks'],
      [{ marks: '0' }, 'marks'],
      [{ decimals: 9 }, 'decimals'],
      [{ bands: [{ name: 'near', kind: 'absolute' as const, width: '', marks: '1' }] }, 'bands.0.width'],
      [{ bands: [{ name: 'near', kind: 'absolute' as const, width: '0.1', marks: 'one' }] }, 'bands.0.marks'],
      [{ asked: { symbol: 'Xx', charge: 0, electron: '1s', quantity: 'zeff' as const, convention: 'slater' as const } }, 'asked.symbol'],
      [{ asked: { symbol: 'He', charge: 2, electron: '1s', quantity: 'zeff' as const, convention: 'slater' as const } }, 'asked.charge'],
    ])('refuses %j', async (changes, field) => {
      const { body } = await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft('Cl', '3p', changes)).expect(400);
      expect(body.error.fields).toHaveProperty([field]);
    });

    it('does not lock an item whose key needs more decimals than are asked for', async () => {
      const { body } = await lead.put(`/api/items/${paper.items[1]}`).set('If-Match', '1').send(itemDraft('Fe', '4s', { decimals: 1, roundings: { downToDecimals: null, truncation: false } })).expect(200);
      expect(body.worked.problems).toEqual([{ path: 'decimals', message: 'The key is 3.75. Ask for 2 decimals, so that it can be written whole.' }]);
    });

    it('takes a repeated write once', async () => {
      const send = () => lead.post(`/api/sittings/${paper.sittingId}/items`).set('Idempotency-Key', 'add-once').send(itemDraft('O', '2p')).expect(201);
      const [one, other] = [await send(), await send()];
      expect(other.body.id).toBe(one.body.id);
      expect(await items()).toHaveLength(3);
    });
  });

  it('accepts what another convention gives, computed by the server, and a value added by hand with a reason', async () => {
    const made = await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft('Cl', '3p', { alternatives: [{ name: 'screening constants', convention: 'scf', value: '99', marks: '2', reason: '' }] })).expect(201);
    const { id, worked, draft } = made.body as { id: string; worked: { alternatives: string[]; others: { convention: string; text: string }[] }; draft: ItemDraft };
    // E. Clementi and D. L. Raimondi, J. Chem. Phys. 38, 2686 (1963): 3p of Cl 6.1161.
    expect(worked.alternatives).toEqual(['6.1161']);
    // Core count, general chemistry textbooks (from memory): 17 - 10 = 7.
    expect(worked.others.find(({ convention }) => convention === 'core-count')?.text).toBe('7.00');
    expect(draft.alternatives[0]).toMatchObject({ convention: 'scf', value: '' });
    const spot = await lead.post(`/api/items/${id}/spot-test`).send({ text: '6.1161' }).expect(200);
    expect(spot.body).toMatchObject({ rule: 'alternative', grains: 2400 });
    const refused = await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft('Cl', '3p', { alternatives: [{ name: 'mine', convention: null, value: '6.4.0', marks: '1', reason: '' }] })).expect(400);
    expect(Object.keys((refused.body as { error: { fields: object } }).error.fields)).toEqual(['alternatives.0.reason', 'alternatives.0.value']);
  });

  it('names slips with shares that pay, and refuses one that cannot be made or seen here', async () => {
    const made = await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft('Cl', '3p', { slips: [{ id: 'counts-itself', marks: '1' }] })).expect(201);
    const { id, worked, draft } = made.body as { id: string; worked: { slips: { id: string; letter: string; text: string }[] }; draft: ItemDraft };
    expect(draft.slips).toEqual([{ id: 'counts-itself', marks: '1' }]);
    expect(worked.slips[0]).toMatchObject({ id: 'counts-itself', letter: 'a', text: '5.75' });
    const spot = await lead.post(`/api/items/${id}/spot-test`).send({ text: '5.75' }).expect(200);
    expect(spot.body).toMatchObject({ rule: 'slip', grains: 1200, head: 'fits a, counts the electron itself' });
    const fieldsOf = (response: { body: unknown }) => Object.keys((response.body as { error: { fields: object } }).error.fields);
    expect(fieldsOf(await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft('Cl', '3p', { slips: [{ id: 'filling-order', marks: '1' }] })).expect(400))).toEqual(['slips.0.id']);
    expect(fieldsOf(await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft('Cl', '3p', { slips: [{ id: 'counts-itself', marks: 'some' }] })).expect(400))).toEqual(['slips.0.marks']);
  });

  it('says at once what a band would pay, and what one decimal cannot tell apart', async () => {
    const band = { name: 'near', kind: 'relative' as const, width: '5', marks: '2' };
    const { body } = await lead.post('/api/keys').send({ sittingId: paper.sittingId, draft: itemDraft('Cl', '3p', { bands: [band] }) }).expect(200);
    expect(body.guard.map(({ text, marks }: { text: string; marks: string }) => [text, marks])).toContainEqual(['6.40', '2']);
    const iron = await lead.post('/api/keys').send({ sittingId: paper.sittingId, draft: itemDraft('Fe', '4s') }).expect(200);
    expect(iron.body).toMatchObject({ guard: [], untold: [{ text: '3.80', rounded: '3.8', decimals: 1 }] });
  });

  it('asks for what follows from Z_eff to figures, with its unit, and marks it so', async () => {
    const asked = { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'energy-ev' as const, convention: 'slater' as const };
    const made = await lead.post(`/api/sittings/${paper.sittingId}/items`).send(itemDraft('Cl', '3p', { asked, roundings: { downToDecimals: null, downToFigures: 3, truncation: false } })).expect(201);
    const { id, worked, draft, prompt } = made.body as { id: string; worked: { key: { text: string; figures: number }; unit: string; roundings: string[]; problems: unknown[] }; draft: ItemDraft; prompt: string };
    // E = -13.605693 eV x (6.10 / 3)^2 = -56.2529 eV (Slater 1930, n* = 3; worked by hand).
    expect(worked).toMatchObject({ key: { text: '-56.25', figures: 4 }, unit: 'eV', roundings: ['-56.3'], problems: [] });
    expect(prompt).toContain('to four significant figures');
    expect(draft).toMatchObject({ asked, figures: 4, roundings: { downToFigures: 3 } });
    const spot = async (text: string) => ((await lead.post(`/api/items/${id}/spot-test`).send({ text }).expect(200)).body as { grains: number }).grains;
    expect(await Promise.all(['-56.25', '-56.3 eV', '-56', '56.25'].map(spot))).toEqual([3600, 3600, 0, 0]);
    const chi = await lead.post('/api/keys').send({ sittingId: paper.sittingId, draft: itemDraft('Cl', '3p', { asked: { ...asked, quantity: 'electronegativity', radiusAngstrom: '0.99', countsItself: false } }) }).expect(200);
    // 0.359 x 6.10 / 0.99^2 + 0.744 = 2.978 (A. L. Allred and E. G. Rochow, J. Inorg. Nucl. Chem. 5, 264, 1958; worked by hand).
    expect(chi.body).toMatchObject({ key: { text: '2.978' } });
    const lacking = await lead.post('/api/keys').send({ sittingId: paper.sittingId, draft: itemDraft('Cl', '3p', { asked: { ...asked, quantity: 'electronegativity' } }) }).expect(200);
    expect(lacking.body.problems).toHaveLength(1);
  });
});
