import { frameLineMm } from '../../../shared/sheets/geometry';
import { pageFace, type Measure, type PageFace, type SheetHead, type SheetOwner } from '../../../shared/sheets/sheet-face';
import type { Fount, PlannedPage, SheetPlan } from '../../../shared/sheets/sheet-plan';
import type { Hand } from '../truth/hands';
import { randomFrom } from '../truth/random';
import type { WrittenAnswer } from '../truth/written';
import { answerInk } from './answer-ink';
import { handwritten, inkSvg } from './handwriting';
import { outline, type PrintFont } from './outlines';
import { inkedWords } from './printed';
import { onTheGlass, scanned, scanPose } from './scan';
import type { ItemPlace } from './sheet-layout';

const founts: Readonly<Record<Fount, PrintFont>> = { text: 'regular', strong: 'semibold', value: 'mono', symbol: 'serif-italic' };
const workingRule = '#b3bcb9';

/** How wide words are in the outlines that draw them. */
const measure: Measure = (text, fount, sizeMm) => [...text].reduce((sum, character) => sum + outline(founts[fount], character).advance * sizeMm, 0);

/** What the press puts on one candidate's page. */
export interface CodedSheet {
  readonly plan: SheetPlan;
  readonly head: SheetHead;
}

export interface CodedPageSpec {
  readonly seed: string;
  readonly sheet: CodedSheet;
  readonly pageNo: number;
  readonly owner: SheetOwner & { readonly candidateNumber: string };
  /** Path data of the dark modules of its six codes, in millimetres. */
  readonly codes: string;
  readonly hand: Hand;
  readonly answers: readonly WrittenAnswer[];
  /** What the candidate wrote in the box for the own number; null for nothing. */
  readonly ownNumber: string | null;
}

function printedFace({ words, lines }: PageFace, page: PlannedPage, codes: string): string {
  const rules = lines.map(({ x1, x2, y }) => `M${x1} ${y}H${x2}`).join('');
  const frames = page.boxes.filter(({ use }) => use !== 'working').map(({ x, y, w, h }) => `M${x} ${y}h${w}v${h}h${-w}Z`).join('');
  return [
    inkedWords(words.map(({ text, fount, sizeMm, x, y, side }) => ({ text, font: founts[fount], sizeMm, x, baseline: y, align: side }))),
    `<path fill="none" stroke="${workingRule}" stroke-width="0.18" d="${rules}"/>`,
    `<path fill="none" stroke="#000" stroke-width="${frameLineMm}" d="${frames}"/>`,
    `<path fill="#000" d="${codes}"/>`,
  ].join('');
}

/** Where a candidate writes for one item on a planned page. */
function placeOn(page: PlannedPage, itemNumber: number, face: PageFace): ItemPlace | null {
  const box = (use: 'answer' | 'working') => page.boxes.find((one) => one.use === use && one.item === itemNumber);
  const [answer, working] = [box('answer'), box('working')];
  if (!answer || !working) return null;
  const lines = face.lines.filter(({ x1, y }) => x1 === working.x && y > working.y && y <= working.y + working.h).map(({ y }) => y).sort((one, other) => one - other);
  const own = { itemNumber, pageNo: page.pageNo };
  return { promptBaseline: 0, workingLabelBaseline: 0, answerLabelBaseline: 0, lines, answer: { ...own, ...answer, use: 'answer' }, working: { ...own, ...working, use: 'working' } };
}

function numberInk({ seed, owner, hand, ownNumber }: CodedPageSpec, page: PlannedPage): string {
  const box = page.boxes.find(({ use }) => use === 'number');
  if (!box || ownNumber === null) return '';
  const random = randomFrom(seed, 'own number', owner.candidateNumber);
  const digitMm = Math.min(7, hand.digitMm * 0.85);
  const x = box.x + random.between(4, 10);
  return inkSvg(handwritten({ hand, random }, { text: ownNumber, x, baseline: box.y + (box.h + digitMm) / 2 - random.between(0, 0.8), digitMm, maxWidth: box.x + box.w - x - 3 }), hand, 0.95);
}

/** One page of a printed answer sheet as it comes from the scanner, with what the candidate wrote: JPEG, 1240 by 1754, colour. */
export function drawCodedPage(spec: CodedPageSpec): Promise<Buffer> {
  const { seed, sheet, pageNo, owner, codes, hand, answers } = spec;
  const page = sheet.plan.pages[pageNo - 1];
  if (!page) throw new Error(`The sheet has no page ${pageNo}.`);
  const face = pageFace({ ...sheet, measure }, page, owner);
  const ink = answers.map((answer) => {
    const place = placeOn(page, answer.itemNumber, face);
    return place ? answerInk(answer, hand, randomFrom(seed, 'ink', owner.candidateNumber, answer.itemNumber), place) : '';
  });
  const drawn = printedFace(face, page, codes) + numberInk(spec, page) + ink.join('');
  return scanned(onTheGlass(scanPose(seed, owner.candidateNumber, pageNo), drawn), randomFrom(seed, 'scan', owner.candidateNumber, pageNo));
}
