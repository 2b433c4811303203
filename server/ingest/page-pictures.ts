import type { Metadata } from 'sharp';
import { areaOfBox, type BoxMm, type PageMm, type PixelSize } from './cutting';
import { sharpOf } from './decode';
import type { Pixels } from './sheet/pixels';

const displayLongSidePx = 2400;
const thumbLongSidePx = 320;
/** A JPEG no heavier than this is shown as it came. */
const heaviestShownBytes = 1_500_000;
/** Half the time of the smallest possible file, for a twentieth more bytes. */
export const encoding = { quality: 80, optimiseCoding: false } as const;

export interface MadeCrop extends PixelSize {
  readonly box: string;
  readonly jpeg: Uint8Array;
}

/** Boxes to cut out, with the size of the page they are measured on. */
export interface Cut {
  readonly page: PageMm;
  readonly boxes: readonly BoxMm[];
}

export interface MadePictures extends PixelSize {
  /** Null where the file itself can be shown. */
  readonly display: Uint8Array | null;
  readonly thumb: Uint8Array;
  readonly crops: readonly MadeCrop[];
}

/** Whether a browser can show the file as it came: an upright JPEG in ordinary colours, of a size that a screen needs. */
export const isShownAsItCame = ({ format, orientation = 1, width, height, space }: Metadata, bytes: number, turns: number): boolean =>
  format === 'jpeg' && turns === 0 && orientation === 1 && (space === 'srgb' || space === 'b-w') && Math.max(width, height) <= displayLongSidePx && bytes <= heaviestShownBytes;

const fitted = (pixels: Pixels, side: number, kernel: 'linear' | 'lanczos3') =>
  sharpOf(pixels).resize({ width: side, height: side, fit: 'inside', withoutEnlargement: true, kernel }).jpeg(encoding).toBuffer({ resolveWithObject: true });

export const thumbOf = async (pixels: Pixels): Promise<Uint8Array> => (await fitted(pixels, thumbLongSidePx, 'linear')).data;

/** The pictures of a page that fills its picture: display, thumbnail, cut-outs. */
export async function wholePagePictures(pixels: Pixels, cut: Cut | null, asItCame: boolean): Promise<MadePictures> {
  const { width, height } = pixels;
  const crop = async (box: BoxMm, page: PageMm): Promise<MadeCrop> => {
    const { data, info } = await sharpOf(pixels).extract(areaOfBox(box, page, { width, height })).jpeg(encoding).toBuffer({ resolveWithObject: true });
    return { box: box.id, jpeg: data, width: info.width, height: info.height };
  };
  const [display, thumb, ...crops] = await Promise.all([
    asItCame ? null : fitted(pixels, displayLongSidePx, 'lanczos3'),
    thumbOf(pixels),
    ...(cut ? cut.boxes.map((box) => crop(box, cut.page)) : []),
  ]);
  return { width: display?.info.width ?? width, height: display?.info.height ?? height, display: display?.data ?? null, thumb, crops };
}
