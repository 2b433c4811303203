import { demoSheet } from '../../db/seed/pages/demo-sheet';
import { drawPages } from '../../server/commands/demo-draw/draw-pages';
import { pageCount, PAGE_HEIGHT_MM, PAGE_WIDTH_MM, sheetBoxes } from '../../db/seed/pages/sheet-layout';
import { demoItems } from '../../db/seed/truth/demo-items';
import type { CandidateTruth } from '../../db/seed/truth/written';
import { marksText } from '../../shared/marking/grains';
import { importClassList } from '../../server/services/class-list';
import { createItem } from '../../server/services/items';
import { saveLayout } from '../../server/services/layouts';
import { lockPaper } from '../../server/services/paper-lock';
import { createSitting } from '../../server/services/sittings';
import { actorOf, itemDraft, type BuiltPaper } from './paper';
import type { TestServer } from './test-server';

/** A locked sitting with the first items of the demo on its printed sheet, and a class list. */
export function buildDemoSitting(server: TestServer, candidates: readonly string[], itemCount = demoItems.length): BuiltPaper {
  const { context, courseId } = server;
  const lead = actorOf(server, 'lead');
  const sitting = createSitting(context, lead, courseId, { title: 'Paper 2, spring sitting', heldOn: '2026-05-06', secondPolicy: 'none', totalRounding: 'none' });
  const items = demoItems.slice(0, itemCount).map(({ asked, maxGrains }) => {
    const quantity = asked.quantity === 'sigma' ? 'sigma' : 'zeff';
    return createItem(context, lead, sitting.id, itemDraft(asked.symbol, asked.electron, { asked: { symbol: asked.symbol, charge: asked.charge, electron: asked.electron, quantity, convention: 'slater' }, marks: marksText(maxGrains) })).id;
  });
  const boxes = sheetBoxes(itemCount).map(({ itemNumber, ...box }) => ({ ...box, item: items[itemNumber - 1] ?? '' }));
  saveLayout(context, lead, sitting.id, 0, { pages: Array.from({ length: pageCount(itemCount) }, () => ({ widthMm: PAGE_WIDTH_MM, heightMm: PAGE_HEIGHT_MM })), boxes });
  importClassList(context, lead, sitting.id, candidates.join('\n'));
  lockPaper(context, lead, sitting.id);
  return { sittingId: sitting.id, items };
}

/** The pages of candidates as image files, named by candidate and page. */
export const drawDemoPages = (outDir: string, truth: readonly CandidateTruth[], itemCount = demoItems.length, seed = 'test'): Promise<readonly { readonly file: string }[]> =>
  drawPages({ outDir, seed, sheet: { ...demoSheet, items: demoSheet.items.slice(0, itemCount) }, candidates: truth });
