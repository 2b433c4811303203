import { codeInsetMm, codeSideMm, paperSizes } from './geometry';
import { answerLeftMm, labelSizeMm, numberLabelY, sideMarginMm, stemIndentMm, stemLineMm, stemSizeMm, workingLineMm, type Fount, type PlannedBlock, type PlannedBox, type PlannedPage, type SheetPlan, type StemPiece } from './sheet-plan';

/** Words on a page, set on a base line; at the right, x is where they end. Lengths in millimetres. */
export interface FaceWord {
  readonly fount: Fount;
  readonly sizeMm: number;
  readonly text: string;
  readonly x: number;
  readonly y: number;
  readonly side: 'left' | 'right';
}

export interface FaceLine {
  readonly x1: number;
  readonly x2: number;
  readonly y: number;
}

export interface PageFace {
  readonly words: readonly FaceWord[];
  /** Faint lines to work on. */
  readonly lines: readonly FaceLine[];
}

/** How wide words are, in millimetres. */
export type Measure = (text: string, fount: Fount, sizeMm: number) => number;

export interface SheetHead {
  /** Course and title of the sitting, broken in lines no wider than headWidthMm. */
  readonly title: readonly (readonly StemPiece[])[];
  readonly held: string;
  readonly layout: number;
}

/** What all candidates' sheets of one printing have in common. */
export interface Sheets {
  readonly plan: SheetPlan;
  readonly head: SheetHead;
  readonly measure: Measure;
}

export interface SheetOwner {
  /** Null on a spare sheet. */
  readonly candidateNumber: string | null;
  readonly script: number;
}

const codeRightMm = codeInsetMm + codeSideMm;
const bandTextLeftMm = 30;
const detailSizeMm = 2.9;
const titleLineMm = 4.9;
const mostTitleLines = 2;
export const titleSizeMm = 3.9;
/** Between the quiet zones of a corner code and the one at the middle of the edge. */
export const headWidthMm = 62;

/** Numerals and capitals that are told apart when read aloud: as many digits as the code has room for. */
export const scriptText = (script: number): string => `script ${String(script).padStart(5, '0')}`;

const left = (x: number, y: number, sizeMm: number, text: string, fount: Fount = 'text'): FaceWord => ({ fount, sizeMm, text, x, y, side: 'left' });
const right = (x: number, y: number, sizeMm: number, text: string, fount: Fount = 'text'): FaceWord => ({ fount, sizeMm, text, x, y, side: 'right' });

/** Words no wider than the room, smaller where they must be. */
function fitted(word: FaceWord, roomMm: number, measure: Measure): FaceWord {
  const width = measure(word.text, word.fount, word.sizeMm);
  return width <= roomMm ? word : { ...word, sizeMm: (word.sizeMm * roomMm) / width };
}

const setLines = (lines: readonly (readonly StemPiece[])[], x: number, y: number, pitch: number): FaceWord[] =>
  lines.flatMap((line, index) => line.map((piece) => left(x + piece.x, y + index * pitch + piece.drop, piece.sizeMm, piece.text, piece.fount)));

function topBand({ plan: { paper, pages }, head, measure }: Sheets, pageNo: number, owner: SheetOwner): FaceWord[] {
  const edge = paperSizes[paper].widthMm - bandTextLeftMm;
  const title = head.title.slice(0, mostTitleLines);
  const first = title.length > 1 ? 12.2 : 14;
  return [
    ...setLines(title, bandTextLeftMm, first, titleLineMm),
    left(bandTextLeftMm, first + title.length * titleLineMm, detailSizeMm, head.held),
    fitted(right(edge, 14, 4.2, owner.candidateNumber ?? 'spare sheet', 'value'), headWidthMm, measure),
    right(edge, 18.9, detailSizeMm, scriptText(owner.script), 'value'),
    right(edge, 22.8, detailSizeMm, `page ${pageNo} of ${pages.length}`),
  ];
}

const listed = (numbers: readonly number[]): string => {
  const [first, last] = [numbers[0], numbers.at(-1)];
  if (numbers.length < 2) return `Item ${first} is`;
  return numbers.length === 2 ? `Items ${first} and ${last} are` : `Items ${first} to ${last} are`;
};

