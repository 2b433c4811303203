import { strFromU8, unzipSync } from 'fflate';
import type { Agent } from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { draftedItems } from '../../db/queries/papers';
import type { ItemDraft } from '../../shared/contracts/items';
import { GRAINS_PER_MARK } from '../../shared/marking/grains';
import { markAnswer } from '../../shared/marking/verdict';
import { buildPaper, itemDraft } from '../support/paper';
import { first, parsed, qtiScore, qtiScoreOf, under } from '../support/qti-score';
import { startTestServer, type TestServer } from '../support/test-server';

/** Structure from memory of 1EdTech's information models for items and packages, QTI 3.0; no claim of conformance. */
describe('a paper as a package of items', () => {
  let server: TestServer;
  let lead: Agent;
  beforeAll(async () => {
    server = await startTestServer();
    lead = await server.signInAs('lead');
  });
  afterAll(() => server.close());

  const energy: Partial<ItemDraft> = { asked: { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'energy-ev', convention: 'slater' }, roundings: { downToDecimals: null, downToFigures: 3, truncation: false } };
  const drafts = [
    itemDraft('Cl', '3p', {
      prompt: 'Find Z_eff & say why <it> is so.',
      bands: [{ name: 'near', kind: 'absolute', width: '0.05', marks: '2' }, { name: 'far', kind: 'absolute', width: '0.1', marks: '1' }],
      alternatives: [{ name: 'core count', convention: 'core-count', value: '', marks: '1/3', reason: 'taught last year' }],
      slips: [{ id: 'counts-itself', marks: '1' }],
    }),
    itemDraft('Fe', '4s', { roundings: { downToDecimals: 1, truncation: true } }),
    itemDraft('Cl', '3p', energy),
  ];

  async function filesOf(sittingId: string): Promise<Record<string, string>> {
    const { body, headers } = await lead.get(`/api/sittings/${sittingId}/paper.qti.zip`).buffer(true).parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    }).expect(200);
    expect(headers).toMatchObject({ 'content-type': 'application/zip', 'content-disposition': expect.stringMatching(/^attachment; filename="paper-\d+\.qti\.zip"$/) });
    return Object.fromEntries(Object.entries(unzipSync(body as Buffer)).map(([name, bytes]) => [name, strFromU8(bytes)]));
  }
  const itemFile = (files: Record<string, string>, number: number): string => Object.entries(files).find(([name]) => name.endsWith(`-item-${number}.xml`))?.[1] ?? '';

  it('lists each item once in its manifest, with its file', async () => {
    const { sittingId } = buildPaper(server, { drafts });
    const files = await filesOf(sittingId);
    const manifest = parsed(files['imsmanifest.xml'] ?? '');
    expect(manifest).toMatchObject({ manifest: { '@xmlns': 'http://www.imsglobal.org/xsd/qti/qtiv3p0/imscp_v1p1', metadata: { schema: 'QTI Package' } } });
    expect(Object.keys(first(manifest, 'manifest')).filter((key) => !key.startsWith('@'))).toEqual(['metadata', 'organizations', 'resources']);
    const resources = under(manifest, 'resource');
    expect(resources).toHaveLength(3);
    for (const resource of resources) {
      expect(resource).toMatchObject({ '@type': 'imsqti_item_xmlv3p0', file: { '@href': resource['@href'] } });
      expect(parsed(files[String(resource['@href'])] ?? '')).toMatchObject({ 'qti-assessment-item': { '@identifier': resource['@identifier'] } });
    }
    expect(Object.keys(files)).toHaveLength(4);
  });

  it('declares response, marks and wording of an item, in the order of the model', async () => {
    const { sittingId } = buildPaper(server, { drafts });
    const files = await filesOf(sittingId);
    const { 'qti-assessment-item': item } = parsed(itemFile(files, 1)) as { 'qti-assessment-item': Record<string, unknown> };
    expect(item).toMatchObject({
      '@xmlns': 'http://www.imsglobal.org/xsd/imsqtiasi_v3p0',
      '@title': '1. Cl 3p',
      '@adaptive': 'false',
      '@time-dependent': 'false',
      // Slater's coefficients (Phys. Rev. 36, 57, 1930): 17 - (6 x 0.35 + 8 x 0.85 + 2) = 6.10.
      'qti-response-declaration': { '@identifier': 'RESPONSE', '@cardinality': 'single', '@base-type': 'float', 'qti-correct-response': { 'qti-value': '6.10' } },
      'qti-outcome-declaration': [{ '@identifier': 'SCORE', '@normal-maximum': '3' }, { '@identifier': 'MAXSCORE', 'qti-default-value': { 'qti-value': '3' } }],
    });
    expect(Object.keys(item).filter((key) => !key.startsWith('@'))).toEqual(['qti-response-declaration', 'qti-outcome-declaration', 'qti-item-body', 'qti-response-processing']);
    expect(under(item['qti-item-body'], 'qti-text-entry-interaction')).toMatchObject([{ '@response-identifier': 'RESPONSE' }]);
    expect(itemFile(files, 1)).toContain('<p>Find Z_eff &amp; say why &lt;it&gt; is so.</p>');
    expect(itemFile(files, 3)).toContain(' eV');
  });

  /** Places aside: a float has none, so 7 and 7.00 are one number there. */
  it('scores a number as the paper does', async () => {
    const { sittingId } = buildPaper(server, { drafts });
    const files = await filesOf(sittingId);
    const texts = ['6.10', '6.1', '6.05', '6.15', '6.00', '6.20', '6.04', '6.16', '6.21', '5.99', '5.75', '7.00', '3.75', '3.7', '3.8', '3.76', '4', '-56.25', '-56.3', '-56.2', '-56.252', '-56', '56.25', '0'];
    draftedItems(server.context.db, sittingId).forEach(({ scheme }, index) => {
      const scores = texts.map((text) => [text, qtiScore(itemFile(files, index + 1), Number(text))]);
      const marks = texts.map((text) => [text, Number(((markAnswer(scheme, { text }, {}).grains ?? 0) / GRAINS_PER_MARK).toFixed(6))]);
      expect(scores).toEqual(marks);
      expect(new Set(scores.map(([, score]) => score)).size).toBeGreaterThan(1);
    });
  });

  describe('choices and orders', () => {
    const shown = (kind: 'choice' | 'order', changes: Partial<ItemDraft> = {}): ItemDraft =>
      itemDraft('', '', {
        kind,
        asked: { symbol: '', charge: 0, electron: '', quantity: 'zeff', convention: 'slater' },
        printed: { question: kind === 'choice' ? 'greatest' : 'increasing', options: ['O', 'F', 'N', 'C'].map((symbol) => ({ symbol, charge: 0, electron: '2p' })), partMarks: kind === 'order' ? [{ inPlace: 1, marks: '1/3' }, { inPlace: 2, marks: '1' }] : [] },
        decimals: 0,
        roundings: { downToDecimals: null, truncation: false },
        ...changes,
      });
    const other = (value: string) => [{ name: 'as read out', convention: null, value, marks: '2', reason: 'said in the hall' }];

    it('ask by a choice of one or an order of all, correct answer declared', async () => {
      const { sittingId } = buildPaper(server, { drafts: [shown('choice'), shown('order')] });
      const files = await filesOf(sittingId);
      // Slater's rules (1930): 2p of C 3.25, N 3.90, O 4.55, F 5.20; the options are O, F, N, C.
      expect(first(parsed(itemFile(files, 1)), 'qti-response-declaration')).toMatchObject({ '@cardinality': 'single', '@base-type': 'identifier', 'qti-correct-response': { 'qti-value': 'option-2' } });
      expect(first(parsed(itemFile(files, 1)), 'qti-choice-interaction')).toMatchObject({ '@response-identifier': 'RESPONSE', '@max-choices': '1', '@shuffle': 'false' });
      expect(first(parsed(itemFile(files, 2)), 'qti-response-declaration')).toMatchObject({ '@cardinality': 'ordered', 'qti-correct-response': { 'qti-value': ['option-4', 'option-3', 'option-1', 'option-2'] } });
      expect(under(first(parsed(itemFile(files, 2)), 'qti-order-interaction'), 'qti-simple-choice')).toMatchObject([{ '@identifier': 'option-1', '#': 'a 2p electron of an O atom' }, {}, {}, {}]);
    });

    it('score every answer that can be given as the paper does, part marks included', async () => {
      const { sittingId } = buildPaper(server, { drafts: [shown('choice', { alternatives: other('1') }), shown('order', { alternatives: other('4 3 2 1') })] });
      const files = await filesOf(sittingId);
      const orders = (left: string[]): string[][] => (left.length === 0 ? [[]] : left.flatMap((one) => orders(left.filter((rest) => rest !== one)).map((rest) => [one, ...rest])));
      const answers = [['1', '2', '3', '4'].map((one) => [one]), orders(['1', '2', '3', '4'])];
      draftedItems(server.context.db, sittingId).forEach(({ scheme }, index) => {
        const given = answers[index] ?? [];
        const scores = given.map((numbers) => [numbers.join(' '), qtiScoreOf(itemFile(files, index + 1), numbers.map((number) => `option-${number}`))]);
        const marks = given.map((numbers) => [numbers.join(' '), Number(((markAnswer(scheme, { text: numbers.join(' ') }, {}).grains ?? 0) / GRAINS_PER_MARK).toFixed(6))]);
        expect(scores).toEqual(marks);
        expect(new Set(scores.map(([, score]) => score)).size).toBe(index === 0 ? 3 : 5);
      });
    });
  });

  it('says in the item what it leaves out, and is worth what its value alone gives', async () => {
    const chained = itemDraft('Cl', '3p', { ...energy, methodMarks: [{ id: 'a', text: 'shells -- written out', marks: '1' }], unitCost: '1/2', signCost: '1/2' });
    const { sittingId } = buildPaper(server, { drafts: [itemDraft(), chained] });
    const files = await filesOf(sittingId);
    expect(itemFile(files, 1)).not.toContain('Left out');
    expect(itemFile(files, 2)).toContain('<!-- Left out: method marks, which a reader gives; what a unit costs once a paper; what a sign costs once a paper. -->');
    expect(first(parsed(itemFile(files, 2)), 'qti-outcome-declaration')).toMatchObject({ '@normal-maximum': '2' });
    expect(qtiScore(itemFile(files, 2), -56.25)).toBe(2);
  });

  describe('someone else’s', () => {
    it('is for the lead alone', async () => {
      const { sittingId } = buildPaper(server);
      for (const [name, status] of [['readerOne', 403], ['external', 403], ['officer', 403], ['outsider', 404]] as const) {
        const { text } = await (await server.signInAs(name)).get(`/api/sittings/${sittingId}/paper.qti.zip`).expect(status);
        expect(text).not.toMatch(/6\.10/);
      }
      await server.nobody().get(`/api/sittings/${sittingId}/paper.qti.zip`).expect(401);
    });
  });

  describe('edge cases', () => {
    it('packs a paper without items as an empty list', async () => {
      const { sittingId } = buildPaper(server, { drafts: [], locked: false });
      expect(Object.keys(await filesOf(sittingId))).toEqual(['imsmanifest.xml']);
    });
  });
});
