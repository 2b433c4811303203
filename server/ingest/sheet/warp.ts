import type { PixelSize } from '../cutting';
import type { Homography } from './homography';
import { paperLevel, type Pixels } from './pixels';

/** Between two exact points the map is taken as straight: at this length it errs by thousandths of a pixel. */
const spanPx = 16;

interface Row {
  readonly source: Pixels;
  readonly target: Uint8Array;
}

interface Span {
  /** Where the first value of the span goes. */
  readonly at: number;
  readonly count: number;
  readonly u: number;
  readonly v: number;
  readonly du: number;
  readonly dv: number;
}

const isInside = ({ width, height }: PixelSize, u: number, v: number): boolean => u >= 0 && v >= 0 && u < width - 1 && v < height - 1;

function copyGrey({ source: { data, width }, target }: Row, { at, count, u, v, du, dv }: Span): void {
  let [x, y] = [u, v];
  for (let to = at; to < at + count; to += 1) {
    const [left, top] = [x | 0, y | 0];
    const [right, down] = [x - left, y - top];
    const from = top * width + left;
    const upper = data[from]! + (data[from + 1]! - data[from]!) * right;
    const lower = data[from + width]! + (data[from + width + 1]! - data[from + width]!) * right;
    target[to] = upper + (lower - upper) * down + 0.5;
    x += du;
    y += dv;
  }
}

function copyColour({ source: { data, width }, target }: Row, { at, count, u, v, du, dv }: Span): void {
  let [x, y, to] = [u, v, at * 3];
  const below = width * 3;
  for (let step = 0; step < count; step += 1) {
    const [left, top] = [x | 0, y | 0];
    const [right, down] = [x - left, y - top];
    const [a, b, c, d] = [(1 - right) * (1 - down), right * (1 - down), (1 - right) * down, right * down];
    const from = top * below + left * 3;
    target[to] = data[from]! * a + data[from + 3]! * b + data[from + below]! * c + data[from + below + 3]! * d + 0.5;
    target[to + 1] = data[from + 1]! * a + data[from + 4]! * b + data[from + below + 1]! * c + data[from + below + 4]! * d + 0.5;
    target[to + 2] = data[from + 2]! * a + data[from + 5]! * b + data[from + below + 2]! * c + data[from + below + 5]! * d + 0.5;
    to += 3;
    x += du;
    y += dv;
  }
}

/** Point by point, where a span runs over the edge of the picture. */
function copyAcrossEdge(row: Row, span: Span): void {
  const copy = row.source.channels === 1 ? copyGrey : copyColour;
  for (let step = 0; step < span.count; step += 1) {
    const [u, v] = [span.u + span.du * step, span.v + span.dv * step];
    if (isInside(row.source, u, v)) copy(row, { at: span.at + step, count: 1, u, v, du: 0, dv: 0 });
  }
}

/** Draws a picture anew: `toSource` says for each pixel of the new one where in the old one it lies. One or three channels; paper where there is nothing. */
export function warp(source: Pixels, toSource: Homography, { width, height }: PixelSize): Pixels {
  const target = new Uint8Array(width * height * source.channels).fill(paperLevel);
  const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0, g = 0, h = 0, i = 1] = toSource;
  const row = { source, target };
  const copy = source.channels === 1 ? copyGrey : copyColour;
  for (let line = 0; line < height; line += 1) {
    const y = line + 0.5;
    for (let first = 0; first < width; first += spanPx) {
      const count = Math.min(spanPx, width - first);
      const [x, end] = [first + 0.5, first + 0.5 + count];
      const [depth, endDepth] = [g * x + h * y + i, g * end + h * y + i];
      const [u, v] = [(a * x + b * y + c) / depth - 0.5, (d * x + e * y + f) / depth - 0.5];
      const [endU, endV] = [(a * end + b * y + c) / endDepth - 0.5, (d * end + e * y + f) / endDepth - 0.5];
      const span = { at: line * width + first, count, u, v, du: (endU - u) / count, dv: (endV - v) / count };
      if (isInside(source, u, v) && isInside(source, endU, endV)) copy(row, span);
      else copyAcrossEdge(row, span);
    }
  }
  return { width, height, channels: source.channels, data: target };
}