function bottomBand({ paper, pages }: SheetPlan, page: PlannedPage, head: SheetHead): FaceWord[] {
  const { widthMm, heightMm } = paperSizes[paper];
  const [upper, lower] = [heightMm - codeRightMm + 5.6, heightMm - codeRightMm + 9.9];
  const isFront = page.pageNo % 2 === 1;
  const next = pages[page.pageNo];
  const items = next?.blocks.filter(({ isMoreWorking }) => !isMoreWorking).map(({ item }) => item.number) ?? [];
  const place = isFront ? 'on the back.' : 'on the next sheet.';
  const after = items.length > 0 ? `${listed(items)} ${place}` : next ? 'There is room to work on the back.' : 'This is the last page.';
  return [
    left(bandTextLeftMm, upper, detailSizeMm, after),
    left(bandTextLeftMm, lower, detailSizeMm, 'Nothing outside the boxes is read as an answer.'),
    right(widthMm - bandTextLeftMm, upper, detailSizeMm, `layout ${head.layout}`),
    right(widthMm - bandTextLeftMm, lower, detailSizeMm, `page ${page.pageNo} of ${pages.length}${isFront ? ', turn over' : ''}`),
  ];
}

/** Whose sheet it is and how to fill it in, beside the box for the candidate number. */
function firstPageHead({ paper }: SheetPlan, { candidateNumber }: SheetOwner, measure: Measure): FaceWord[] {
  const rules = candidateNumber === null ? ['Write your number in the box.'] : ['Check that it is your number.'];
  const room = candidateNumber === null ? 'Spare' : candidateNumber;
  return [
    left(sideMarginMm, numberLabelY + 1.9, 3.3, candidateNumber === null ? 'This sheet belongs to nobody yet' : 'This sheet belongs to candidate'),
    fitted(left(sideMarginMm, numberLabelY + 13.6, 11, room, candidateNumber === null ? 'strong' : 'value'), 42, measure),
    ...[...rules, 'One answer a box, in pen. To change it,', 'cross it out and write again in the box.'].map((text, index) => left(sideMarginMm + 46, numberLabelY + 6 + index * 3.8, 2.75, text)),
    left(answerLeftMm(paper), numberLabelY, labelSizeMm, 'Write your candidate number here'),
  ];
}

function blockWords({ paper }: SheetPlan, { item, isMoreWorking, stemY, labelY }: PlannedBlock): FaceWord[] {
  if (isMoreWorking) return [left(sideMarginMm, stemY, labelSizeMm, `More room to work on item ${item.number}. The answer goes into its box.`)];
  return [
    left(sideMarginMm, stemY, stemSizeMm, String(item.number), 'strong'),
    ...setLines(item.lines, sideMarginMm + stemIndentMm, stemY, stemLineMm),
    right(paperSizes[paper].widthMm - sideMarginMm, stemY, stemSizeMm, `[${item.marks}]`),
    left(sideMarginMm, labelY, labelSizeMm, 'Working'),
    left(answerLeftMm(paper), labelY, labelSizeMm, `Answer ${item.number}`),
  ];
}

/** Ruled from the foot of the box upwards, so that the lowest line stands level with the answer's frame. */
function workingLines({ x, y, w, h }: PlannedBox): FaceLine[] {
  return Array.from({ length: Math.floor(h / workingLineMm) }, (_, index) => ({ x1: x, x2: x + w, y: y + h - index * workingLineMm }));
}

/** What is printed on one page beside its frames and codes. */
export function pageFace({ plan, head, measure }: Sheets, page: PlannedPage, owner: SheetOwner): PageFace {
  const words = [
    ...topBand({ plan, head, measure }, page.pageNo, owner),
    ...(page.pageNo === 1 ? firstPageHead(plan, owner, measure) : []),
    ...page.blocks.flatMap((block) => blockWords(plan, block)),
    ...bottomBand(plan, page, head),
  ];
  return { words, lines: page.boxes.filter(({ use }) => use === 'working').flatMap(workingLines) };
}
