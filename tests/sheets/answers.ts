import type { Random } from '../../db/seed/truth/random';
import type { SheetBox } from '../../server/ingest/sheet/layout';
import { masterPxPerMm, stroke, write, type Canvas, type Pen } from './pen';

export const kinds = ['empty', 'smudge', 'shadow', 'pen', 'pencil', 'faint pencil', 'crossed out', 'thin figure', 'tiny'] as const;
export type Kind = (typeof kinds)[number];

export const isWritten = (kind: Kind): boolean => kind !== 'empty' && kind !== 'smudge' && kind !== 'shadow';

/** A soft dark patch: a finger, or writing shining through from behind. */
function patch({ width, height, pixels }: Canvas, { x, y, rx, ry, levels }: { x: number; y: number; rx: number; ry: number; levels: number }): void {
  const [cx, cy, a, b] = [x, y, rx, ry].map((value) => value * masterPxPerMm) as [number, number, number, number];
  for (let row = Math.max(0, Math.floor(cy - b)); row < Math.min(height, cy + b); row += 1) {
    for (let column = Math.max(0, Math.floor(cx - a)); column < Math.min(width, cx + a); column += 1) {
      const distance = ((column - cx) / a) ** 2 + ((row - cy) / b) ** 2;
      if (distance >= 1) continue;
      const at = row * width + column;
      pixels[at] = Math.max(0, (pixels[at] ?? 255) - levels * (1 - distance) ** 2);
    }
  }
}

const number = (random: Random): string => `${random.whole(1, 9)}.${random.whole(0, 9)}${random.whole(0, 9)}`;

/** Puts a thing into a box. Levels under the paper as measured on pencil and ball pen scans, from memory. */
export function fill(canvas: Canvas, box: SheetBox, kind: Kind, random: Random): void {
  const put = (text: string, sizeMm: number, pen: Pen): void => write(canvas, text, { box, sizeMm, pen }, random);
  const ballPen: Pen = { widthMm: random.between(0.35, 0.55), levels: random.between(130, 200) };
  switch (kind) {
    case 'empty':
      return;
    case 'smudge':
      return patch(canvas, { x: box.x + random.between(5, box.w - 5), y: box.y + box.h / 2, rx: random.between(6, 14), ry: random.between(3, 6), levels: random.between(15, 40) });
    case 'shadow':
      return patch(canvas, { x: box.x + box.w / 2, y: box.y + random.between(0, box.h), rx: 40, ry: 15, levels: random.between(10, 30) });
    case 'pen':
      return put(number(random), random.between(5, 9), ballPen);
    case 'pencil':
      return put(number(random), random.between(5, 8), { widthMm: random.between(0.4, 0.6), levels: random.between(59, 87) });
    case 'faint pencil':
      return put(number(random), random.between(5, 8), { widthMm: random.between(0.4, 0.6), levels: random.between(33, 47) });
    case 'crossed out': {
      put(number(random), random.between(5, 8), ballPen);
      const y = box.y + box.h / 2;
      return stroke(canvas, [{ x: box.x + 4, y: y + 2 }, { x: box.x + box.w - 12, y: y - 1.5 }], ballPen);
    }
    case 'thin figure':
      return put(String(random.whole(1, 9)), random.between(5, 7), { widthMm: 0.3, levels: random.between(90, 150) });
    case 'tiny':
      return put(random.pick(['-', '0', '1']), random.between(4, 5), { ...ballPen, widthMm: 0.4 });
  }
}
