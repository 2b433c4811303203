import fc from 'fast-check';
import { strToU8, unzipSync, zipSync, type Zippable } from 'fflate';
import type { Agent } from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createItem } from '../../server/services/items';
import { paperQti } from '../../server/services/paper-qti';
import { paperFileFor, paperMark } from '../../server/services/paper-file';
import { createSitting } from '../../server/services/sittings';
import { previewQti, takeQti } from '../../server/services/take-qti';
import type { ItemDraft } from '../../shared/contracts/items';
import type { QtiReading } from '../../shared/contracts/paper-file';
import { actorOf, buildPaper, itemDraft } from '../support/paper';
import { foreignXml, packageOf } from '../support/qti-package';
import { startTestServer, type TestServer } from '../support/test-server';

const printedItem = (kind: 'choice' | 'order', partMarks: { inPlace: number; marks: string }[] = []): ItemDraft =>
  itemDraft('', '', {
    kind,
    asked: { symbol: '', charge: 0, electron: '', quantity: 'zeff', convention: 'slater' },
    printed: { question: kind === 'choice' ? 'greatest' : 'increasing', options: ['O', 'F', 'N', 'C'].map((symbol) => ({ symbol, charge: 0, electron: '2p' })), partMarks },
    decimals: 0,
    roundings: { downToDecimals: null, truncation: false },
  });

