import type { Point } from './homography';

/** Pixels row by row. Coordinates are continuous: the pixel in column 0 covers 0 to 1 and has its middle at 0.5. */
export interface Pixels {
  readonly width: number;
  readonly height: number;
  readonly channels: number;
  readonly data: Uint8Array;
}

export interface Grey {
  readonly width: number;
  readonly height: number;
  readonly data: Uint8Array;
}

/** Beyond its edges a picture is taken to be paper. */
export const paperLevel = 255;

/** Levels at evenly spaced points from one to another, each between its four nearest pixel middles; paper outside the picture. */
export function levelsBetween({ width, height, data }: Grey, [from, to]: readonly [Point, Point], levels: Float64Array): void {
  const stepX = (to.x - from.x) / (levels.length - 1);
  const stepY = (to.y - from.y) / (levels.length - 1);
  let x = from.x - 0.5;
  let y = from.y - 0.5;
  for (let at = 0; at < levels.length; at += 1, x += stepX, y += stepY) {
    if (x < 0 || y < 0 || x >= width - 1 || y >= height - 1) {
      levels[at] = paperLevel;
      continue;
    }
    const left = x | 0;
    const top = y | 0;
    const right = x - left;
    const corner = top * width + left;
    const upper = data[corner]! + (data[corner + 1]! - data[corner]!) * right;
    const lower = data[corner + width]! + (data[corner + width + 1]! - data[corner + width]!) * right;
    levels[at] = upper + (lower - upper) * (y - top);
  }
}

export function inverted({ width, height, data }: Grey): Grey {
  const negative = new Uint8Array(data.length);
  for (let at = 0; at < data.length; at = (at + 1) | 0) negative[at] = 255 - data[at]!;
  return { width, height, data: negative };
}

const sampleStepPx = 4;
const colouredLevels = 32;
/** A figure in coloured ink at 200 dpi leaves about twice as many. */
const leastColoured = 20;

/** Whether anything in a picture has a colour: every fourth pixel of every fourth row is asked. */
export function isColoured({ width, height, channels, data }: Pixels): boolean {
  if (channels === 1) return false;
  let coloured = 0;
  for (let y = 0; y < height; y += sampleStepPx) {
    for (let x = 0; x < width; x += sampleStepPx) {
      const at = (y * width + x) * channels;
      const [red, green, blue] = [data[at]!, data[at + 1]!, data[at + 2]!];
      if (Math.max(red, green, blue) - Math.min(red, green, blue) > colouredLevels && (coloured += 1) >= leastColoured) return true;
    }
  }
  return false;
}
