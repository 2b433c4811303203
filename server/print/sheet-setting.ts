import PDFDocument from 'pdfkit';
import type { PaperSize } from '../../shared/sheets/geometry';
import { headWidthMm, titleSizeMm, type Measure, type SheetHead } from '../../shared/sheets/sheet-face';
import { stemSizeMm, stemWidthMm, type SheetItem, type StemPiece } from '../../shared/sheets/sheet-plan';
import { ascent, fonts, linesOf, type Document, type Part } from './print-paragraph';

export const pointsPerMm = 72 / 25.4;

export interface PrintedItem {
  readonly number: number;
  readonly prompt: string;
  readonly marks: string;
}

let measuring: Document | undefined;

/** A document to measure words with; nothing is drawn on it. Kept, because reading the fonts takes longer than measuring. */
export const measuringDocument = (): Document => (measuring ??= new PDFDocument({ autoFirstPage: false }));

export const measureWith =
  (document: Document): Measure =>
  (text, fount, sizeMm) =>
    document.font(fonts[fount]).fontSize(sizeMm * pointsPerMm).widthOfString(text) / pointsPerMm;

function setIn(document: Document, roomMm: number, part: Part): StemPiece[][] {
  return linesOf(document, roomMm * pointsPerMm, [part]).map((line) =>
    line.map(({ fount, size, text, x, baseline }) => ({ fount, text, sizeMm: size / pointsPerMm, x: x / pointsPerMm, drop: (baseline - ascent * part.size) / pointsPerMm })),
  );
}

/** The items with their stems broken in lines for a paper. */
export const setItems = (document: Document, items: readonly PrintedItem[], paper: PaperSize): SheetItem[] =>
  items.map(({ number, prompt, marks }) => ({ number, marks, lines: setIn(document, stemWidthMm(paper), { fount: 'text', size: stemSizeMm * pointsPerMm, text: prompt.trim() }) }));

export const setHead = (document: Document, title: string, held: string, layout: number): SheetHead => ({
  title: setIn(document, headWidthMm, { fount: 'strong', size: titleSizeMm * pointsPerMm, text: title }),
  held,
  layout,
});
