import { Ajv2020, type ValidateFunction } from 'ajv/dist/2020';
import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { boxesOfLayout, findLayout } from '../../db/queries/layouts';
import { draftedItems } from '../../db/queries/papers';
import { paperFile, paperSchemaPath } from '../../shared/contracts/paper-file';
import { itemDraft, type ItemDraft } from '../../shared/contracts/items';
import { createItem } from '../../server/services/items';
import { readDraft } from '../../server/services/drafts/read-draft';
import { saveLayout } from '../../server/services/layouts';
import { paperFileFor, paperMark, takePaperFile } from '../../server/services/paper-file';
import { createSitting } from '../../server/services/sittings';
import { actorOf, itemDraft as soundDraft, layoutFor } from '../support/paper';
import { startTestServer, type TestServer } from '../support/test-server';

const species = [['Cl', 0, '3p'], ['Fe', 0, '4s'], ['Mg', 2, '2p'], ['O', -1, '2p'], ['Zn', 0, '3d']] as const;

const asked = fc.record({
  of: fc.constantFrom(...species),
  quantity: fc.constantFrom('zeff' as const, 'sigma' as const, 'energy-ev' as const, 'radius-pm' as const),
  convention: fc.constantFrom('slater' as const, 'slater-035-in-1s' as const, 'core-count' as const),
});

/** Drafts as a person could send them: words with odd signs, shares, fractions of a width; the unsound ones are left out. */
const draft: fc.Arbitrary<ItemDraft> = fc
  .record({
    asked,
    decimals: fc.integer({ min: 0, max: 4 }),
    figures: fc.integer({ min: 3, max: 5 }),
    prompt: fc.option(fc.string({ minLength: 1, maxLength: 40 }).filter((text) => text.trim() !== '')),
    marks: fc.constantFrom('1', '2.5', '3', '1/3', '2 1/2'),
    downTo: fc.option(fc.integer({ min: 0, max: 3 })),
    truncation: fc.boolean(),
    width: fc.constantFrom('0.05', '0,1', '1/3', '5', '12.5', '1/7'),
    kind: fc.constantFrom('absolute' as const, 'relative' as const),
    slip: fc.boolean(),
    crossedOut: fc.constantFrom('ask' as const, 'none' as const),
  })
  .map(({ asked: { of, ...rest }, downTo, truncation, width, kind, slip, ...plain }) =>
    itemDraft.parse({
      ...soundDraft(of[0], of[2], { ...plain, asked: { symbol: of[0], charge: of[1], electron: of[2], ...rest } }),
      roundings: { downToDecimals: downTo, downToFigures: downTo === null ? null : Math.max(2, downTo), truncation },
      bands: [{ name: 'near', kind, width, marks: '1/4' }],
      slips: slip ? [{ id: 'counts-itself', marks: '1/4' }] : [],
    }),
  )
  .filter((one) => readDraft(one).scheme !== null);

const option = fc.constantFrom(...species).map(([symbol, charge, electron]) => ({ symbol, charge, electron }));
const method = fc.constantFrom<ItemDraft['methodMarks'][]>([], [{ id: 'm1', text: 'shells written out', marks: '1/2' }], [{ id: 'm1', text: 'shells', marks: '1/4' }, { id: 'm2', text: 'the sum of σ & Z', marks: '1/4' }]);

/** Choices and orders of printed electrons, with part marks and other accepted numbers. */
const printed: fc.Arbitrary<ItemDraft> = fc
  .record({ question: fc.constantFrom('greatest' as const, 'least' as const, 'increasing' as const, 'decreasing' as const), options: fc.uniqueArray(option, { minLength: 3, maxLength: 5, selector: ({ symbol }) => symbol }), hasPart: fc.boolean(), hasOther: fc.boolean(), methodMarks: method })
  .map(({ question, options, hasPart, hasOther, methodMarks }) => {
    const isOrder = question === 'increasing' || question === 'decreasing';
    const other = isOrder ? options.map((_option, index) => index + 1).join(' ') : '1';
    const plain = soundDraft('', '', { asked: { symbol: '', charge: 0, electron: '', quantity: 'zeff', convention: 'slater' }, kind: isOrder ? 'order' : 'choice', methodMarks, roundings: { downToDecimals: null, truncation: false }, decimals: 0 });
    return itemDraft.parse({ ...plain, printed: { question, options, partMarks: isOrder && hasPart ? [{ inPlace: 1, marks: '1' }] : [] }, alternatives: hasOther ? [{ name: 'as read out', convention: null, value: other, marks: '1', reason: 'said in the hall' }] : [] });
  })
  .filter((one) => readDraft(one).scheme !== null);

/** Keys that the lead types, with a unit, its cost, and the cost of a sign. */
const typed: fc.Arbitrary<ItemDraft> = fc
  .record({ value: fc.constantFrom('12.50', '-3.4', '7', '0.055'), unit: fc.constantFrom('', 'kJ', 'eV'), unitCost: fc.constantFrom(null, '1/2'), signCost: fc.constantFrom(null, '1'), methodMarks: method })
  .map(({ value, unit, unitCost, signCost, methodMarks }) => {
    const decimals = value.split('.')[1]?.length ?? 0;
    const asked = { symbol: '', charge: 0, electron: '', quantity: 'value' as const, convention: 'typed' as const, typed: { label: 'ΔH', value, unit, source: 'from the <data> sheet' } };
    return soundDraft('', '', { asked, decimals, prompt: 'Find ΔH, as on the sheet.', roundings: { downToDecimals: null, truncation: false }, unitCost, signCost, methodMarks });
  })
  .filter((one) => readDraft(one).scheme !== null);

