import type { Grey } from './pixels';

type Pick2 = (one: number, other: number) => number;
const larger: Pick2 = (one, other) => (one > other ? one : other);
const smaller: Pick2 = (one, other) => (one < other ? one : other);

interface Lane {
  readonly start: number;
  readonly stride: number;
  readonly count: number;
}

/** The largest (or smallest) of a window along one row or column, in three comparisons a pixel whatever the window (van Herk 1992, Gil and Werman 1993). */
function slide(data: Uint8Array, target: Uint8Array, { start, stride, count }: Lane, { window, pick }: { window: number; pick: Pick2 }): void {
  const half = window >> 1;
  const padded = count + 2 * half;
  const outside = pick === larger ? 0 : 255;
  const level = (at: number): number => (at < half || at >= half + count ? outside : data[start + (at - half) * stride]!);
  const [ahead, back] = [new Uint8Array(padded), new Uint8Array(padded)];
  for (let at = 0; at < padded; at += 1) ahead[at] = at % window === 0 ? level(at) : pick(ahead[at - 1]!, level(at));
  for (let at = padded - 1; at >= 0; at -= 1) back[at] = at === padded - 1 || (at + 1) % window === 0 ? level(at) : pick(back[at + 1]!, level(at));
  for (let at = 0; at < count; at += 1) target[start + at * stride] = pick(back[at]!, ahead[at + window - 1]!);
}

function filtered({ width, height, data }: Grey, window: number, pick: Pick2): Grey {
  const [rows, both] = [new Uint8Array(data.length), new Uint8Array(data.length)];
  for (let line = 0; line < height; line += 1) slide(data, rows, { start: line * width, stride: 1, count: width }, { window, pick });
  for (let column = 0; column < width; column += 1) slide(rows, both, { start: column, stride: width, count: height }, { window, pick });
  return { width, height, data: both };
}

/** How much darker each pixel is than the paper round it, where paper is what a square of the window's side finds everywhere: strokes stay, smudges and shadows go. */
export function blackTopHat(grey: Grey, window: number): Grey {
  const paper = filtered(filtered(grey, window, larger), window, smaller);
  return { ...grey, data: paper.data.map((level, at) => level - grey.data[at]!) };
}

/** Each pixel as the mean of itself and its eight neighbours; at the edge of those there are. */
export function meanOfNine({ width, height, data }: Grey): Grey {
  const sums = new Uint16Array(data.length);
  const means = new Uint8Array(data.length);
  for (let at = 0; at < data.length; at += 1) {
    const column = at % width;
    const [left, right] = [column === 0 ? at : at - 1, column === width - 1 ? at : at + 1];
    sums[at] = data[left]! + data[at]! + data[right]!;
  }
  for (let at = 0; at < data.length; at += 1) {
    const [above, below] = [at < width ? at : at - width, at >= width * (height - 1) ? at : at + width];
    means[at] = (sums[above]! + sums[at]! + sums[below]!) / 9 + 0.5;
  }
  return { width, height, data: means };
}
