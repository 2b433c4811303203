import { candidatesToPrint, lastLayoutOrdinal, printingsOfSitting } from '../../db/queries/printings';
import { lastScriptNumber } from '../../db/queries/candidates';
import { isPaperLocked } from '../../db/queries/sittings';
import type { PreviewPage, SheetPreview } from '../../shared/contracts/printings';
import { codePlaces, paperSizes, type PaperSize } from '../../shared/sheets/geometry';
import { composeCode } from '../../shared/sheets/identity';
import { pageFace, type SheetOwner, type Sheets } from '../../shared/sheets/sheet-face';
import { planSheets, type PlannedPage } from '../../shared/sheets/sheet-plan';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { darkRuns, rectOfRun } from '../print/code-modules';
import { measureWith, measuringDocument, setHead, setItems } from '../print/sheet-setting';
import { headingOf, planProblem, printedItems } from './sheet-order';
import { requireSitting } from './sitting-access';

const short = (mm: number): number => Math.round(mm * 1000) / 1000;

/** A check that is none, so that nobody's preview is taken for a sheet. */
const noCheck = (): string => '000000';

interface Shown {
  readonly sheets: Sheets;
  readonly sitting: number;
  readonly owner: SheetOwner;
}

function codePaths({ sheets, sitting, owner }: Shown, page: number): string[] {
  return codePlaces(paperSizes[sheets.plan.paper]).map((at) => {
    const digits = composeCode({ sitting, script: owner.script, page, place: at.place, layout: sheets.head.layout }, noCheck);
    return darkRuns(digits).map((run) => rectOfRun(run, at)).map(({ x, y, w, h }) => `M${short(x)} ${short(y)}h${short(w)}v${short(h)}h${short(-w)}z`).join('');
  });
}

function pageOf(shown: Shown, page: PlannedPage): PreviewPage {
  const { words, lines } = pageFace(shown.sheets, page, shown.owner);
  return {
    pageNo: page.pageNo,
    frames: page.boxes.filter(({ use }) => use !== 'working').map(({ x, y, w, h }) => ({ x: short(x), y: short(y), w: short(w), h: short(h) })),
    lines: lines.map(({ x1, x2, y }) => ({ x1: short(x1), x2: short(x2), y: short(y) })),
    words: words.map((word) => ({ ...word, sizeMm: short(word.sizeMm), x: short(word.x), y: short(word.y) })),
    codes: codePaths(shown, page.pageNo),
  };
}

/** What a printing would make, and one candidate's sheets drawn from the plan the printing would use. */
export function sheetPreviewFor(context: Context, actor: Actor, sittingId: string, paper: PaperSize): SheetPreview {
  const { db } = context;
  const { sitting } = requireSitting(context, actor, sittingId, ['lead', 'external']);
  const everyone = candidatesToPrint(db, sittingId);
  const wanted = everyone.filter(({ isAway, hasPagesIn }) => !isAway && !hasPagesIn);
  const items = printedItems(db, sittingId);
  const document = measuringDocument();
  const planned = planSheets(setItems(document, items, paper), paper);
  const [first] = wanted;
  const layout = Math.max(1, lastLayoutOrdinal(db, sittingId)) + 1;
  const { title, held } = headingOf(db, sitting);
  const owner: SheetOwner = { candidateNumber: first?.number ?? null, script: first?.scriptNumber ?? lastScriptNumber(db, sittingId) + 1 };
  const shown = planned.ok ? { sheets: { plan: planned.plan, head: setHead(document, title, held, layout), measure: measureWith(document) }, sitting: sitting.printNumber, owner } : null;
  return {
    isLocked: isPaperLocked(db, sittingId),
    paperSize: paper,
    ...paperSizes[paper],
    items: items.length,
    candidates: wanted.length,
    withoutSheet: wanted.filter(({ origin }) => origin !== 'printed').length,
    withPagesIn: everyone.filter(({ isAway, hasPagesIn }) => !isAway && hasPagesIn).length,
    away: everyone.filter(({ isAway }) => isAway).length,
    printings: printingsOfSitting(db, sittingId).length,
    problem: planned.ok ? null : planProblem(planned),
    sample: owner.candidateNumber,
    pages: shown ? shown.sheets.plan.pages.map((page) => pageOf(shown, page)) : [],
  };
}
