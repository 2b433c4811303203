import type { Random } from '../../db/seed/truth/random';
import type { Point } from '../../server/ingest/sheet/homography';
import type { Rect } from '../../shared/sheets/geometry';
import { masterDpi } from './printed';

export const masterPxPerMm = masterDpi / 25.4;

export interface Canvas {
  readonly width: number;
  readonly height: number;
  readonly pixels: Uint8Array;
}

/** What a pen leaves: how wide, and how dark under the paper at its middle. */
export interface Pen {
  readonly widthMm: number;
  readonly levels: number;
}

/** A stroke through points in millimetres, round at its ends; the darker of what is there and the stroke stays. */
export function stroke({ width, height, pixels }: Canvas, points: readonly Point[], { widthMm, levels }: Pen): void {
  const half = (widthMm / 2) * masterPxPerMm;
  points.slice(1).forEach((end, index) => {
    const start = points[index] ?? end;
    const [ax, ay, bx, by] = [start.x, start.y, end.x, end.y].map((value) => value * masterPxPerMm) as [number, number, number, number];
    const length = (bx - ax) ** 2 + (by - ay) ** 2;
    const [left, right] = [Math.max(0, Math.floor(Math.min(ax, bx) - half - 1)), Math.min(width - 1, Math.ceil(Math.max(ax, bx) + half + 1))];
    const [top, bottom] = [Math.max(0, Math.floor(Math.min(ay, by) - half - 1)), Math.min(height - 1, Math.ceil(Math.max(ay, by) + half + 1))];
    for (let y = top; y <= bottom; y += 1) {
      for (let x = left; x <= right; x += 1) {
        const [px, py] = [x + 0.5 - ax, y + 0.5 - ay];
        const along = length > 0 ? Math.min(1, Math.max(0, (px * (bx - ax) + py * (by - ay)) / length)) : 0;
        const cover = Math.min(1, Math.max(0, half + 0.5 - Math.hypot(px - along * (bx - ax), py - along * (by - ay))));
        if (cover > 0) pixels[y * width + x] = Math.min(pixels[y * width + x] ?? 255, 255 - levels * cover);
      }
    }
  });
}

/** Figures as strokes in a square of one by one, y downwards. */
const figures: Readonly<Record<string, readonly (readonly (readonly [number, number])[])[]>> = {
  '0': [[[0.5, 0], [0.15, 0.3], [0.15, 0.7], [0.5, 1], [0.8, 0.7], [0.8, 0.3], [0.5, 0]]],
  '1': [[[0.35, 0.2], [0.55, 0], [0.5, 1]]],
  '2': [[[0.15, 0.2], [0.45, 0], [0.75, 0.25], [0.15, 1], [0.85, 0.95]]],
  '3': [[[0.2, 0.05], [0.75, 0.15], [0.4, 0.45], [0.8, 0.75], [0.4, 1], [0.15, 0.9]]],
  '4': [[[0.6, 0], [0.1, 0.65], [0.85, 0.65]], [[0.65, 0.4], [0.6, 1]]],
  '5': [[[0.8, 0], [0.25, 0.05], [0.2, 0.45], [0.7, 0.5], [0.75, 0.8], [0.4, 1], [0.15, 0.9]]],
  '6': [[[0.7, 0], [0.25, 0.5], [0.25, 0.85], [0.55, 1], [0.75, 0.75], [0.5, 0.55], [0.25, 0.75]]],
  '7': [[[0.15, 0.05], [0.85, 0], [0.4, 1]]],
  '8': [[[0.5, 0.45], [0.2, 0.2], [0.5, 0], [0.8, 0.2], [0.5, 0.45], [0.15, 0.75], [0.5, 1], [0.85, 0.75], [0.5, 0.45]]],
  '9': [[[0.75, 0.2], [0.45, 0], [0.2, 0.3], [0.5, 0.5], [0.75, 0.2], [0.65, 1]]],
  '-': [[[0.1, 0.5], [0.8, 0.45]]],
  '.': [[[0.3, 0.95], [0.38, 1]]],
};

/** Writes figures somewhere in a box, unsteadily. */
export function write(canvas: Canvas, text: string, { box, sizeMm, pen }: { box: Rect; sizeMm: number; pen: Pen }, random: Random): void {
  const room = Math.max(0, box.w - 4 - text.length * sizeMm * 0.75);
  const left = box.x + 2 + random.between(0, Math.min(room, 25));
  const top = box.y + 1.8 + random.between(0, Math.max(0, box.h - 3.6 - sizeMm));
  [...text].forEach((figure, index) => {
    for (const line of figures[figure] ?? []) {
      const points = line.map(([x, y]) => ({ x: left + (index + x) * sizeMm * 0.75 + random.normal() * 0.03 * sizeMm, y: top + y * sizeMm + random.normal() * 0.03 * sizeMm }));
      stroke(canvas, points, { ...pen, levels: pen.levels * random.between(0.92, 1.08) });
    }
  });
}
