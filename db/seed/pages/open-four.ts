import type { Outline, Point } from './outlines';

/** The 4 of some fonts closes at the top and is read as a 9; these hands write it open. In shares of the digit's height. */
const strokes: readonly (readonly [Point, Point])[] = [
  [{ x: 0.38, y: -0.97 }, { x: 0.08, y: -0.36 }],
  [{ x: 0.08, y: -0.36 }, { x: 0.66, y: -0.38 }],
  [{ x: 0.55, y: -0.66 }, { x: 0.45, y: 0.02 }],
];

/** An open 4 for a font whose digits have this height and pen width, in units of the font size. */
export function openFour(digit: number, stem: number): Outline {
  const scaled = ({ x, y }: Point): Point => ({ x: x * digit, y: y * digit });
  return { advance: 0.78 * digit, pieces: [], contours: strokes.map(([from, to]) => penStroke(scaled(from), scaled(to), stem / 2)) };
}

/** A straight stroke of a round pen, its edge as corner points. */
function penStroke(from: Point, to: Point, radius: number): readonly Point[] {
  const direction = Math.atan2(to.y - from.y, to.x - from.x);
  const round = (middle: Point, start: number): Point[] =>
    [0, 1, 2, 3, 4].map((step) => {
      const angle = start + (step * Math.PI) / 4;
      return { x: middle.x + radius * Math.cos(angle), y: middle.y + radius * Math.sin(angle) };
    });
  const end = round(to, direction - Math.PI / 2);
  const start = round(from, direction + Math.PI / 2);
  return [...end, ...between(to, from, radius, direction + Math.PI / 2), ...start, ...between(from, to, radius, direction - Math.PI / 2)];
}

/** Corners along a side, so that it can bend with the rest of the figure. */
const between = (from: Point, to: Point, radius: number, normal: number): Point[] =>
  [0.25, 0.5, 0.75].map((share) => ({
    x: from.x + (to.x - from.x) * share + radius * Math.cos(normal),
    y: from.y + (to.y - from.y) * share + radius * Math.sin(normal),
  }));
