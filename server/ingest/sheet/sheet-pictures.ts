import type { Rect as RectMm } from '../../../shared/sheets/geometry';
import { areaOfBox, mapOfWholePage, marginMm, type PageMm, type PixelSize } from '../cutting';
import { sharpOf } from '../decode';
import { encoding, thumbOf, type MadeCrop, type MadePictures } from '../page-pictures';
import { after, scaleAt, type Homography } from './homography';
import type { SheetBox } from './layout';
import type { Pixels } from './pixels';
import { mapOfBox, type ReadBox, type ReadPage } from './read-sheet';
import { warp } from './warp';

const displayDpi = 150;
/** No finer than a scan at 200 dpi, however near the camera was. */
const finestCropDpi = 200;
/** Paper kept round a box whose place is not sure. */
const wideMarginMm = 8;
const allSides = 4;

/** The size of a page drawn anew, in pixels. */
const sizeAt = ({ widthMm, heightMm }: PageMm, perMm: number): PixelSize => ({ width: Math.round(widthMm * perMm), height: Math.round(heightMm * perMm) });

/** Draws a rectangle of the page, given in millimetres, as it was printed: upright, square, to scale. */
function drawn(pixels: Pixels, map: Homography, { x, y, w, h }: RectMm, perMm: number): Pixels {
  const toMm = [1 / perMm, 0, x, 0, 1 / perMm, y, 0, 0, 1];
  return warp(pixels, after(map, toMm), sizeAt({ widthMm: w, heightMm: h }, perMm));
}

/** The part of the page that a cut-out shows: the box with paper round it, no farther than the page goes. */
function partOf({ x, y, w, h }: SheetBox, { widthMm, heightMm }: PageMm, margin: number): RectMm {
  const [left, top] = [Math.max(0, x - margin), Math.max(0, y - margin)];
  return { x: left, y: top, w: Math.min(widthMm, x + w + margin) - left, h: Math.min(heightMm, y + h + margin) - top };
}

interface Drawing {
  readonly pixels: Pixels;
  readonly read: ReadPage;
  /** The page as it is shown. */
  readonly display: Pixels;
}

const jpegOf = (pixels: Pixels): Promise<Buffer> => sharpOf(pixels).jpeg(encoding).toBuffer();

/** A framed box by its own corners and as fine as the scan. */
async function framedCrop({ pixels, read }: Drawing, box: SheetBox, { corners, sidesConfirmed }: ReadBox): Promise<MadeCrop> {
  const own = (sidesConfirmed === allSides && mapOfBox(box, corners)) || read.map;
  const part = partOf(box, read.page, sidesConfirmed === allSides ? marginMm : wideMarginMm);
  const picture = drawn(pixels, own, part, Math.min(finestCropDpi / 25.4, scaleAt(own, { x: box.x, y: box.y })));
  return { box: box.id, jpeg: await jpegOf(picture), width: picture.width, height: picture.height };
}

/** A box without a frame, which is large: cut from the page as it is shown. */
async function openCrop({ read, display }: Drawing, box: SheetBox): Promise<MadeCrop> {
  const { data, info } = await sharpOf(display).extract(areaOfBox(box, read.page, display)).jpeg(encoding).toBuffer({ resolveWithObject: true });
  return { box: box.id, jpeg: data, width: info.width, height: info.height };
}

/** The pictures of a page that was read: drawn anew as it was printed, so that the map of the display is its scale alone. */
export async function sheetPictures(pixels: Pixels, read: ReadPage, boxes: readonly SheetBox[]): Promise<MadePictures & { readonly mmToPx: number[] }> {
  const { page, map } = read;
  const size = sizeAt(page, displayDpi / 25.4);
  const display = warp(pixels, after(map, [page.widthMm / size.width, 0, 0, 0, page.heightMm / size.height, 0, 0, 0, 1]), size);
  // Encoding runs beside the drawing of the cut-outs.
  const shown = Promise.all([jpegOf(display), thumbOf(display)]);
  const crops = boxes.flatMap((box) => {
    const found = read.boxes.find(({ id }) => id === box.id);
    if (!found) return [];
    return [box.isFramed ? framedCrop({ pixels, read, display }, box, found) : openCrop({ pixels, read, display }, box)];
  });
  const [[jpeg, thumb], made] = await Promise.all([shown, Promise.all(crops)]);
  return { ...size, display: jpeg, thumb, crops: made, mmToPx: mapOfWholePage(page, size) };
}
