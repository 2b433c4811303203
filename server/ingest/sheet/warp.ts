import type { PixelSize } from '../cutting';
import type { Homography } from './homography';
import { paperLevel, type Pixels } from './pixels';

/** Between two exact points the map is taken as straight: at this length, by hundredths of a pixel even in a picture far aslant. */
const spanPx = 48;
/** Beyond this no picture reaches, and 65536ths of a pixel would no longer be whole numbers of 31 bits. */
const farthest = 30_000;

interface Row {
  readonly source: Pixels;
  readonly target: Uint8Array;
}

/** A stretch of a row; where it lies in the source is in 65536ths of a pixel, so that whole numbers do. */
interface Span {
  /** The pixel at which the span begins. */
  readonly at: number;
  readonly count: number;
  readonly u: number;
  readonly v: number;
  readonly du: number;
  readonly dv: number;
}

const one = 65536;

const isInside = ({ width, height }: PixelSize, u: number, v: number): boolean => u >= 0 && v >= 0 && u < width - 1 && v < height - 1;

// NOTE The two loops below draw millions of pixels: plain whole numbers, since anything else costs more than the arithmetic.
function copyGrey({ source: { data, width }, target }: Row, { at, count, u, v, du, dv }: Span): void {
  let x = u;
  let y = v;
  for (let to = at; to < at + count; to = (to + 1) | 0) {
    const from = ((y >> 16) * width + (x >> 16)) | 0;
    const under = (from + width) | 0;
    const right = (x >> 8) & 255;
    const down = (y >> 8) & 255;
    const upper = data[from]! * (256 - right) + data[from + 1]! * right;
    const lower = data[under]! * (256 - right) + data[under + 1]! * right;
    target[to] = (upper * (256 - down) + lower * down + 32768) >> 16;
    x = (x + du) | 0;
    y = (y + dv) | 0;
  }
}

function copyColour({ source: { data, width }, target }: Row, { at, count, u, v, du, dv }: Span): void {
  const stride = (width * 3) | 0;
  const end = ((at + count) * 3) | 0;
  let x = u;
  let y = v;
  for (let to = (at * 3) | 0; to < end; to = (to + 3) | 0) {
    const from = ((y >> 16) * stride + (x >> 16) * 3) | 0;
    const under = (from + stride) | 0;
    const right = (x >> 8) & 255;
    const down = (y >> 8) & 255;
    const d = (right * down) >> 8;
    const b = (right - d) | 0;
    const c = (down - d) | 0;
    const a = (256 - right - c) | 0;
    target[to] = (data[from]! * a + data[from + 3]! * b + data[under]! * c + data[under + 3]! * d + 128) >> 8;
    target[to + 1] = (data[from + 1]! * a + data[from + 4]! * b + data[under + 1]! * c + data[under + 4]! * d + 128) >> 8;
    target[to + 2] = (data[from + 2]! * a + data[from + 5]! * b + data[under + 2]! * c + data[under + 5]! * d + 128) >> 8;
    x = (x + du) | 0;
    y = (y + dv) | 0;
  }
}

/** Point by point, where a span runs over the edge of the picture. */
function copyAcrossEdge(row: Row, span: Span): void {
  const copy = row.source.channels === 1 ? copyGrey : copyColour;
  for (let step = 0; step < span.count; step += 1) {
    const u = span.u + span.du * step;
    const v = span.v + span.dv * step;
    if (isInside(row.source, u / one, v / one)) copy(row, { at: span.at + step, count: 1, u, v, du: 0, dv: 0 });
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
      const x = first + 0.5;
      const end = x + count;
      const depth = 1 / (g * x + h * y + i);
      const endDepth = 1 / (g * end + h * y + i);
      const u = (a * x + b * y + c) * depth - 0.5;
      const v = (d * x + e * y + f) * depth - 0.5;
      const endU = (a * end + b * y + c) * endDepth - 0.5;
      const endV = (d * end + e * y + f) * endDepth - 0.5;
      const isWithin = isInside(source, u, v) && isInside(source, endU, endV);
      if (!isWithin && (Math.abs(u) > farthest || Math.abs(v) > farthest)) continue;
      const span = { at: line * width + first, count, u: Math.floor(u * one), v: Math.floor(v * one), du: Math.floor(((endU - u) / count) * one), dv: Math.floor(((endV - v) / count) * one) };
      if (isWithin) copy(row, span);
      else copyAcrossEdge(row, span);
    }
  }
  return { width, height, channels: source.channels, data: target };
}
