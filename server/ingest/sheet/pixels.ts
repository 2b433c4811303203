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

/** The level at a point, between the four nearest pixel middles; paper outside the picture. */
export function levelAt({ width, height, data }: Grey, x: number, y: number): number {
  const left = Math.floor(x - 0.5);
  const top = Math.floor(y - 0.5);
  if (left < 0 || top < 0 || left >= width - 1 || top >= height - 1) return paperLevel;
  const right = x - 0.5 - left;
  const down = y - 0.5 - top;
  const at = top * width + left;
  const upper = data[at]! * (1 - right) + data[at + 1]! * right;
  const lower = data[at + width]! * (1 - right) + data[at + width + 1]! * right;
  return upper * (1 - down) + lower * down;
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
