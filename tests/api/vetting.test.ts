import type { Agent } from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { VettingItem } from '../../shared/contracts/vetting';
import { buildPaper, itemDraft, type BuiltPaper } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

describe('vetting', () => {
  let server: TestServer;
  let paper: BuiltPaper;
  let external: Agent;
  let lead: Agent;
  beforeAll(async () => {
    server = await startTestServer();
    paper = buildPaper(server, { locked: false });
    external = await server.signInAs('external');
    lead = await server.signInAs('lead');
  });
  afterAll(() => server.close());

  const itemsFor = async (agent: Agent) => ((await agent.get(`/api/sittings/${paper.sittingId}/vetting`).expect(200)).body as { items: VettingItem[] }).items;
  const write = (agent: Agent, text: string, rev = '1') => agent.put(`/api/items/${paper.items[0]}/vetting-check`).set('If-Match', rev).send({ text });
  const vet = (agent: Agent, outcome: string, comment: string | null = null, rev = '1') => agent.post(`/api/items/${paper.items[0]}/vetting`).set('If-Match', rev).send({ outcome, comment });
  const codeOf = (response: { body: unknown }) => (response.body as { error: { code: string } }).error.code;

  it('covers the key from who has not worked it, and keeps the maker from vetting', async () => {
    const [first] = await itemsFor(external);
    expect(first).toMatchObject({ number: 1, label: 'Cl 3p', key: null, derivation: null, decides: [], cannotVet: null, mine: null });
    expect(JSON.stringify(await itemsFor(external))).not.toContain('6.10');
    expect((await itemsFor(lead))[0]).toMatchObject({ key: '6.10', cannotVet: 'You made or changed this item. Somebody else has to vet it.' });
    expect(codeOf(await write(lead, '6.10'))).toBe('not_allowed');
    expect(codeOf(await vet(external, 'signed'))).toBe('conflict');
  });

  it('keeps what was worked as it was typed, and uncovers the key then', async () => {
    expect(codeOf(await write(external, '6.1.0'))).toBe('invalid_request');
    const { body } = await write(external, '6,10').expect(200);
    // Slater's rules (J. C. Slater, Phys. Rev. 36, 57, 1930) for Cl 3p: 17 - (6 x 0.35 + 8 x 0.85 + 2 x 1.00) = 6.10.
    expect(body).toMatchObject({ key: '6.10', mine: { text: '6,10', agrees: true } });
    expect((body as VettingItem).decides.map(({ name, words }) => [name, words])).toContainEqual(['Roundings', '6.1, in full']);
  });

  it('asks for words when it is sent back, and signs with the name of who signs', async () => {
    expect(codeOf(await vet(external, 'sent-back'))).toBe('invalid_request');
    await vet(external, 'sent-back', 'Ask for two decimals only.').expect(200);
    const { body } = await vet(external, 'signed').expect(200);
    expect((body as VettingItem).vettings.map(({ outcome, isOwn }) => [outcome, isOwn])).toEqual([['signed', true], ['sent-back', true]]);
    expect((await itemsFor(lead))[0]?.vettings[0]).toMatchObject({ outcome: 'signed', by: 'Daniel Ashgrove', isOwn: false });
  });

  it('a changed item is open again; changed back, its signature stands again', async () => {
    await lead.put(`/api/items/${paper.items[0]}`).set('If-Match', '1').send(itemDraft('Cl', '3p', { marks: '2' })).expect(200);
    expect((await itemsFor(external))[0]).toMatchObject({ vettings: [], mine: null, key: null });
    expect(codeOf(await vet(external, 'signed'))).toBe('conflict');
    await lead.put(`/api/items/${paper.items[0]}`).set('If-Match', '2').send(itemDraft()).expect(200);
    expect((await itemsFor(external))[0]).toMatchObject({ mine: { text: '6,10' }, vettings: [{ outcome: 'signed' }, { outcome: 'sent-back' }] });
  });

  it('says what the rules cannot see or would pay besides, and shows both electrons of a difference', async () => {
    const band = { name: 'near', kind: 'relative', width: '5', marks: '1' } as const;
    const difference = itemDraft('Cl', '3p', { asked: { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'difference', convention: 'slater', other: { symbol: 'S', charge: 0, electron: '3p' } } });
    const other = buildPaper(server, { drafts: [itemDraft('Fe', '4s'), itemDraft('Be', '2s'), itemDraft('Cl', '3p', { bands: [band] }), difference], locked: false });
    const { items } = (await lead.get(`/api/sittings/${other.sittingId}/vetting`).expect(200)).body as { items: VettingItem[] };
    const said = (index: number, name: string) => items[index]?.decides.find((line) => line.name === name)?.words;
    // By hand, from the coefficients of J. C. Slater, Phys. Rev. 36, 57 (1930): Fe 4s 3.75, with 0.30 in every group 3.80; Be 2s 1.95 with all inner electrons at 0.85 as well; Cl 3p 6.10 and 6.40.
    expect(said(0, 'Not told apart')).toContain('3.8 cannot be told from 0.30 in every group, 3.80');
    expect(said(1, 'Silent slips')).toMatch(/^All inner electrons at 0\.85.* 1\.95 too; this item cannot see/);
    expect(said(2, 'Tolerance guard')).toContain('6.40, 0.30 above the key, would get 1 mark');
    expect([items[3]?.key, items[3]?.otherDerivation]).toMatchObject(['0.65', { zeff: { text: '5.45' } }]);
    const covered = (await external.get(`/api/sittings/${other.sittingId}/vetting`).expect(200)).body as { items: VettingItem[] };
    expect(covered.items.map(({ otherDerivation, decides }) => [otherDerivation, decides])).toEqual(items.map(() => [null, []]));
  });

  it('takes a value with the unit of the item', async () => {
    const energy = itemDraft('Cl', '3p', { asked: { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'energy-ev', convention: 'slater' } });
    const other = buildPaper(server, { drafts: [energy], locked: false });
    const [item] = ((await external.get(`/api/sittings/${other.sittingId}/vetting`).expect(200)).body as { items: VettingItem[] }).items;
    expect(item).toMatchObject({ units: ['eV', 'kJ/mol', 'J'], key: null });
    // -13.605693 eV x (6.10 / 3)^2 = -56.25 eV (n* = 3; J. C. Slater, Phys. Rev. 36, 57, 1930).
    const { body } = await external.put(`/api/items/${other.items[0]}/vetting-check`).set('If-Match', '1').send({ text: '-56.25 eV' }).expect(200);
    expect(body).toMatchObject({ mine: { text: '-56.25 eV', agrees: true } });
  });

  it('is not for readers', async () => {
    await (await server.signInAs('readerOne')).get(`/api/sittings/${paper.sittingId}/vetting`).expect(403);
  });
});
