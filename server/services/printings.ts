import { v7 as uuidv7 } from 'uuid';
import { inTransaction, type Database } from '../../db/client';
import { insertPage, lastScriptNumber } from '../../db/queries/candidates';
import { insertBox, insertLayout, saveLayoutPage } from '../../db/queries/layouts';
import { draftedItems } from '../../db/queries/papers';
import { dropPagesBeyond, findPrinting, insertPrintedScript, insertPrinting, isPrintingUnderWay, lastLayoutOrdinal, pageNumbersOf, pointScript, printableScripts, printingsOfSitting } from '../../db/queries/printings';
import type { BodyOf } from '../../shared/contracts/route';
import type { makePrinting as makePrintingContract, PrintingView } from '../../shared/contracts/printings';
import { paperSizes } from '../../shared/sheets/geometry';
import { largest } from '../../shared/sheets/identity';
import type { SheetPlan } from '../../shared/sheets/sheet-plan';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest, notFound } from '../errors';
import { recordAct } from './audit';
import { printJob } from './printing-job';
import { addScript, ensureScripts } from './scripts';
import { planOf, planProblem, printedItems } from './sheet-order';
import { bumpSitting, requireLockedPaper, requireSitting } from './sitting-access';

type Wanted = BodyOf<typeof makePrintingContract>;

/** Drawn regions are layout 1, so that a printed one is never taken for them. */
const firstPrintedOrdinal = 2;

function viewsOf(context: Context, sittingId: string): PrintingView[] {
  return printingsOfSitting(context.db, sittingId).map(({ printing, madeBy, layout, size, pagesEach }) => {
    const { id, paperSize, spares, state, done, of, madeAt } = printing;
    return { id, layout, paperSize, candidates: of - spares, spares, pagesEach, state, done, of, madeBy: madeBy ?? 'someone who has left', madeAt, size };
  });
}

/** A layout of its own for a printing: it is never changed, so that sheets that are out stay known. */
function storeLayout(db: Database, sittingId: string, plan: SheetPlan): { id: string; ordinal: number } {
  const ordinal = Math.max(firstPrintedOrdinal, lastLayoutOrdinal(db, sittingId) + 1);
  if (ordinal > largest.layout) throw conflict(`A sitting has room for ${largest.layout} layouts.`);
  const id = uuidv7();
  const items = new Map(draftedItems(db, sittingId).map(({ item }) => [item.number, item.id]));
  insertLayout(db, { id, sitting: sittingId, ordinal, origin: 'printed' });
  for (const { pageNo, boxes } of plan.pages) {
    saveLayoutPage(db, { layout: id, pageNo, ...paperSizes[plan.paper] });
    for (const { item, ...box } of boxes) insertBox(db, { ...box, id: uuidv7(), layout: id, pageNo, item: item === null ? null : (items.get(item) ?? null) });
  }
  return { id, ordinal };
}

/** Points the scripts of candidates without a page in to the layout, with a place for each of its pages. */
function pointScripts(db: Database, scripts: readonly { readonly id: string }[], layout: string, pages: number): void {
  for (const { id } of scripts) {
    pointScript(db, id, layout);
    dropPagesBeyond(db, id, pages);
    const known = new Set(pageNumbersOf(db, id));
    for (let pageNo = 1; pageNo <= pages; pageNo += 1) if (!known.has(pageNo)) insertPage(db, { id: uuidv7(), script: id, pageNo });
  }
}

function addSpares(db: Database, sittingId: string, layout: string, made: { readonly spares: number; readonly pages: number; readonly seq: number }): string[] {
  const items = draftedItems(db, sittingId).map(({ item }) => item.id);
  const pages = Array.from({ length: made.pages }, (_, index) => index + 1);
  const last = lastScriptNumber(db, sittingId);
  if (last + made.spares > largest.script) throw conflict(`A sitting has room for ${largest.script.toLocaleString('en-GB')} scripts.`);
  return Array.from({ length: made.spares }, (_, index) => addScript(db, { sitting: sittingId, number: last + 1 + index, layout, candidate: null, origin: 'spare' }, { pages, items, seq: made.seq }));
}

function planFor(db: Database, sittingId: string, paper: Wanted['paperSize']): SheetPlan {
  const planned = planOf(printedItems(db, sittingId), paper);
  if (!planned.ok) throw invalidRequest(planProblem(planned));
  return planned.plan;
}

/**
 * Prints answer sheets: a new layout, its boxes, a script for everyone on the class list, spare scripts, and a job that writes the
 * file. Scripts with a page in keep the layout that page was filed under, and get no new sheet.
 */
export function printFor(context: Context, actor: Actor, sittingId: string, wanted: Wanted): PrintingView {
  const { db, clock, jobs } = context;
  requireSitting(context, actor, sittingId, ['lead']);
  return inTransaction(db, () => {
    const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
    requireLockedPaper(context, sitting);
    if (isPrintingUnderWay(db, sittingId)) throw conflict('Sheets of this sitting are being made. Wait until they are done.');
    const plan = planFor(db, sittingId, wanted.paperSize);
    ensureScripts(context, sittingId);
    const scripts = printableScripts(db, sittingId).filter(({ origin }) => wanted.for === 'all' || origin !== 'printed');
    if (scripts.length + wanted.spares === 0) throw invalidRequest('There is nobody to print for. Add candidates to the class list, or ask for spare sheets.');
    const layout = storeLayout(db, sittingId, plan);
    const seq = bumpSitting(db, sittingId);
    pointScripts(db, scripts, layout.id, plan.pages.length);
    const spares = addSpares(db, sittingId, layout.id, { spares: wanted.spares, pages: plan.pages.length, seq });
    const id = uuidv7();
    insertPrinting(db, { id, sitting: sittingId, layout: layout.id, paperSize: wanted.paperSize, spares: spares.length, madeBy: actor.personId, madeAt: clock.now(), of: scripts.length + spares.length });
    for (const { id: script, candidate } of scripts) insertPrintedScript(db, { printing: id, script, candidate });
    for (const script of spares) insertPrintedScript(db, { printing: id, script, candidate: null });
    jobs.add(printJob, id, { printingId: id });
    recordAct(context, { actor: actor.personId, act: 'sheets-printed', sitting: sittingId, subject: id, after: { layout: layout.id, ordinal: layout.ordinal, ...wanted, scripts: scripts.length, pages: plan.pages.length } });
    const view = viewsOf(context, sittingId).find((one) => one.id === id);
    if (!view) throw notFound();
    return view;
  });
}

export function printingsFor(context: Context, actor: Actor, sittingId: string): PrintingView[] {
  requireSitting(context, actor, sittingId, ['lead', 'external']);
  return viewsOf(context, sittingId);
}

/** The file of a printing, once it is made. */
export function printingFileFor(context: Context, actor: Actor, printingId: string): { sha256: string; fileName: string } {
  const printing = findPrinting(context.db, printingId);
  const { sitting } = requireSitting(context, actor, printing?.sitting, ['lead']);
  if (!printing) throw notFound();
  if (printing.blob === null) throw conflict(printing.state === 'failed' ? 'This file could not be made. Print again.' : 'The sheets are still being made.');
  const layout = viewsOf(context, printing.sitting).find(({ id }) => id === printingId)?.layout ?? 0;
  return { sha256: printing.blob, fileName: `answer-sheets-${sitting.printNumber}-layout-${layout}.pdf` };
}