describe('a package comes in', () => {
  let server: TestServer;
  let lead: Agent;
  beforeAll(async () => {
    server = await startTestServer();
    lead = await server.signInAs('lead');
  });
  afterAll(() => server.close());

  const open = () => buildPaper(server, { locked: false }).sittingId;
  const markOf = (sittingId: string) => paperMark(paperFileFor(server.context, actorOf(server, 'lead'), sittingId));
  const itemsOf = (sittingId: string) => paperFileFor(server.context, actorOf(server, 'lead'), sittingId).items;
  const send = (sittingId: string, bytes: Uint8Array, query = '', mark = markOf(sittingId)) =>
    lead.put(`/api/sittings/${sittingId}/paper.qti.zip${query}`).set('If-Match', `"${mark}"`).set('Content-Type', 'application/zip').send(Buffer.from(bytes));
  const refusalOf = async (files: Zippable) => {
    const { body, status } = await send(open(), zipSync(files)).then((answer) => answer);
    return [status, (body as { error: { message: string } }).error.message] as const;
  };

  it('brings items from elsewhere as items with a typed key, after a preview', async () => {
    const sittingId = open();
    const bytes = packageOf({ q1: foreignXml({ identifier: 'q1', title: 'Lattice enthalpy', key: '-787.50', tolerance: { mode: 'absolute', text: '2.5 2.5' }, marks: '4' }), q2: foreignXml({ identifier: 'q2', title: '', key: '96485', tolerance: { mode: 'relative', text: '1' } }), q3: foreignXml({ identifier: 'q3', title: 'Charge', key: '7' }) });
    const { body: preview } = await lead.post(`/api/sittings/${sittingId}/paper.qti.zip/preview`).set('Content-Type', 'application/zip').send(Buffer.from(bytes)).expect(200);
    expect(preview).toMatchObject({ mark: markOf(sittingId), refused: [], items: [{ identifier: 'q1', label: 'Lattice enthalpy', marks: '4', isOwn: false, prompt: 'Find H_f of 10^3 g & say <it>.' }, { label: 'q2' }, { label: 'Charge' }] });
    await send(sittingId, bytes, '', (preview as { mark: string }).mark).expect(200);
    const items = itemsOf(sittingId);
    expect(items.map(({ asked: { typed } }) => typed)).toEqual([
      { label: 'Lattice enthalpy', value: '-787.5', unit: '', source: 'QTI item q1' },
      { label: 'q2', value: '96485', unit: '', source: 'QTI item q2' },
      { label: 'Charge', value: '7', unit: '', source: 'QTI item q3' },
    ]);
    expect(items.map(({ bands, marks }) => [marks, bands.map(({ kind, width }) => [kind, width])])).toEqual([['4', [['absolute', '2.5']]], ['1', [['relative', '1']]], ['1', []]]);
  });

  it('brings what was written here back as it was, but for what a package has no place for', () => {
    const { context, courseId } = server;
    const actor = actorOf(server, 'lead');
    const sitting = () => createSitting(context, actor, courseId, { title: 'Paper 2', heldOn: '2026-05-06', secondPolicy: 'none', totalRounding: 'none' }).id;
    const common = { prompt: fc.option(fc.string({ minLength: 1, maxLength: 40 }).map((text) => text.trim()).filter((text) => text !== '')), marks: fc.constantFrom('3', '2 1/3', '4.5'), methodMarks: fc.boolean().map((has): ItemDraft['methodMarks'] => (has ? [{ id: 'm1', text: 'shells', marks: '1' }] : [])), crossedOut: fc.constantFrom('ask' as const, 'none' as const) };
    const number = fc.record({ ...common, of: fc.constantFrom({ symbol: 'Cl', electron: '3p' }, { symbol: 'Fe', electron: '4s' }), quantity: fc.constantFrom('zeff' as const, 'energy-ev' as const), hasSlip: fc.boolean(), width: fc.constantFrom('0.05', '1/7', '0.2') }).map(({ of: { symbol, electron }, quantity, hasSlip, width, ...rest }) =>
      itemDraft(symbol, electron, { ...rest, asked: { symbol, charge: 0, electron, quantity, convention: 'slater' }, roundings: quantity === 'zeff' ? { downToDecimals: 1, truncation: true } : { downToDecimals: null, downToFigures: 3, truncation: false }, bands: [{ name: 'near', kind: 'absolute', width, marks: '1' }], slips: hasSlip ? [{ id: 'counts-itself', marks: '1/4' }] : [], unitCost: quantity === 'zeff' ? null : '1/2' }),
    );
    const shown = fc.record({ ...common, kind: fc.constantFrom('choice' as const, 'order' as const), hasPart: fc.boolean() }).map(({ kind, hasPart, ...rest }) => ({ ...printedItem(kind, hasPart && kind === 'order' ? [{ inPlace: 2, marks: '1' }, { inPlace: 1, marks: '1/2' }] : []), ...rest }));
    const property = fc.property(fc.array(fc.oneof(number, shown), { minLength: 1, maxLength: 4 }), (drafts) => {
      const [from, to] = [sitting(), sitting()];
      for (const draft of drafts) createItem(context, actor, from, draft);
      const taken = takeQti(context, actor, to, markOf(to), { bytes: paperQti(context, actor, from).bytes, takesRest: false });
      expect(taken.items.every(({ isOwn }) => isOwn)).toBe(true);
      const held = itemsOf(from).map((item) => ({ ...item, methodMarks: [], unitCost: null, marks: item.methodMarks.length === 0 ? item.marks : { 3: '2', '2 1/3': '1 1/3', '4.5': '3.5' }[item.marks] }));
      expect(itemsOf(to)).toEqual(held);
    });
    fc.assert(property, { numRuns: 25, seed: 36 });
  });

  it('refuses an own item whose scoring was changed elsewhere, and takes a changed wording', async () => {
    const { sittingId } = buildPaper(server, { locked: false, drafts: [itemDraft()] });
    const text = (edit: (xml: string) => string) => zipSync(Object.fromEntries(Object.entries(unzipSync(paperQti(server.context, actorOf(server, 'lead'), sittingId).bytes)).map(([name, bytes]) => [name, name.startsWith('items/') ? strToU8(edit(Buffer.from(bytes).toString())) : bytes])));
    const changed = await send(sittingId, text((xml) => xml.replace('>6.10<', '>6.50<'))).expect(400);
    expect((changed.body as { error: { message: string } }).error.message).toMatch(/Its key or scoring is not the one that is worked here/);
    await send(sittingId, text((xml) => xml.replace(/<p>By [^<]*<\/p>/, '<p>Give Z_eff.</p>'))).expect(200);
    expect(itemsOf(sittingId)).toEqual([itemDraft('Cl', '3p', { prompt: 'Give Z_eff.' })]);
  });

  it('takes nothing when anything is refused, unless the rest is asked for', async () => {
    const sittingId = open();
    const before = itemsOf(sittingId);
    const bytes = packageOf({ good: foreignXml({ identifier: 'good', key: '5' }), essay: foreignXml({ identifier: 'essay', key: '5' }).replaceAll('qti-text-entry-interaction', 'qti-extended-text-interaction') });
    const refused = await send(sittingId, bytes).expect(400);
    expect(refused.body).toMatchObject({ error: { fields: { 'essay.xml': 'It asks by qti-extended-text-interaction; only a text entry is read.' } } });
    expect(itemsOf(sittingId)).toEqual(before);
    const taken = (await send(sittingId, bytes, '?rest=take').expect(200)).body as QtiReading;
    expect([taken.items.map(({ identifier }) => identifier), taken.refused.map(({ file }) => file)]).toEqual([['good'], ['essay.xml']]);
    expect(itemsOf(sittingId)).toHaveLength(1);
    const none = packageOf({ essay: '<qti-assessment-test/>' });
    await send(sittingId, none, '?rest=take').expect(400);
    expect(itemsOf(sittingId)).toHaveLength(1);
  });

  it.each([
    ['string key', (xml: string) => xml.replace('base-type="float"', 'base-type="string"'), 'Its answer is no single number.'],
    ['part marks', (xml: string) => xml.replace('</qti-response-if>', '</qti-response-if><qti-response-else-if/>'), 'Its scoring is more than one comparison with the key.'],
    ['a picture', (xml: string) => xml.replace('<qti-item-body>', '<qti-item-body><img src="https://evil.example/x.png"/>'), 'Its body holds <img>, which cannot be printed as words.'],
    ['an uneven tolerance', (xml: string) => xml.replace('tolerance-mode="exact"', 'tolerance-mode="absolute" tolerance="1 2"'), 'Its tolerance is not the same on both sides.'],
    ['two answers', (xml: string) => xml.replace('</qti-item-body>', '<p><qti-text-entry-interaction response-identifier="RESPONSE"/></p></qti-item-body>'), 'It asks for more than one answer.'],
    ['no number for its key', (xml: string) => xml.replace('<qti-value>5<', '<qti-value>five<'), 'The key “five” is no number.'],
    ['a seventh of a mark', (xml: string) => xml.replace('<qti-default-value><qti-value>1<', '<qti-default-value><qti-value>0.123456<'), 'Its key does not give all its marks.'],
  ])('refuses an item with %s by its place', (_name, edit, message) => {
    const sittingId = open();
    const { items, refused } = previewQti(server.context, actorOf(server, 'lead'), sittingId, packageOf({ q: edit(foreignXml({ identifier: 'q', key: '5' })) }));
    expect([items, refused]).toEqual([[], [{ file: 'q.xml', identifier: 'q', message }]]);
  });

  describe('what means harm', () => {
    const lol = `<!DOCTYPE lolz [<!ENTITY a "ha">${Array.from({ length: 9 }, (_, n) => `<!ENTITY ${'abcdefghij'[n + 1]} "${`&${'abcdefghij'[n]};`.repeat(10)}">`).join('')}]>`;
    it.each([
      ['entities that grow', `${lol}<manifest>&j;</manifest>`, 'It has a document type or entities of its own, which are not read.'],
      ['an entity from outside', '<!DOCTYPE m [<!ENTITY x SYSTEM "file:///etc/passwd">]><manifest>&x;</manifest>', 'It has a document type or entities of its own, which are not read.'],
      ['a name with no meaning', '<manifest>&x;</manifest>', '“&x;” is an entity; only those of XML itself are read.'],
      ['elements in elements', '<a>'.repeat(100_000), 'Its elements are nested deeper than 40.'],
      ['comments that never end', '<manifest><!--'.repeat(20_000), 'It ends too early.'],
      ['an end of nothing', '<manifest></other>', '</other> ends nothing.'],
    ])('is refused: %s', async (_name, manifest, message) => {
      expect(await refusalOf({ 'imsmanifest.xml': strToU8(manifest) })).toEqual([400, `imsmanifest.xml: ${message}`]);
    });

    it('is refused: names that lead out, too many files, and files too large', async () => {
      for (const name of ['../up.xml', '/etc/x.xml', 'a/../../x.xml', 'C:\\x.xml', 'a\\b.xml']) expect(await refusalOf({ [name]: strToU8('<a/>') })).toEqual([400, 'The package was not read. It names a file outside itself.']);
      expect(await refusalOf(Object.fromEntries(Array.from({ length: 401 }, (_, n) => [`${n}.xml`, strToU8('<a/>')])))).toEqual([400, 'The package was not read. It holds more than 400 files.']);
      expect(await refusalOf({ 'imsmanifest.xml': new Uint8Array(600 * 1024) })).toEqual([400, 'The package was not read. imsmanifest.xml holds more than 512 KiB.']);
      expect(await refusalOf({ 'imsmanifest.xml': new Uint8Array(64 * 1024 * 1024) })).toEqual([400, 'The package was not read. Unpacked it holds more than 8 MiB.']);
    });

    it('is refused: a file that says it is small and is not, no ZIP, and too many bytes', async () => {
      const honest = zipSync({ 'imsmanifest.xml': new Uint8Array(64 * 1024 * 1024) });
      const view = new DataView(honest.buffer, honest.byteOffset, honest.byteLength);
      // The stated size, in the entry itself (at 22) and in the list of entries (at 24), from the ZIP application note.
      view.setUint32(22, 10, true);
      for (let at = honest.length - 22; at >= 0; at -= 1) if (view.getUint32(at, true) === 0x02014b50) view.setUint32(at + 24, 10, true);
      const begun = performance.now();
      const lying = await send(open(), honest).expect(400);
      expect((lying.body as { error: { message: string } }).error.message).toBe('The package was not read. imsmanifest.xml holds more than 512 KiB.');
      expect(performance.now() - begun).toBeLessThan(5000);
      await send(open(), strToU8('no zip at all')).expect(400);
      await send(open(), zipSync({})).expect(400);
      await send(open(), new Uint8Array(5 * 1024 * 1024)).expect(413);
      await lead.put(`/api/sittings/${open()}/paper.qti.zip`).set('If-Match', 'a').send({}).expect(400);
    });

    it('does not follow a manifest out of the package', () => {
      const manifest = '<manifest><resources><resource identifier="a" type="imsqti_item_xmlv3p0" href="../../etc/passwd"/><resource identifier="b" type="webcontent" href="b.css"/></resources></manifest>';
      const { items, refused } = previewQti(server.context, actorOf(server, 'lead'), open(), zipSync({ 'imsmanifest.xml': strToU8(manifest) }));
      expect([items, refused.map(({ message }) => message)]).toEqual([[], ['The package does not hold its file.', 'It is of the type “webcontent”; only items of QTI 3.0 are read.']]);
    });
  });

  it('is not taken by a locked paper, nor over an edit made since the preview', async () => {
    const bytes = packageOf({ q: foreignXml({ identifier: 'q', key: '5' }) });
    const { sittingId } = buildPaper(server);
    await send(sittingId, bytes).expect(409);
    const other = open();
    const mark = markOf(other);
    createItem(server.context, actorOf(server, 'lead'), other, itemDraft('Fe', '4s'));
    await send(other, bytes, '', mark).expect(409);
    expect(itemsOf(other)).toHaveLength(3);
  });

  it('is for the lead alone', async () => {
    const sittingId = open();
    const before = itemsOf(sittingId);
    const bytes = Buffer.from(packageOf({ q: foreignXml({ identifier: 'q', key: '5' }) }));
    for (const [name, status] of [['readerOne', 403], ['external', 403], ['officer', 403], ['outsider', 404]] as const) {
      const agent = await server.signInAs(name);
      await agent.put(`/api/sittings/${sittingId}/paper.qti.zip`).set('If-Match', markOf(sittingId)).set('Content-Type', 'application/zip').send(bytes).expect(status);
      const { text } = await agent.post(`/api/sittings/${sittingId}/paper.qti.zip/preview`).set('Content-Type', 'application/zip').send(bytes).expect(status);
      expect(text).not.toContain(markOf(sittingId));
    }
    expect(itemsOf(sittingId)).toEqual(before);
  });
});
