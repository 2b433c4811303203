import sharp, { type Metadata, type Sharp } from 'sharp';
import { safeSharp } from './safe-sharp';
import type { Grey, Pixels } from './sheet/pixels';

const shortestSidePx = 400;

export interface PageOfFile {
  readonly path: string;
  readonly index: number;
  /** Quarter turns clockwise after the picture was set upright. */
  readonly turns: number;
}

export type Decoded =
  | { readonly ok: false; readonly refusal: string }
  /** Upright, with one channel or three. */
  | { readonly ok: true; readonly pixels: Pixels; readonly metadata: Metadata; readonly pages: number };

/** What a failed decoding means to the person who sent the file. */
export function refusalFor(error: unknown): string {
  const message = error instanceof Error ? error.message : '';
  if (message.includes('pixel limit')) return 'The picture has more than 60 million pixels. Scan at 600 dpi or less.';
  return 'The file is incomplete or damaged. Scan or upload it again.';
}

interface RawInfo {
  readonly width: number;
  readonly height: number;
  readonly channels: number;
}

const pixelsOf = ({ data, info: { width, height, channels } }: { data: Buffer; info: RawInfo }): Pixels => ({ width, height, channels, data: new Uint8Array(data.buffer, data.byteOffset, data.length) });

/** Pixels for sharp to work on. */
export const sharpOf = ({ data, width, height, channels }: Pixels): Sharp => sharp(data, { raw: { width, height, channels: channels === 1 ? 1 : 3 } });

export const resized = async (pixels: Pixels, longSidePx: number): Promise<Pixels> =>
  pixelsOf(await sharpOf(pixels).resize({ width: longSidePx, height: longSidePx, fit: 'inside', kernel: 'linear' }).raw().toBuffer({ resolveWithObject: true }));

/** The green of colour pixels, in which pencil and red and blue ink all are dark; the level of grey ones. */
export async function greyOf(pixels: Pixels): Promise<Grey> {
  if (pixels.channels === 1) return pixels;
  return pixelsOf(await sharpOf(pixels).extractChannel(1).raw().toBuffer({ resolveWithObject: true }));
}

/** One page of a file as upright pixels. */
export async function decodePage({ path, index, turns }: PageOfFile): Promise<Decoded> {
  const metadata = await safeSharp(path).metadata();
  const { pages = 1 } = metadata;
  if (index >= pages) return { ok: false, refusal: `The file has no page ${index + 1}.` };
  const colours = metadata.space === 'b-w' || metadata.space === 'grey16' ? 'b-w' : 'srgb';
  const upright = pixelsOf(await safeSharp(path, { page: index }).autoOrient().flatten({ background: 'white' }).toColourspace(colours).raw({ depth: 'uchar' }).toBuffer({ resolveWithObject: true }));
  const pixels = turns === 0 ? upright : pixelsOf(await sharpOf(upright).rotate(turns * 90).raw().toBuffer({ resolveWithObject: true }));
  const { width, height } = pixels;
  if (Math.min(width, height) < shortestSidePx) return { ok: false, refusal: `The picture is ${width} by ${height} pixels: too small to read. Scan at 150 dpi or more.` };
  return { ok: true, pixels, metadata, pages };
}
