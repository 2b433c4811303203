/** All lengths in millimetres from the top left of the page, y downwards. */
export interface Rect {
  readonly x: number;
  readonly y: number;
  readonly w: number;
  readonly h: number;
}

export interface PageSize {
  readonly widthMm: number;
  readonly heightMm: number;
}

/** A4 as in ISO 216; US Letter is 8.5 by 11 inches. */
export const paperSizes = {
  a4: { widthMm: 210, heightMm: 297 },
  letter: { widthMm: 215.9, heightMm: 279.4 },
} as const satisfies Record<string, PageSize>;
export type PaperSize = keyof typeof paperSizes;

/** QR Code version 2 (ISO/IEC 18004: 25 modules a side) at level H. */
export const codeVersion = 2;
export const codeLevel = 'H';
export const codeModules = 25;
export const codeSideMm = 15;
export const moduleMm = codeSideMm / codeModules;
/** From the edge of the paper to the symbol. */
export const codeInsetMm = 9;
/** Four modules, as the standard asks: nothing is printed there. */
export const quietZoneMm = 4 * moduleMm;

/** The line of a frame; a box is measured along the middle of its line. Boxes for working have no frame. */
export const frameLineMm = 0.35;
/** Clear paper between the lines of two frames. */
export const clearBetweenFramesMm = 8;
/** Text nearer to a frame than this would count as ink. */
export const clearOfTextMm = 2;
export const unprintableMarginMm = 5;
/** The bands along the top and the bottom edge that belong to the codes: inset, symbol, quiet zone and a rest. */
export const codeBandMm = 27;

export interface CodePlace extends Rect {
  /** 1 top left, 2 top middle, 3 top right, 4 bottom left, 5 bottom middle, 6 bottom right. */
  readonly place: number;
}

/** The six symbols of a page without their quiet zones, in the order of their place numbers. */
export function codePlaces({ widthMm, heightMm }: PageSize): CodePlace[] {
  const columns = [codeInsetMm, (widthMm - codeSideMm) / 2, widthMm - codeInsetMm - codeSideMm];
  const rows = [codeInsetMm, heightMm - codeInsetMm - codeSideMm];
  return rows.flatMap((y, row) => columns.map((x, column) => ({ place: row * 3 + column + 1, x, y, w: codeSideMm, h: codeSideMm })));
}

/** A rectangle grown by the same length on all sides. */
export const grown = ({ x, y, w, h }: Rect, by: number): Rect => ({ x: x - by, y: y - by, w: w + 2 * by, h: h + 2 * by });

export const overlap = (a: Rect, b: Rect): boolean => a.x < b.x + b.w && b.x < a.x + a.w && a.y < b.y + b.h && b.y < a.y + a.h;

/**
 * Where filing holes may be punched, on both long edges because a sheet has two sides: two holes 12 mm in and 80 mm apart (ISO 838),
 * and for US Letter also three holes 108 mm (4¼ inches) apart, common practice; a hole is taken as 7 mm wide with 1 mm to spare.
 */
export function punchZones({ widthMm, heightMm }: PageSize): Rect[] {
  const reach = 4.5;
  const heights = [-40, 40, -108, 0, 108].map((offset) => heightMm / 2 + offset);
  return [12, widthMm - 12].flatMap((x) => heights.map((y) => ({ x: x - reach, y: y - reach, w: 2 * reach, h: 2 * reach })));
}

/** Where no box may reach: codes with their quiet zones, 27 mm corners, 20 mm round the mid-edge codes, punch zones, the edge printers leave white. */
export function keepOutZones(page: PageSize): Rect[] {
  const { widthMm, heightMm } = page;
  const edge = unprintableMarginMm;
  const corners = [0, widthMm - codeBandMm].flatMap((x) => [0, heightMm - codeBandMm].map((y) => ({ x, y, w: codeBandMm, h: codeBandMm })));
  const middles = [0, heightMm - codeBandMm].map((y) => ({ x: widthMm / 2 - 10, y, w: 20, h: codeBandMm }));
  const edges = [
    { x: 0, y: 0, w: widthMm, h: edge },
    { x: 0, y: heightMm - edge, w: widthMm, h: edge },
    { x: 0, y: 0, w: edge, h: heightMm },
    { x: widthMm - edge, y: 0, w: edge, h: heightMm },
  ];
  return [...codePlaces(page).map((place) => grown(place, quietZoneMm)), ...corners, ...middles, ...punchZones(page), ...edges];
}
