import sharp from 'sharp';
import { areaOfBox, type BoxMm, type PageMm, type PixelSize } from './cutting';
import { kindOfFile, mediaTypes, refusalOf } from './file-kinds';

/** A4 at 600 dpi has 35 million pixels. */
const mostPixels = 60_000_000;
const shortestSidePx = 400;
const displayLongSidePx = 2000;
const thumbLongSidePx = 320;
const quality = 80;

// NOTE libvips would read SVG and more from hostile bytes; this holds for the whole process.
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({ operation: ['VipsForeignLoadJpeg', 'VipsForeignLoadPng', 'VipsForeignLoadTiff', 'VipsForeignLoadWebp'] });
sharp.concurrency(1);
sharp.cache(false);

export interface PictureTask {
  readonly path: string;
  readonly index: number;
  /** Quarter turns clockwise after the picture was set upright. */
  readonly turns: number;
  /** Boxes to cut out, with the size of the page they are measured on. */
  readonly cut: { readonly page: PageMm; readonly boxes: readonly BoxMm[] } | null;
}

export interface MadeCrop extends PixelSize {
  readonly box: string;
  readonly jpeg: Uint8Array;
}

export type PictureResult =
  | { readonly ok: false; readonly refusal: string }
  | (PixelSize & {
      readonly ok: true;
      readonly mediaType: string;
      /** Pages of the file. */
      readonly pages: number;
      readonly display: Uint8Array;
      readonly thumb: Uint8Array;
      readonly crops: readonly MadeCrop[];
    });

/** What a failed decoding means to the person who sent the file. */
function refusalFor(error: unknown): string {
  const message = error instanceof Error ? error.message : '';
  if (message.includes('pixel limit')) return 'The picture has more than 60 million pixels. Scan at 600 dpi or less.';
  return 'The file is incomplete or damaged. Scan or upload it again.';
}

async function makePictures({ path, index, turns, cut }: PictureTask, mediaType: string): Promise<PictureResult> {
  const decode = { limitInputPixels: mostPixels, failOn: 'warning' as const };
  const { pages = 1 } = await sharp(path, decode).metadata();
  if (index >= pages) return { ok: false, refusal: `The file has no page ${index + 1}.` };
  const upright = await sharp(path, { ...decode, page: index }).autoOrient().flatten({ background: 'white' }).toColourspace('srgb').raw({ depth: 'uchar' }).toBuffer({ resolveWithObject: true });
  const turned = turns === 0 ? upright : await sharp(upright.data, { raw: upright.info }).rotate(turns * 90).raw().toBuffer({ resolveWithObject: true });
  const { width, height } = turned.info;
  if (Math.min(width, height) < shortestSidePx) return { ok: false, refusal: `The picture is ${width} by ${height} pixels: too small to read. Scan at 150 dpi or more.` };
  const whole = () => sharp(turned.data, { raw: turned.info });
  const fitted = (side: number) => whole().resize({ width: side, height: side, fit: 'inside', withoutEnlargement: true }).jpeg({ quality }).toBuffer({ resolveWithObject: true });
  const display = await fitted(displayLongSidePx);
  const thumb = await fitted(thumbLongSidePx);
  const crops: MadeCrop[] = [];
  for (const box of cut?.boxes ?? []) {
    const area = areaOfBox(box, cut?.page ?? { widthMm: 1, heightMm: 1 }, { width, height });
    const { data, info } = await whole().extract(area).jpeg({ quality }).toBuffer({ resolveWithObject: true });
    crops.push({ box: box.id, jpeg: data, width: info.width, height: info.height });
  }
  return { ok: true, mediaType, pages, width: display.info.width, height: display.info.height, display: display.data, thumb: thumb.data, crops };
}

/** Decodes one page of a file once and makes all its pictures: display, thumbnail, cut-outs. Runs in a worker thread. */
export default async function makePage(task: PictureTask): Promise<PictureResult> {
  const kind = await kindOfFile(task.path);
  const refusal = refusalOf(kind);
  if (refusal !== null) return { ok: false, refusal };
  try {
    return await makePictures(task, mediaTypes[kind] ?? 'application/octet-stream');
  } catch (error) {
    return { ok: false, refusal: refusalFor(error) };
  }
}
