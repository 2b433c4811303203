import { inverted, type Grey } from './pixels';

interface Lane {
  readonly start: number;
  readonly stride: number;
  readonly count: number;
}

/** Room for one lane with its window beside it, and what was found in it forwards and backwards. */
interface Bench {
  readonly lane: Uint8Array;
  readonly ahead: Uint8Array;
  readonly back: Uint8Array;
}

/** The largest of a window along one row or column, in three comparisons a pixel whatever the window (van Herk 1992, Gil and Werman 1993). */
function slide(data: Uint8Array, { start, stride, count }: Lane, window: number, { lane, ahead, back }: Bench): void {
  const half = window >> 1;
  const padded = count + 2 * half;
  lane.fill(0, 0, half).fill(0, half + count, padded);
  for (let at = 0, from = start; at < count; at += 1, from += stride) lane[half + at] = data[from]!;
  for (let at = 0, best = 0; at < padded; at += 1) {
    const level = lane[at]!;
    best = at % window === 0 || level > best ? level : best;
    ahead[at] = best;
  }
  for (let at = padded - 1, best = 0; at >= 0; at -= 1) {
    const level = lane[at]!;
    best = (at + 1) % window === 0 || level > best ? level : best;
    back[at] = best;
  }
  for (let at = 0, to = start; at < count; at += 1, to += stride) {
    const behind = back[at]!;
    const before = ahead[at + window - 1]!;
    data[to] = behind > before ? behind : before;
  }
}

/** The largest of a square round each pixel. */
function dilated({ width, height, data }: Grey, window: number): Grey {
  const levels = data.slice();
  const room = (): Uint8Array => new Uint8Array(Math.max(width, height) + window);
  const bench: Bench = { lane: room(), ahead: room(), back: room() };
  for (let line = 0; line < height; line += 1) slide(levels, { start: line * width, stride: 1, count: width }, window, bench);
  for (let column = 0; column < width; column += 1) slide(levels, { start: column, stride: width, count: height }, window, bench);
  return { width, height, data: levels };
}

/** How much darker each pixel is than the paper round it, where paper is what a square of the window's side finds everywhere: strokes stay, smudges and shadows go. */
export function blackTopHat(grey: Grey, window: number): Grey {
  // The smallest of a window is the largest of the negative's.
  const paper = inverted(dilated(inverted(dilated(grey, window)), window));
  const hat = new Uint8Array(grey.data.length);
  for (let at = 0; at < hat.length; at = (at + 1) | 0) hat[at] = paper.data[at]! - grey.data[at]!;
  return { ...grey, data: hat };
}

/** Each pixel as the mean of itself and its eight neighbours; at the edge of those there are. */
export function meanOfNine({ width, height, data }: Grey): Grey {
  const sums = new Uint16Array(data.length);
  const means = new Uint8Array(data.length);
  for (let at = 0; at < data.length; at += 1) {
    const column = at % width;
    const left = column === 0 ? at : at - 1;
    const right = column === width - 1 ? at : at + 1;
    sums[at] = data[left]! + data[at]! + data[right]!;
  }
  for (let at = 0; at < data.length; at += 1) {
    const above = at < width ? at : at - width;
    const below = at >= width * (height - 1) ? at : at + width;
    means[at] = (sums[above]! + sums[at]! + sums[below]!) / 9 + 0.5;
  }
  return { width, height, data: means };
}