/** A question, and one or two that follow from the one before them; links name the place. */
const chain = (name: (place: number) => string, first: number): ItemDraft[] => {
  const asked = (quantity: 'zeff' | 'energy-ev' | 'sigma') => ({ symbol: 'Cl', charge: 0, electron: '3p', quantity, convention: 'slater' as const });
  const rounded = { downToDecimals: null, downToFigures: 3, truncation: false };
  return [
    soundDraft('Cl', '3p', { asked: asked('sigma') }),
    soundDraft('Cl', '3p', { asked: asked('zeff'), followThrough: { from: name(first), second: null, isTrivial: true } }),
    soundDraft('Cl', '3p', { asked: asked('energy-ev'), roundings: rounded, unitCost: '1', followThrough: { from: name(first + 1), second: null, isTrivial: false } }),
  ];
};

describe('a paper file', () => {
  let server: TestServer;
  let isPaperFile: ValidateFunction;
  beforeAll(async () => {
    server = await startTestServer();
    // JSON Schema 2020-12, as published by the server itself.
    const { body } = await server.nobody().get(`/api${paperSchemaPath}`).expect(200);
    isPaperFile = new Ajv2020({ allErrors: true, strict: false }).compile(body as object);
  });
  afterAll(() => server.close());

  it('goes out, into another sitting and out again as it was, whatever the items', () => {
    const { context, courseId } = server;
    const { db } = context;
    const lead = actorOf(server, 'lead');
    const sitting = () => createSitting(context, lead, courseId, { title: 'Paper 2', heldOn: '2026-05-06', secondPolicy: 'none', totalRounding: 'none' }).id;
    const schemes = (id: string) => draftedItems(db, id).map(({ item, scheme }) => ({ number: item.number, prompt: item.prompt, maxGrains: item.maxGrains, scheme }));
    const to = sitting();
    /** Links name the ids of their own paper. */
    const linkless = (found: ReturnType<typeof schemes>) => found.map(({ scheme: { followThrough, ...rest }, ...item }) => ({ ...item, scheme: { ...rest, follows: followThrough && { ...followThrough, from: '' } } }));
    const property = fc.property(fc.array(fc.oneof(draft, printed, typed), { maxLength: 4 }), fc.boolean(), fc.boolean(), (alone, hasLayout, hasChain) => {
      const from = sitting();
      const items = alone.map((one) => createItem(context, lead, from, one).id);
      const links = hasChain ? chain(String, 0).length : 0;
      for (let at = 0; at < links; at += 1) {
        const next = chain((place) => items[place] ?? '', alone.length)[at];
        if (next) items.push(createItem(context, lead, from, next).id);
      }
      const { pages, boxes } = layoutFor(items);
      if (hasLayout) saveLayout(context, lead, from, 0, { pages, boxes: [...boxes, { pageNo: 1, item: null, use: 'number', x: 20, y: 10, w: 60, h: 10 }] });
      const out = paperFileFor(context, lead, from);
      const sent = paperFile.parse(JSON.parse(JSON.stringify(out)));
      expect(isPaperFile(sent), JSON.stringify(isPaperFile.errors)).toBe(true);
      expect(takePaperFile(context, lead, to, paperMark(paperFileFor(context, lead, to)), sent)).toEqual(out);
      expect(linkless(schemes(to))).toEqual(linkless(schemes(from)));
      expect(out.items.filter(({ followThrough }) => followThrough).map(({ followThrough }) => followThrough?.from)).toEqual(hasChain ? [alone.length + 1, alone.length + 2] : []);
      const layout = findLayout(db, to, 1);
      expect(layout ? boxesOfLayout(db, layout.id) : []).toHaveLength(hasLayout ? items.length + 1 : 0);
    });
    fc.assert(property, { numRuns: 40, seed: 36 });
  });

  it('is what the schema in the open says, and nothing else is', () => {
    const file = { format: 'meniscus-paper', version: 1, title: 'Paper', items: [{ ...chain(String, 1)[0], followThrough: null }], pages: [{ widthMm: 210, heightMm: 297 }], boxes: [] };
    expect(isPaperFile(file), JSON.stringify(isPaperFile.errors)).toBe(true);
    const [item] = file.items;
    const broken: object[] = [
      { ...file, format: 'another' },
      { ...file, version: 2 },
      { ...file, key: '6.10' },
      { ...file, items: undefined },
      { ...file, items: [{ ...item, key: '6.10' }] },
      { ...file, items: [{ ...item, kind: 'essay' }] },
      { ...file, items: [{ ...item, decimals: 1.5 }] },
      { ...file, items: [{ ...item, marks: 3 }] },
      { ...file, items: [{ ...item, followThrough: { from: 0, second: null, isTrivial: false } }] },
      { ...file, items: [{ ...item, followThrough: { from: 'a', second: null, isTrivial: false } }] },
      { ...file, items: [{ ...item, methodMarks: [{ id: '', text: 'x', marks: '1' }] }] },
      { ...file, items: [{ ...item, asked: { ...item?.asked, typed: { label: 'x' } } }] },
      { ...file, items: [{ ...item, printed: { question: 'best', options: [], partMarks: [] } }] },
      { ...file, items: [{ ...item, unitCost: 1 }] },
      { ...file, pages: [{ widthMm: 0, heightMm: 297 }] },
      { ...file, boxes: [{ item: 1, pageNo: 1, use: 'answer', x: 1, y: 1, w: 1 }] },
    ];
    for (const one of broken) expect(isPaperFile(JSON.parse(JSON.stringify(one))), JSON.stringify(one)).toBe(false);
  });
});
