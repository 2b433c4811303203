import type { Grey } from './pixels';

export interface Region extends Grey {
  readonly pxPerMm: number;
}

interface Piece {
  readonly pixels: number;
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** What hangs together with a strong pixel counts down to this share of the threshold. */
const hysteresis = 0.75;
const leastPieceMm2 = 0.12;
/** A streak of the scanner or a fold runs from edge to edge and is no wider than this. */
const widestStreakMm = 1.2;
/** What the frame left at the edge. */
const sliverMm = 0.5;

/** One connected piece of pixels at or above a level, neighbours across corners included; marks its pixels as seen. */
function pieceFrom({ width, height, data }: Grey, start: number, level: number, seen: Uint8Array): Piece {
  const stack = [start];
  seen[start] = 1;
  const piece = { pixels: 0, left: width, right: 0, top: height, bottom: 0 };
  for (let at = stack.pop(); at !== undefined; at = stack.pop()) {
    const x = at % width;
    const y = (at - x) / width;
    piece.pixels += 1;
    piece.left = Math.min(piece.left, x);
    piece.right = Math.max(piece.right, x);
    piece.top = Math.min(piece.top, y);
    piece.bottom = Math.max(piece.bottom, y);
    for (let row = Math.max(0, y - 1); row <= Math.min(height - 1, y + 1); row += 1) {
      for (let column = Math.max(0, x - 1); column <= Math.min(width - 1, x + 1); column += 1) {
        const near = row * width + column;
        if (seen[near] || data[near]! < level) continue;
        seen[near] = 1;
        stack.push(near);
      }
    }
  }
  return piece;
}

function isInk({ pixels, left, right, top, bottom }: Piece, { width, height, pxPerMm }: Region): boolean {
  if (pixels < leastPieceMm2 * pxPerMm ** 2) return false;
  const [wide, high] = [(right - left + 1) / pxPerMm, (bottom - top + 1) / pxPerMm];
  const [fromSideToSide, fromTopToBottom] = [left === 0 && right === width - 1, top === 0 && bottom === height - 1];
  if ((fromTopToBottom && wide <= widestStreakMm) || (fromSideToSide && high <= widestStreakMm)) return false;
  const isAtSide = left === 0 || right === width - 1;
  const isAtEnd = top === 0 || bottom === height - 1;
  return !(isAtSide && wide <= sliverMm) && !(isAtEnd && high <= sliverMm);
}

/** Square millimetres of all pieces of ink that reach a threshold somewhere. */
export function areaOfPieces(region: Region, threshold: number): number {
  const { data, pxPerMm } = region;
  const seen = new Uint8Array(data.length);
  let pixels = 0;
  for (let start = 0; start < data.length; start += 1) {
    if (seen[start] || data[start]! < threshold) continue;
    const piece = pieceFrom(region, start, threshold * hysteresis, seen);
    if (isInk(piece, region)) pixels += piece.pixels;
  }
  return pixels / pxPerMm ** 2;
}
