/** The printed answer paper of the demo: A4, two pages, six items each. All lengths in mm from the page's top left corner. */
export const PAGE_WIDTH_MM = 210;
export const PAGE_HEIGHT_MM = 297;
export const ITEMS_PER_PAGE = 6;
export const FRAME_MM = 0.35;

/** Kept empty in each corner, and round the middle of the top and bottom edge, for codes that may be printed there. */
export const CORNER_MM = 27;
export const MID_EDGE_MM = 20;

export const LEFT_MM = 20;
export const RIGHT_MM = 190;

const FIRST_PROMPT_BASELINE_MM = 54;
const ITEM_PITCH_MM = 36;
const ANSWER_X_MM = 128;
const ANSWER_TOP_MM = 9.6;
const ANSWER_HEIGHT_MM = 19.6;
const WORKING_WIDTH_MM = 100;
const WORKING_TOP_MM = 7.4;
const WORKING_LINES_MM = [12.4, 18, 23.6, 29.2] as const;

export interface SheetBox {
  readonly itemNumber: number;
  readonly pageNo: number;
  readonly use: 'answer' | 'working';
  readonly x: number;
  readonly y: number;
  readonly w: number;
  readonly h: number;
}

/** Where the parts of one item stand. */
export interface ItemPlace {
  readonly promptBaseline: number;
  readonly workingLabelBaseline: number;
  readonly answerLabelBaseline: number;
  /** The ruled lines, top to bottom. */
  readonly lines: readonly number[];
  readonly answer: SheetBox;
  readonly working: SheetBox;
}

export const pageCount = (itemCount: number): number => Math.ceil(itemCount / ITEMS_PER_PAGE);

export const pageOfItem = (itemNumber: number): number => Math.ceil(itemNumber / ITEMS_PER_PAGE);

export function placeOfItem(itemNumber: number): ItemPlace {
  const top = FIRST_PROMPT_BASELINE_MM + ((itemNumber - 1) % ITEMS_PER_PAGE) * ITEM_PITCH_MM;
  const pageNo = pageOfItem(itemNumber);
  const lines = WORKING_LINES_MM.map((line) => hundredths(top + line));
  return {
    promptBaseline: top,
    workingLabelBaseline: top + 6.2,
    answerLabelBaseline: top + 6.8,
    lines,
    answer: {
      itemNumber,
      pageNo,
      use: 'answer',
      x: ANSWER_X_MM,
      y: hundredths(top + ANSWER_TOP_MM),
      w: RIGHT_MM - ANSWER_X_MM,
      h: ANSWER_HEIGHT_MM,
    },
    working: {
      itemNumber,
      pageNo,
      use: 'working',
      x: LEFT_MM,
      y: hundredths(top + WORKING_TOP_MM),
      w: WORKING_WIDTH_MM,
      h: 23.4,
    },
  };
}

/** Every box of a paper, in item order: what a drawn layout stores. */
export const sheetBoxes = (itemCount: number): readonly SheetBox[] =>
  Array.from({ length: itemCount }, (_, index) => placeOfItem(index + 1)).flatMap((place) => [place.answer, place.working]);

/** Binary floats make 63.6 of 54 + 9.6 come out as 63.60000000000001. */
const hundredths = (mm: number): number => Math.round(mm * 100) / 100;
