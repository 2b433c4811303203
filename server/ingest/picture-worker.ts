import { stat } from 'node:fs/promises';
import sharp, { type Metadata } from 'sharp';
import { areaOfBox, type BoxMm, type PageMm, type PixelSize } from './cutting';
import { kindOfFile, mediaTypes, refusalOf } from './file-kinds';

/** A4 at 600 dpi has 35 million pixels. */
const mostPixels = 60_000_000;
const shortestSidePx = 400;
const displayLongSidePx = 2400;
const thumbLongSidePx = 320;
/** A JPEG no heavier than this is shown as it came. */
const heaviestShownBytes = 1_500_000;
/** Half the time of the smallest possible file, for a twentieth more bytes. */
const encoding = { quality: 80, optimiseCoding: false } as const;

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
      /** Null where the file itself can be shown. */
      readonly display: Uint8Array | null;
      readonly thumb: Uint8Array;
      readonly crops: readonly MadeCrop[];
    });

/** What a failed decoding means to the person who sent the file. */
function refusalFor(error: unknown): string {
  const message = error instanceof Error ? error.message : '';
  if (message.includes('pixel limit')) return 'The picture has more than 60 million pixels. Scan at 600 dpi or less.';
  return 'The file is incomplete or damaged. Scan or upload it again.';
}

/** Whether a browser can show the file as it came: an upright JPEG in ordinary colours, of a size that a screen needs. */
const isShownAsItCame = ({ format, orientation = 1, width, height, space }: Metadata, bytes: number, turns: number): boolean =>
  format === 'jpeg' && turns === 0 && orientation === 1 && (space === 'srgb' || space === 'b-w') && Math.max(width, height) <= displayLongSidePx && bytes <= heaviestShownBytes;

async function makePictures({ path, index, turns, cut }: PictureTask, mediaType: string): Promise<PictureResult> {
  const decode = { limitInputPixels: mostPixels, failOn: 'warning' as const };
  const metadata = await sharp(path, decode).metadata();
  const { pages = 1 } = metadata;
  if (index >= pages) return { ok: false, refusal: `The file has no page ${index + 1}.` };
  const upright = await sharp(path, { ...decode, page: index }).autoOrient().flatten({ background: 'white' }).toColourspace('srgb').raw({ depth: 'uchar' }).toBuffer({ resolveWithObject: true });
  const turned = turns === 0 ? upright : await sharp(upright.data, { raw: upright.info }).rotate(turns * 90).raw().toBuffer({ resolveWithObject: true });
  const { width, height } = turned.info;
  if (Math.min(width, height) < shortestSidePx) return { ok: false, refusal: `The picture is ${width} by ${height} pixels: too small to read. Scan at 150 dpi or more.` };
  const whole = () => sharp(turned.data, { raw: turned.info });
  const fitted = (side: number, kernel: 'linear' | 'lanczos3') => whole().resize({ width: side, height: side, fit: 'inside', withoutEnlargement: true, kernel }).jpeg(encoding).toBuffer({ resolveWithObject: true });
  const crop = async (box: BoxMm, page: PageMm): Promise<MadeCrop> => {
    const { data, info } = await whole().extract(areaOfBox(box, page, { width, height })).jpeg(encoding).toBuffer({ resolveWithObject: true });
    return { box: box.id, jpeg: data, width: info.width, height: info.height };
  };
  const asItCame = isShownAsItCame(metadata, (await stat(path)).size, turns);
  const [display, thumb, ...crops] = await Promise.all([
    asItCame ? null : fitted(displayLongSidePx, 'lanczos3'),
    fitted(thumbLongSidePx, 'linear'),
    ...(cut?.boxes ?? []).map((box) => crop(box, cut?.page ?? { widthMm: 1, heightMm: 1 })),
  ]);
  return { ok: true, mediaType, pages, width: display?.info.width ?? width, height: display?.info.height ?? height, display: display?.data ?? null, thumb: thumb.data, crops };
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
