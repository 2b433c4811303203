import { codePlaces } from '../../../shared/sheets/geometry';
import type { PageMm } from '../cutting';
import { depthAt, fitHomography, fitSimilarity, mapped, rmsOf, scaleAt, type Homography, type Pair, type Point } from './homography';
import type { PlacedCode } from './identify';

/** A map from millimetres on the page to pixels, with how far its own evidence lies from it. */
export interface PageMap {
  readonly map: Homography;
  readonly residualMm: number;
  readonly model: 'homography' | 'similarity';
}

/** With fewer, or all on one edge, a homography would be free to swing. */
const codesForHomography = 3;
/** What lens and waved paper leave; more means that the codes were not printed on one sheet. */
const mostResidualMm = { homography: 4, similarity: 12 } as const;
/** Between the most and the least magnified corner of a page seen aslant. */
const mostScaleRatio = 3;

export const cornersOf = ({ x, y, w, h }: { x: number; y: number; w: number; h: number }): [Point, Point, Point, Point] => [
  { x, y },
  { x: x + w, y },
  { x: x + w, y: y + h },
  { x, y: y + h },
];

/** Where on the paper the corners of the codes stand, and where they were seen. */
export function pairsOfCodes(codes: readonly PlacedCode[], page: PageMm): Pair[] {
  const places = new Map(codePlaces(page).map((place) => [place.place, place]));
  return codes.flatMap(({ place, code }) => {
    const printed = places.get(place);
    return printed ? cornersOf(printed).flatMap((from, index): Pair[] => (code.corners[index] ? [{ from, to: code.corners[index] }] : [])) : [];
  });
}

const isOnOneEdge = (codes: readonly PlacedCode[]): boolean => new Set(codes.map(({ place }) => place <= 3)).size < 2;

/** Whether a map can be a picture of the whole page: nowhere behind the eye, and no corner magnified out of proportion. */
export function isPicture(map: Homography, { widthMm, heightMm }: PageMm): boolean {
  const corners = cornersOf({ x: 0, y: 0, w: widthMm, h: heightMm });
  if (!corners.every((corner) => depthAt(map, corner) > 0)) return false;
  const scales = corners.map((corner) => scaleAt(map, corner));
  return Math.min(...scales) > 0 && Math.max(...scales) / Math.min(...scales) <= mostScaleRatio;
}

/** The map that the codes give by themselves; null where they contradict each other. */
export function mapFromCodes(codes: readonly PlacedCode[], page: PageMm): PageMap | null {
  const pairs = pairsOfCodes(codes, page);
  const model = codes.length >= codesForHomography && !isOnOneEdge(codes) ? 'homography' : 'similarity';
  const map = model === 'homography' ? fitHomography(pairs) : fitSimilarity(pairs);
  if (!map || !isPicture(map, page)) return null;
  const residualMm = rmsOf(map, pairs) / scaleAt(map, { x: page.widthMm / 2, y: page.heightMm / 2 });
  return residualMm <= mostResidualMm[model] ? { map, residualMm, model } : null;
}

/** Whether points reach over enough of the page for a homography. */
function isSpread(pairs: readonly Pair[], { widthMm, heightMm }: PageMm): boolean {
  const spanOf = (values: readonly number[]): number => Math.max(...values) - Math.min(...values);
  return pairs.length >= 8 && spanOf(pairs.map(({ from }) => from.x)) > widthMm / 4 && spanOf(pairs.map(({ from }) => from.y)) > heightMm / 4;
}

/** Distances of this order are noise; what lies much further hardly counts (Cauchy weights). */
const usualErrorMm = 0.15;
const roundsOfFit = 5;

/** The map nearest to most of the points. */
export function fitRobustly(pairs: readonly Pair[], page: PageMm, start: PageMap): PageMap {
  const model = isSpread(pairs, page) ? 'homography' : 'similarity';
  const perMm = scaleAt(start.map, { x: page.widthMm / 2, y: page.heightMm / 2 });
  const distanceMm = (map: Homography, { from, to }: Pair): number => {
    const { x, y } = mapped(map, from);
    return Math.hypot(x - to.x, y - to.y) / perMm;
  };
  let best: Homography | null = null;
  for (let round = 0; round < roundsOfFit; round += 1) {
    const current: Homography | null = best;
    const weighted: readonly Pair[] = current ? pairs.map((pair) => ({ ...pair, weight: (pair.weight ?? 1) / (1 + (distanceMm(current, pair) / usualErrorMm) ** 2) })) : pairs;
    best = (model === 'homography' ? fitHomography(weighted) : fitSimilarity(weighted)) ?? best;
  }
  if (!best || !isPicture(best, page)) return start;
  const found = best;
  const squares = pairs.map((pair) => distanceMm(found, pair) ** 2).sort((one, other) => one - other);
  // Half of the squares, so that a few lost points do not speak for the page: the median distance.
  return { map: found, model, residualMm: Math.sqrt(squares[Math.floor(squares.length / 2)] ?? 0) };
}
