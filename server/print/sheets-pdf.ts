import { createWriteStream } from 'node:fs';
import { setImmediate as nextTurn } from 'node:timers/promises';
import { finished } from 'node:stream/promises';
import PDFDocument from 'pdfkit';
import { codePlaces, frameLineMm, paperSizes, type PaperSize } from '../../shared/sheets/geometry';
import { composeCode, type CheckOf } from '../../shared/sheets/identity';
import { pageFace, type SheetOwner, type Sheets } from '../../shared/sheets/sheet-face';
import { planSheets, type PlannedPage } from '../../shared/sheets/sheet-plan';
import { darkRuns, rectOfRun } from './code-modules';
import { fonts, type Document } from './print-paragraph';
import { measureWith, measuringDocument, pointsPerMm, setHead, setItems, type PrintedItem } from './sheet-setting';
import { checkWith } from './sheet-check';

/** All that a printing needs: plain values, so that another thread can do it. */
export interface SheetOrder {
  readonly path: string;
  readonly paper: PaperSize;
  readonly sitting: number;
  readonly layout: number;
  readonly title: string;
  readonly held: string;
  readonly items: readonly PrintedItem[];
  readonly owners: readonly SheetOwner[];
  readonly secret: string;
  readonly madeAt: number;
}

const workingLineColour = '#b3bcb9';
const workingLineWidthMm = 0.18;
/** What may wait in memory for the disk. */
const mostWaitingBytes = 1 << 18;

function drawFace(document: Document, sheets: Sheets, page: PlannedPage, owner: SheetOwner): void {
  const { words, lines } = pageFace(sheets, page, owner);
  document.lineWidth(workingLineWidthMm).strokeColor(workingLineColour);
  for (const { x1, x2, y } of lines) document.moveTo(x1, y).lineTo(x2, y);
  if (lines.length > 0) document.stroke();
  document.lineWidth(frameLineMm).strokeColor('#000');
  for (const { use, x, y, w, h } of page.boxes) if (use !== 'working') document.rect(x, y, w, h);
  document.stroke().fillColor('#000');
  for (const { fount, sizeMm, text, x, y, side } of words) {
    const set = document.font(fonts[fount]).fontSize(sizeMm);
    set.text(text, side === 'left' ? x : x - set.widthOfString(text), y, { lineBreak: false, baseline: 'alphabetic' });
  }
}

interface Numbers {
  readonly order: Pick<SheetOrder, 'sitting' | 'layout' | 'paper'>;
  readonly checkOf: CheckOf;
}

function drawCodes(document: Document, { order, checkOf }: Numbers, page: number, script: number): void {
  for (const at of codePlaces(paperSizes[order.paper])) {
    const digits = composeCode({ sitting: order.sitting, layout: order.layout, script, page, place: at.place }, checkOf);
    for (const run of darkRuns(digits)) {
      const { x, y, w, h } = rectOfRun(run, at);
      document.rect(x, y, w, h);
    }
  }
  document.fill('#000');
}

function sheetsOf({ items, paper, title, held, layout }: SheetOrder): Sheets {
  const document = measuringDocument();
  const planned = planSheets(setItems(document, items, paper), paper);
  if (!planned.ok) throw new Error(`The sheets cannot be planned: ${planned.reason}.`);
  return { plan: planned.plan, head: setHead(document, title, held, layout), measure: measureWith(document) };
}

/** Writes the sheets of all owners into one PDF, page by page; `onDone` is told after each owner how many are in. */
export async function writeSheets(order: SheetOrder, onDone: (done: number) => void): Promise<void> {
  const sheets = sheetsOf(order);
  const { widthMm, heightMm } = paperSizes[order.paper];
  const numbers: Numbers = { order, checkOf: checkWith(order.secret) };
  const at = new Date(order.madeAt);
  const document = new PDFDocument({ autoFirstPage: false, bufferPages: false, margin: 0, size: [widthMm * pointsPerMm, heightMm * pointsPerMm], info: { Title: `${order.title}: answer sheets`, Producer: 'Meniscus', Creator: 'Meniscus', CreationDate: at, ModDate: at } });
  const file = createWriteStream(order.path);
  const written = finished(file);
  // Awaited below; until then a failure waits there instead of ending the process.
  written.catch(() => undefined);
  document.pipe(file);
  try {
    for (const [index, owner] of order.owners.entries()) {
      for (const page of sheets.plan.pages) {
        // Everything below is in millimetres.
        document.addPage().scale(pointsPerMm);
        drawFace(document, sheets, page, owner);
        drawCodes(document, numbers, page.pageNo, owner.script);
      }
      do await nextTurn();
      while (!file.destroyed && (file.pending || document.readableLength + file.writableLength > mostWaitingBytes));
      if (file.destroyed) break;
      onDone(index + 1);
    }
    document.end();
    await written;
  } finally {
    file.destroy();
  }
}
