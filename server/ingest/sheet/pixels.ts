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
  const upper = (data[at] ?? 0) * (1 - right) + (data[at + 1] ?? 0) * right;
  const lower = (data[at + width] ?? 0) * (1 - right) + (data[at + width + 1] ?? 0) * right;
  return upper * (1 - down) + lower * down;
}

/** The green of colour pixels, in which pencil and red and blue ink all are dark; the level of grey ones. */
export function greyOf({ width, height, channels, data }: Pixels): Grey {
  if (channels === 1) return { width, height, data };
  const grey = new Uint8Array(width * height);
  for (let at = 0, from = 1; at < grey.length; at += 1, from += channels) grey[at] = data[from] ?? 0;
  return { width, height, data: grey };
}

export const inverted = ({ data, ...size }: Grey): Grey => ({ ...size, data: data.map((level) => 255 - level) });
