import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { boxesOfLayout, findLayout } from '../../db/queries/layouts';
import { draftedItems } from '../../db/queries/papers';
import { findSitting } from '../../db/queries/sittings';
import { paperFile } from '../../shared/contracts/paper-file';
import { itemDraft, type ItemDraft } from '../../shared/contracts/items';
import { createItem } from '../../server/services/items';
import { readDraft } from '../../server/services/drafts/read-draft';
import { saveLayout } from '../../server/services/layouts';
import { paperFileFor, takePaperFile } from '../../server/services/paper-file';
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

describe('a paper file', () => {
  let server: TestServer;
  beforeAll(async () => void (server = await startTestServer()));
  afterAll(() => server.close());

  it('goes out, into another sitting and out again as it was, whatever the items', () => {
    const { context, courseId } = server;
    const { db } = context;
    const lead = actorOf(server, 'lead');
    const sitting = () => createSitting(context, lead, courseId, { title: 'Paper 2', heldOn: '2026-05-06', secondPolicy: 'none', totalRounding: 'none' }).id;
    const schemes = (id: string) => draftedItems(db, id).map(({ item, scheme }) => ({ number: item.number, prompt: item.prompt, maxGrains: item.maxGrains, scheme }));
    const to = sitting();
    const property = fc.property(fc.array(draft, { maxLength: 4 }), fc.boolean(), (drafts, hasLayout) => {
      const from = sitting();
      const items = drafts.map((one) => createItem(context, lead, from, one).id);
      const { pages, boxes } = layoutFor(items);
      if (hasLayout) saveLayout(context, lead, from, 0, { pages, boxes: [...boxes, { pageNo: 1, item: null, use: 'number', x: 20, y: 10, w: 60, h: 10 }] });
      const out = paperFileFor(context, lead, from);
      const sent = paperFile.parse(JSON.parse(JSON.stringify(out)));
      expect(takePaperFile(context, lead, to, findSitting(db, to)?.rev ?? 0, sent)).toEqual(out);
      expect(schemes(to)).toEqual(schemes(from));
      const layout = findLayout(db, to, 1);
      expect(layout ? boxesOfLayout(db, layout.id) : []).toHaveLength(hasLayout ? drafts.length + 1 : 0);
    });
    fc.assert(property, { numRuns: 60, seed: 36 });
  });
});
