/** Paper kept round a box, so that ink over its edge stays in sight. */
export const marginMm = 3;

export interface BoxMm {
  readonly id: string;
  readonly x: number;
  readonly y: number;
  readonly w: number;
  readonly h: number;
}

export interface PageMm {
  readonly widthMm: number;
  readonly heightMm: number;
}

export interface PixelSize {
  readonly width: number;
  readonly height: number;
}

export interface PixelArea extends PixelSize {
  readonly left: number;
  readonly top: number;
}

/**
 * The 3x3 map from page millimetres to pixels, row by row, where the whole page fills the picture.
 * mapOfWholePage({ widthMm: 210, heightMm: 297 }, { width: 420, height: 594 }) is [2, 0, 0, 0, 2, 0, 0, 0, 1].
 */
export const mapOfWholePage = (page: PageMm, size: PixelSize): number[] => [size.width / page.widthMm, 0, 0, 0, size.height / page.heightMm, 0, 0, 0, 1];

/** Where a box with its margin lies in the picture, cut at its edges, in whole pixels and at least one. */
export function areaOfBox(box: BoxMm, page: PageMm, size: PixelSize): PixelArea {
  const [scaleX = 0, , , , scaleY = 0] = mapOfWholePage(page, size);
  const within = (value: number, most: number): number => Math.min(most, Math.max(0, Math.round(value)));
  const left = within((box.x - marginMm) * scaleX, size.width - 1);
  const top = within((box.y - marginMm) * scaleY, size.height - 1);
  const right = within((box.x + box.w + marginMm) * scaleX, size.width);
  const bottom = within((box.y + box.h + marginMm) * scaleY, size.height);
  return { left, top, width: Math.max(1, right - left), height: Math.max(1, bottom - top) };
}
