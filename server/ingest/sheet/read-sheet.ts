import type { CheckOf, PageIdentity } from '../../../shared/sheets/identity';
import type { PageMm, PixelSize } from '../cutting';
import type { CodeFinder } from './codes';
import { correct, refit, type Corrected, type Evidence } from './frames';
import { fitHomography, type Homography, type Point } from './homography';
import { identify, type Identified, type PlacedCode } from './identify';
import { inkOf, type Ink } from './ink';
import type { LayoutOf, SheetBox, SheetLayout } from './layout';
import { levelsOf, type Levels } from './levels';
import { cornersOf, mapFromCodes, pairsOfCodes, type PageMap } from './page-map';
import { inverted, type Grey } from './pixels';
import { warp } from './warp';

/** All that has to be known beside the picture. */
export interface SheetQuestion {
  readonly findCodes: CodeFinder;
  readonly checkOf: CheckOf;
  readonly layoutOf: LayoutOf;
}

export interface ReadBox {
  readonly id: string;
  /** In pixels of the picture that was read: top left, top right, bottom right, bottom left of the box as printed. */
  readonly corners: readonly Point[];
  /** How many of the four sides of its frame were seen where they belong; null for a box without a frame. */
  readonly sidesConfirmed: number | null;
  /** Null for a box without a frame, where nothing says what is printed inside. */
  readonly ink: Ink | null;
  /** Part of it lies outside the picture. */
  readonly isCutOff: boolean;
}

export interface ReadPage {
  /** From millimetres on the page to pixels of the picture that was read, row by row. */
  readonly map: Homography;
  readonly residualMm: number;
  readonly page: PageMm;
  readonly boxes: readonly ReadBox[];
  readonly codes: number;
  /** Fewer than three codes were read: the position rests on the frames. */
  readonly hasFewCodes: boolean;
  readonly isBilevel: boolean;
  readonly isNegative: boolean;
}

export type Unidentified = Extract<Identified, { ok: false }>;

export type SheetReading =
  | ({ readonly state: 'unidentified' } & Omit<Unidentified, 'ok'> & { readonly identities?: readonly PageIdentity[] })
  /** The page says what it is, but its boxes cannot be placed: no such layout, codes that contradict each other, or none of its frames where the layout has them. */
  | { readonly state: 'unplaced'; readonly identity: PageIdentity; readonly codes: number; readonly reason: 'unknown-layout' | 'codes-disagree' | 'frames-not-found' }
  | ({ readonly state: 'read'; readonly identity: PageIdentity } & ReadPage);

const enoughCodes = 3;
/** A layout that is not this page's finds a side here and there; its own finds nearly all. */
const leastSidesShare = 0.5;
const inkDpi = 150;
const insetMm = 0.9;

const isOutside = ({ width, height }: PixelSize, { x, y }: Point): boolean => x < 0 || y < 0 || x > width || y > height;

/** The map of one box by its own corners. */
export const mapOfBox = (box: SheetBox, corners: readonly Point[]): Homography | null => fitHomography(cornersOf(box).flatMap((from, index) => (corners[index] ? [{ from, to: corners[index] }] : [])));

function insideOf(grey: Grey, box: SheetBox, corners: readonly Point[]): Grey | null {
  const map = mapOfBox(box, corners);
  const perMm = inkDpi / 25.4;
  const size = { width: Math.round((box.w - 2 * insetMm) * perMm), height: Math.round((box.h - 2 * insetMm) * perMm) };
  if (!map || size.width < 8 || size.height < 8) return null;
  const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0, g = 0, h = 0, i = 1] = map;
  const [x, y] = [box.x + insetMm, box.y + insetMm];
  const toSource = [a / perMm, b / perMm, a * x + b * y + c, d / perMm, e / perMm, d * x + e * y + f, g / perMm, h / perMm, g * x + h * y + i];
  return warp({ ...grey, channels: 1 }, toSource, size);
}

function inkIn(grey: Grey, { box, corners, sidesConfirmed, contrast }: Corrected, { isBilevel }: Levels): Ink {
  const inside = sidesConfirmed === 4 ? insideOf(grey, box, corners) : null;
  // Where a frame is not seen whole, what is printed round it may lie inside.
  return inside ? inkOf({ inside, pxPerMm: inkDpi / 25.4, frameContrast: contrast, isBilevel }) : 'unsure';
}

interface Registered {
  readonly map: PageMap;
  readonly boxes: readonly Corrected[];
}

/** The map of a page and its boxes, first by the codes, then by the frames; null where the frames are not where the layout has them. */
function register(evidence: Evidence, codes: readonly PlacedCode[], { page, boxes }: SheetLayout, start: PageMap): Registered | null {
  const map = refit(evidence, boxes, page, { ...start, codes: pairsOfCodes(codes, page) });
  const corrected = boxes.map((box) => correct(evidence, box, map));
  const framed = corrected.filter(({ box }) => box.isFramed);
  const sides = framed.reduce((sum, { sidesConfirmed }) => sum + sidesConfirmed, 0);
  return sides >= framed.length * 4 * leastSidesShare ? { map, boxes: corrected } : null;
}

/** Reads one picture of a page: which it is, where its boxes lie, which of them hold ink. What the evidence does not bear out is said and not guessed. */
export function readSheet(grey: Grey, { findCodes, checkOf, layoutOf }: SheetQuestion): SheetReading {
  const identified = identify(findCodes(grey), checkOf);
  if (!identified.ok) {
    const { ok: _, ...rest } = identified;
    return { state: 'unidentified', ...rest };
  }
  const { identity, codes } = identified;
  const unplaced = (reason: 'unknown-layout' | 'codes-disagree' | 'frames-not-found'): SheetReading => ({ state: 'unplaced', identity, codes: codes.length, reason });
  const layout = layoutOf(identity);
  if (!layout) return unplaced('unknown-layout');
  const start = mapFromCodes(codes, layout.page);
  if (!start) return unplaced('codes-disagree');
  const isNegative = codes.filter(({ code }) => code.isInverted).length * 2 > codes.length;
  const positive = isNegative ? inverted(grey) : grey;
  const levels = levelsOf(positive, codes);
  const found = register({ grey: positive, contrast: levels.contrast }, codes, layout, start);
  if (!found) return unplaced('frames-not-found');
  const boxes = found.boxes.map((box): ReadBox => {
    const isCutOff = box.corners.some((corner) => isOutside(grey, corner));
    const { isFramed, id } = box.box;
    return { id, corners: box.corners, sidesConfirmed: isFramed ? box.sidesConfirmed : null, ink: isFramed ? inkIn(positive, box, levels) : null, isCutOff };
  });
  const { map, residualMm } = found.map;
  return { state: 'read', identity, map, residualMm, page: layout.page, boxes, codes: codes.length, hasFewCodes: codes.length < enoughCodes, isBilevel: levels.isBilevel, isNegative };
}
