import { clearBetweenFramesMm, clearOfTextMm, codeBandMm, frameLineMm, paperSizes, type PaperSize, type Rect } from './geometry';

export type Fount = 'text' | 'strong' | 'value' | 'symbol';

/** A piece of a printed line: `x` from the left of the line, `drop` below its base line; lengths in millimetres. */
export interface StemPiece {
  readonly fount: Fount;
  readonly sizeMm: number;
  readonly text: string;
  readonly x: number;
  readonly drop: number;
}

export interface SheetItem {
  readonly number: number;
  /** The marks as printed, without brackets. */
  readonly marks: string;
  /** The stem, broken in lines no wider than stemWidthMm. */
  readonly lines: readonly (readonly StemPiece[])[];
}

export interface PlannedBox extends Rect {
  readonly use: 'answer' | 'working' | 'number';
  /** The number of the item; null for the box of the candidate number. */
  readonly item: number | null;
}

export interface PlannedBlock {
  readonly item: SheetItem;
  /** Only room to work on, for an item that stands on the page before. */
  readonly isMoreWorking: boolean;
  /** Base line of the stem's first line, and of the labels over the boxes. */
  readonly stemY: number;
  readonly labelY: number;
}

export interface PlannedPage {
  readonly pageNo: number;
  readonly boxes: readonly PlannedBox[];
  readonly blocks: readonly PlannedBlock[];
}

export interface SheetPlan {
  readonly paper: PaperSize;
  readonly pages: readonly PlannedPage[];
}

export type Planned = { readonly ok: true; readonly plan: SheetPlan } | { readonly ok: false; readonly item: number | null; readonly reason: 'no-items' | 'stem-too-long' | 'too-many-pages' };

/** A double-sided sheet holds twelve boxes, six a side. */
export const mostBoxesOfPage = 6;
export const mostPages = 98;

/** From both side edges to what is printed between the codes: clear of punched holes. */
export const sideMarginMm = 20;
export const answerWidthMm = 62;
export const stemSizeMm = 3.88;
export const stemLineMm = 5.1;
export const stemIndentMm = 6;
export const numberBoxHeightMm = 12;
export const labelSizeMm = 3;
/** Between two ruled lines to work on. */
export const workingLineMm = 6.5;

const marksRoomMm = 14;
const leastAnswerMm = 15;
const mostAnswerMm = 22;
const mostWorkingMm = 70;

/** Descent of a label, the clear paper under it and half the line of the frame. */
const labelToBoxMm = 0.9 + clearOfTextMm + frameLineMm / 2;
const stemToLabelMm = 5.2;
const gapToStemMm = clearOfTextMm + frameLineMm / 2 + stemSizeMm + 1.4;
const headLabelMm = codeBandMm + 2.6;
const headBottomMm = headLabelMm + labelToBoxMm + numberBoxHeightMm;

export const contentWidthMm = (paper: PaperSize): number => paperSizes[paper].widthMm - 2 * sideMarginMm;
export const stemWidthMm = (paper: PaperSize): number => contentWidthMm(paper) - stemIndentMm - marksRoomMm;
export const answerLeftMm = (paper: PaperSize): number => paperSizes[paper].widthMm - sideMarginMm - answerWidthMm;
/** Base line of the words over the box for the candidate number. */
export const numberLabelY = headLabelMm;

const overheadOf = ({ lines }: SheetItem): number => gapToStemMm + Math.max(0, lines.length - 1) * stemLineMm + stemToLabelMm + labelToBoxMm;

/** Where the lowest frame may end, so that its line stays out of the band of the codes. */
const footOf = (paper: PaperSize): number => paperSizes[paper].heightMm - codeBandMm - 1;
const topOf = (pageNo: number): number => (pageNo === 1 ? headBottomMm : codeBandMm);
const roomOf = (paper: PaperSize, pageNo: number): number => footOf(paper) - topOf(pageNo);

