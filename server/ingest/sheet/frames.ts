import type { PageMm } from '../cutting';
import { findSide, type FoundSide, type LookForSide } from './frame-side';
import { mapped, type Homography, type Pair, type Point } from './homography';
import type { SheetBox } from './layout';
import { cornersOf, fitRobustly, type PageMap } from './page-map';

/** What was seen of a box's frame, its sides in the order top, right, bottom, left. */
export interface SeenFrame {
  readonly box: SheetBox;
  readonly sides: readonly FoundSide[];
}

export interface Corrected {
  readonly box: SheetBox;
  readonly sidesConfirmed: number;
  /** Corners in pixels: top left, top right, bottom right, bottom left. */
  readonly corners: readonly Point[];
  readonly contrast: number;
}

export type Evidence = Pick<LookForSide, 'grey' | 'contrast'>;

/** A frame keeps its size: two opposite sides that move apart by more belong to two frames. */
const mostGrowthMm = 1.2;
const outwards: readonly Point[] = [
  { x: 0, y: -1 },
  { x: 1, y: 0 },
  { x: 0, y: 1 },
  { x: -1, y: 0 },
];

const lost: FoundSide = { isConfirmed: false, offsetMm: 0, slope: 0, contrast: 0 };

function withoutGrowth(sides: readonly FoundSide[]): FoundSide[] {
  return sides.map((side, index) => {
    const opposite = sides[(index + 2) % 4];
    return side.isConfirmed && opposite?.isConfirmed && Math.abs(side.offsetMm + opposite.offsetMm) > mostGrowthMm ? lost : side;
  });
}

function lookAt(look: LookForSide, box: SheetBox): SeenFrame {
  const corners = cornersOf(box);
  const sides = corners.map((from, index) => findSide(look, { from, to: corners[(index + 1) % 4] ?? from, outward: outwards[index] ?? from }));
  return { box, sides: withoutGrowth(sides) };
}

/** The corner between two neighbouring sides as they were seen, in millimetres of the map they were looked for with. */
function cornerSeen({ box, sides }: SeenFrame, corner: number): Point {
  const [upright, level] = corner === 0 ? [3, 0] : corner === 1 ? [1, 0] : corner === 2 ? [1, 2] : [3, 2];
  const [vertical, horizontal] = [sides[upright] ?? lost, sides[level] ?? lost];
  const place = cornersOf(box)[corner] ?? { x: 0, y: 0 };
  // Sides run clockwise: up the left one and leftwards along the lower one.
  const down = (y: number): number => (upright === 1 ? 1 : -1) * (y - box.y - box.h / 2);
  const right = (x: number): number => (level === 0 ? 1 : -1) * (x - box.x - box.w / 2);
  const out = (side: FoundSide, along: number): number => side.offsetMm + side.slope * along;
  const x = place.x + (upright === 1 ? 1 : -1) * out(vertical, down(place.y));
  const y = place.y + (level === 2 ? 1 : -1) * out(horizontal, right(x));
  return { x, y };
}

const sidesOfCorner = (corner: number): [number, number] => [(corner + 3) % 4, corner];

function pairsOfFrame(frame: SeenFrame, map: Homography): Pair[] {
  return cornersOf(frame.box).flatMap((from, corner) => {
    const [one, other] = sidesOfCorner(corner);
    if (!frame.sides[one]?.isConfirmed || !frame.sides[other]?.isConfirmed) return [];
    return [{ from, to: mapped(map, cornerSeen(frame, corner)) }];
  });
}

/** Corners of codes are seen to whole pixels only. */
const weightOfCodes = 0.4;

/** Places to look at on a side: a few to place the page, more to place the box. */
const [fewProfiles, manyProfiles] = [14, 24];

/** Fits the page to the frames it shows, with codes as further points. */
export function refit(evidence: Evidence, boxes: readonly SheetBox[], page: PageMm, start: PageMap & { readonly codes: readonly Pair[] }): PageMap {
  const isRough = start.model === 'similarity';
  const first: LookForSide = { ...evidence, map: start.map, reachMm: isRough ? 6 : 3, slantMm: isRough ? 0.8 : 0.6, mostProfiles: fewProfiles };
  const frames = boxes.filter(({ isFramed }) => isFramed).map((box) => lookAt(first, box));
  const pairs = frames.flatMap((frame) => pairsOfFrame(frame, start.map));
  if (pairs.length < 4) return start;
  return fitRobustly([...pairs, ...start.codes.map((pair) => ({ ...pair, weight: weightOfCodes }))], page, start);
}

/** A box where its own sides stand; a side that cannot be seen is where the page puts it. */
export function correct(evidence: Evidence, box: SheetBox, page: PageMap): Corrected {
  if (!box.isFramed) return { box, sidesConfirmed: 0, corners: cornersOf(box).map((corner) => mapped(page.map, corner)), contrast: 0 };
  const frame = lookAt({ ...evidence, map: page.map, reachMm: 2, slantMm: 0.6, mostProfiles: manyProfiles }, box);
  const confirmed = frame.sides.filter(({ isConfirmed }) => isConfirmed);
  const corners = cornersOf(box).map((_, corner) => mapped(page.map, cornerSeen(frame, corner)));
  const contrast = confirmed.reduce((sum, side) => sum + side.contrast, 0) / Math.max(1, confirmed.length);
  return { box, sidesConfirmed: confirmed.length, corners, contrast };
}
