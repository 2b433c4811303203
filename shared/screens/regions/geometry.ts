/** A rectangle on a page, in millimetres from its top left corner. */
export interface Rect {
  readonly x: number;
  readonly y: number;
  readonly w: number;
  readonly h: number;
}

export interface PageSize {
  readonly widthMm: number;
  readonly heightMm: number;
}

/** Where a box is taken hold of: a corner, a side, or the middle to move it. */
export type Handle = 'move' | 'nw' | 'n' | 'ne' | 'e' | 'se' | 's' | 'sw' | 'w';

export const smallestMm = 5;
const gridMm = 0.5;

const snap = (mm: number): number => Math.round(mm / gridMm) * gridMm;
const clamp = (value: number, low: number, high: number): number => Math.min(Math.max(value, low), Math.max(low, high));

/** A box kept on its page, no smaller than the smallest. */
export function kept({ x, y, w, h }: Rect, { widthMm, heightMm }: PageSize): Rect {
  const width = clamp(w, smallestMm, widthMm);
  const height = clamp(h, smallestMm, heightMm);
  return { x: clamp(x, 0, widthMm - width), y: clamp(y, 0, heightMm - height), w: width, h: height };
}

/** A box moved by its middle, stopping at the edges: moved({ x: 10, … }, -20, 0) stands at x 0. */
export const moved = (rect: Rect, dx: number, dy: number, page: PageSize): Rect => kept({ ...rect, x: snap(rect.x + dx), y: snap(rect.y + dy) }, page);

/** A box with one side or corner moved; the opposite side stays where it is. */
export function resized(rect: Rect, handle: Exclude<Handle, 'move'>, dx: number, dy: number, page: PageSize): Rect {
  let { x, y } = rect;
  let right = x + rect.w;
  let bottom = y + rect.h;
  if (handle.includes('w')) x = clamp(snap(x + dx), 0, right - smallestMm);
  if (handle.includes('e')) right = clamp(snap(right + dx), x + smallestMm, page.widthMm);
  if (handle.includes('n')) y = clamp(snap(y + dy), 0, bottom - smallestMm);
  if (handle.includes('s')) bottom = clamp(snap(bottom + dy), y + smallestMm, page.heightMm);
  return { x, y, w: right - x, h: bottom - y };
}

export const dragged = (rect: Rect, handle: Handle, dx: number, dy: number, page: PageSize): Rect =>
  handle === 'move' ? moved(rect, dx, dy, page) : resized(rect, handle, dx, dy, page);

/** The box between two corners, in whichever direction it was drawn; null while it is too small to be meant. */
export function drawn(from: { x: number; y: number }, to: { x: number; y: number }, page: PageSize): Rect | null {
  const x1 = clamp(snap(Math.min(from.x, to.x)), 0, page.widthMm);
  const x2 = clamp(snap(Math.max(from.x, to.x)), 0, page.widthMm);
  const y1 = clamp(snap(Math.min(from.y, to.y)), 0, page.heightMm);
  const y2 = clamp(snap(Math.max(from.y, to.y)), 0, page.heightMm);
  return x2 - x1 < smallestMm || y2 - y1 < smallestMm ? null : { x: x1, y: y1, w: x2 - x1, h: y2 - y1 };
}

const standard = { w: 62, h: 20 } as const;
const gap = 6;

/** A free place for a new box: under the lowest one that stands in the same column, else at the top of the page. */
export function freePlace(others: readonly Rect[], page: PageSize): Rect {
  const x = Math.max(0, snap(page.widthMm - standard.w - 20));
  const column = others.filter((rect) => rect.x < x + standard.w && rect.x + rect.w > x);
  const below = column.reduce((lowest, rect) => Math.max(lowest, rect.y + rect.h + gap), 20);
  const y = below + standard.h > page.heightMm ? 20 : below;
  return kept({ x, y: snap(y), ...standard }, page);
}