/** Items page by page: as many as fit, six at most; null when a stem leaves no room for its box on a page of its own. */
function shared(items: readonly SheetItem[], paper: PaperSize): SheetItem[][] | SheetItem {
  const pages: SheetItem[][] = [[]];
  let left = roomOf(paper, 1);
  for (const item of items) {
    const need = overheadOf(item) + leastAnswerMm;
    const open = pages.at(-1) ?? [];
    if (open.length === mostBoxesOfPage || need > left) {
      if (open.length === 0 && pages.length > 1) return item;
      pages.push([]);
      left = roomOf(paper, pages.length);
    }
    if (need > left) return item;
    pages.at(-1)?.push(item);
    left -= need;
  }
  return pages;
}

/** Sheets have two sides: items of an odd last page are spread over both sides; a lone one keeps the back for more working. */
function onBothSides(pages: readonly SheetItem[][]): SheetItem[][] {
  if (pages.length % 2 === 0) return [...pages];
  const last = pages.at(-1) ?? [];
  const front = Math.ceil(last.length / 2);
  return [...pages.slice(0, -1), last.slice(0, front), last.slice(front)];
}

function blocksOf(items: readonly SheetItem[], paper: PaperSize, pageNo: number): Pick<PlannedPage, 'boxes' | 'blocks'> {
  const boxes: PlannedBox[] = [];
  const blocks: PlannedBlock[] = [];
  const overheads = items.reduce((sum, item) => sum + overheadOf(item), 0);
  const working = Math.min(mostWorkingMm, (roomOf(paper, pageNo) - overheads) / items.length);
  const x = answerLeftMm(paper);
  let top = topOf(pageNo);
  for (const item of items) {
    const y = top + overheadOf(item);
    blocks.push({ item, isMoreWorking: false, stemY: top + gapToStemMm, labelY: y - labelToBoxMm });
    boxes.push(
      { use: 'working', item: item.number, x: sideMarginMm, y, w: x - clearBetweenFramesMm - sideMarginMm, h: working },
      { use: 'answer', item: item.number, x, y, w: answerWidthMm, h: Math.min(mostAnswerMm, working) },
    );
    top = y + working;
  }
  return { boxes, blocks };
}

function moreWorking(item: SheetItem, paper: PaperSize): Pick<PlannedPage, 'boxes' | 'blocks'> {
  const stemY = codeBandMm + gapToStemMm;
  const y = stemY + labelToBoxMm + 2;
  const box: PlannedBox = { use: 'working', item: item.number, x: sideMarginMm, y, w: contentWidthMm(paper), h: footOf(paper) - y };
  return { boxes: [box], blocks: [{ item, isMoreWorking: true, stemY, labelY: stemY }] };
}

const numberBox = (paper: PaperSize): PlannedBox => ({ use: 'number', item: null, x: answerLeftMm(paper), y: numberLabelY + labelToBoxMm, w: answerWidthMm, h: numberBoxHeightMm });

/**
 * Where everything of one candidate's answer sheets stands. The number of pages is even and follows from the items and the paper alone;
 * boxes are measured along the middle of their frame's line, and boxes for working have no frame.
 */
export function planSheets(items: readonly SheetItem[], paper: PaperSize): Planned {
  if (items.length === 0) return { ok: false, item: null, reason: 'no-items' };
  const greedy = shared(items, paper);
  if (!Array.isArray(greedy)) return { ok: false, item: greedy.number, reason: 'stem-too-long' };
  const spread = onBothSides(greedy);
  if (spread.length > mostPages) return { ok: false, item: null, reason: 'too-many-pages' };
  const pages = spread.map((own, index): PlannedPage => {
    const pageNo = index + 1;
    const before = spread[index - 1]?.at(-1);
    const content = own.length === 0 && before ? moreWorking(before, paper) : blocksOf(own, paper, pageNo);
    return { pageNo, blocks: content.blocks, boxes: pageNo === 1 ? [numberBox(paper), ...content.boxes] : content.boxes };
  });
  return { ok: true, plan: { paper, pages } };
}
