import { afterAll, beforeAll, expect, it } from 'vitest';
import type { BankItem } from '../../shared/contracts/item-bank';
import { buildPaper, itemDraft } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

it('offers items of other sittings of the course, each content once, to be made anew with their keys computed', async () => {
  const first = buildPaper(server);
  buildPaper(server, { drafts: [itemDraft(), itemDraft('O', '2p')], locked: false });
  const here = buildPaper(server, { drafts: [], locked: false });
  const lead = await server.signInAs('lead');
  const { body } = await lead.get(`/api/sittings/${here.sittingId}/item-bank`).expect(200);
  const { items } = body as { items: BankItem[] };
  expect(items.map(({ label, key, usedIn }) => [label, key, usedIn.length]).sort()).toEqual([['Cl 3p', '6.10', 2], ['Fe 4s', '3.75', 1], ['O 2p', '4.55', 1]]);
  const chosen = items.find(({ label }) => label === 'Cl 3p');
  const made = await lead.post(`/api/sittings/${here.sittingId}/items`).send(chosen?.draft).expect(201);
  expect(made.body).toMatchObject({ number: 1, worked: { key: { text: '6.10' } } });
  const fromFirst = await lead.get(`/api/sittings/${first.sittingId}/item-bank`).expect(200);
  expect((fromFirst.body as { items: BankItem[] }).items.some(({ label }) => label === 'O 2p')).toBe(true);
});

it('is for leads only', async () => {
  const { sittingId } = buildPaper(server, { locked: false });
  await (await server.signInAs('external')).get(`/api/sittings/${sittingId}/item-bank`).expect(403);
  await (await server.signInAs('outsider')).get(`/api/sittings/${sittingId}/item-bank`).expect(404);
});
