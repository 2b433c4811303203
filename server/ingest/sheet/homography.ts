export interface Point {
  readonly x: number;
  readonly y: number;
}

/** A projective map of the plane as its 3x3 matrix, row by row. */
export type Homography = readonly number[];

/** What lies at `from` was seen at `to`. */
export interface Pair {
  readonly from: Point;
  readonly to: Point;
  readonly weight?: number;
}

export const identityMap: Homography = [1, 0, 0, 0, 1, 0, 0, 0, 1];

/** The third homogeneous coordinate: it keeps one sign where a map is a picture of the page. */
export const depthAt = (map: Homography, { x, y }: Point): number => map[6]! * x + map[7]! * y + map[8]!;

export function mapped(map: Homography, point: Point): Point {
  const depth = depthAt(map, point);
  return { x: (map[0]! * point.x + map[1]! * point.y + map[2]!) / depth, y: (map[3]! * point.x + map[4]! * point.y + map[5]!) / depth };
}

/** The map that applies `inner` first. */
export function after(outer: Homography, inner: Homography): Homography {
  const entry = (row: number, column: number): number => [0, 1, 2].reduce((sum, k) => sum + (outer[row * 3 + k] ?? 0) * (inner[k * 3 + column] ?? 0), 0);
  return scaled(identityMap.map((_, index) => entry(Math.floor(index / 3), index % 3)));
}

const scaled = (map: Homography): Homography => map.map((value) => value / (map[8] || 1));

/** The map back, by cofactors. */
export function inverse(map: Homography): Homography {
  const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0, g = 0, h = 0, i = 0] = map;
  return scaled([e * i - f * h, c * h - b * i, b * f - c * e, f * g - d * i, a * i - c * g, c * d - a * f, d * h - e * g, b * g - a * h, a * e - b * d]);
}

/** Solves the normal equations of a least-squares problem given as rows [coefficients..., value]; null where they do not decide. */
export function leastSquares(rows: readonly (readonly number[])[], unknowns: number): number[] | null {
  const system = Array.from({ length: unknowns }, () => new Float64Array(unknowns + 1));
  for (const row of rows) {
    for (let at = 0; at < unknowns; at += 1) {
      const factor = row[at]!;
      const line = system[at]!;
      if (factor !== 0) for (let k = 0; k <= unknowns; k += 1) line[k] = line[k]! + factor * row[k]!;
    }
  }
  return eliminated(system);
}

/** Gauss with the largest pivot of each column. */
function eliminated(system: Float64Array[]): number[] | null {
  const size = system.length;
  for (let column = 0; column < size; column += 1) {
    const rest = system.slice(column).map((line) => Math.abs(line[column] ?? 0));
    const best = column + rest.indexOf(Math.max(...rest));
    const [pivot, other] = [system[best], system[column]];
    if (!pivot || !other || Math.abs(pivot[column] ?? 0) < 1e-12) return null;
    [system[column], system[best]] = [pivot, other];
    for (const line of system) {
      if (line === pivot) continue;
      const factor = (line[column] ?? 0) / (pivot[column] ?? 1);
      if (factor !== 0) for (let k = column; k <= size; k += 1) line[k] = line[k]! - factor * pivot[k]!;
    }
  }
  return system.map((line, at) => (line[size] ?? 0) / (line[at] ?? 1));
}

/** Moves points to their middle and scales them to a mean distance of 1.4, without which the equations lose their figures (Hartley 1997). */
function normalising(points: readonly Point[]): Homography {
  const count = Math.max(1, points.length);
  const x = points.reduce((sum, point) => sum + point.x, 0) / count;
  const y = points.reduce((sum, point) => sum + point.y, 0) / count;
  const distance = points.reduce((sum, point) => sum + Math.hypot(point.x - x, point.y - y), 0) / count;
  const scale = distance > 0 ? Math.SQRT2 / distance : 1;
  return [scale, 0, -scale * x, 0, scale, -scale * y, 0, 0, 1];
}

/** The homography nearest to at least four pairs, by least squares on the normalised direct linear equations. */
export function fitHomography(pairs: readonly Pair[]): Homography | null {
  if (pairs.length < 4) return null;
  const before = normalising(pairs.map(({ from }) => from));
  const behind = normalising(pairs.map(({ to }) => to));
  const rows = pairs.flatMap(({ from, to, weight = 1 }) => {
    const { x, y } = mapped(before, from);
    const { x: u, y: v } = mapped(behind, to);
    const w = Math.sqrt(weight);
    return [
      [w * x, w * y, w, 0, 0, 0, -w * u * x, -w * u * y, w * u],
      [0, 0, 0, w * x, w * y, w, -w * v * x, -w * v * y, w * v],
    ];
  });
  const solved = leastSquares(rows, 8);
  return solved ? after(inverse(behind), after([...solved, 1], before)) : null;
}

/** Turn, scale and shift nearest to at least two pairs, as it is or mirrored, whichever is nearer. */
export function fitSimilarity(pairs: readonly Pair[]): Homography | null {
  if (pairs.length < 2) return null;
  const fits = [1, -1].flatMap((hand) => {
    const rows = pairs.flatMap(({ from: { x, y }, to, weight = 1 }) => {
      const w = Math.sqrt(weight);
      return [
        [x, -y, 1, 0, to.x].map((value) => value * w),
        [hand * y, hand * x, 0, 1, to.y].map((value) => value * w),
      ];
    });
    const [a, b, c, d] = leastSquares(rows, 4) ?? [];
    return a === undefined || b === undefined || c === undefined || d === undefined ? [] : [[a, -b, c, hand * b, hand * a, d, 0, 0, 1] as Homography];
  });
  return fits.sort((one, other) => rmsOf(one, pairs) - rmsOf(other, pairs))[0] ?? null;
}

export const distanceOf = (map: Homography, { from, to }: Pair): number => {
  const { x, y } = mapped(map, from);
  return Math.hypot(x - to.x, y - to.y);
};

/** Root of the mean square distance, in the units of `to`. */
export const rmsOf = (map: Homography, pairs: readonly Pair[]): number => Math.sqrt(pairs.reduce((sum, pair) => sum + distanceOf(map, pair) ** 2, 0) / Math.max(1, pairs.length));

/** How much longer a short way is after the map at a point: the root of the area's growth. */
export function scaleAt(map: Homography, { x, y }: Point): number {
  const step = 0.5;
  const [origin, right, down] = [mapped(map, { x, y }), mapped(map, { x: x + step, y }), mapped(map, { x, y: y + step })];
  return Math.sqrt(Math.abs((right.x - origin.x) * (down.y - origin.y) - (right.y - origin.y) * (down.x - origin.x))) / step;
}
