import sharp from 'sharp';
import type { Random } from '../../db/seed/truth/random';
import { after, fitHomography, inverse, mapped, type Homography, type Point } from '../../server/ingest/sheet/homography';
import { cornersOf } from '../../server/ingest/sheet/page-map';
import type { Grey } from '../../server/ingest/sheet/pixels';
import { codePlaces, paperSizes, punchZones, type PaperSize } from '../../shared/sheets/geometry';
import type { Faults } from './faults';
import { masterPxPerMm, stroke, type Canvas } from './pen';

export interface Scan {
  readonly grey: Grey;
  /** Where a point of the paper truly is in the picture. */
  readonly truth: (point: Point) => Point;
  readonly pxPerMm: number;
}

/** What happens to the paper itself, before it is looked at. */
export function damage(canvas: Canvas, paper: PaperSize, faults: Faults, random: Random): void {
  const page = paperSizes[paper];
  const places = codePlaces(page)
    .map((place) => ({ place, at: random.next() }))
    .sort((one, other) => one.at - other.at)
    .map(({ place }) => place);
  const blot = (x: number, y: number, reach: number, share: number): void => {
    const [cx, cy, r] = [x * masterPxPerMm, y * masterPxPerMm, reach * masterPxPerMm];
    for (let row = Math.max(0, Math.floor(cy - r)); row < Math.min(canvas.height, cy + r); row += 1)
      for (let column = Math.max(0, Math.floor(cx - r)); column < Math.min(canvas.width, cx + r); column += 1)
        if (Math.hypot(column - cx, row - cy) < r) canvas.pixels[row * canvas.width + column] = (canvas.pixels[row * canvas.width + column] ?? 255) * share;
  };
  for (const { x, y } of places.slice(0, faults.stainedCodes)) for (let drop = 0; drop < 3; drop += 1) blot(x + random.between(2, 13), y + random.between(2, 13), random.between(5, 10), random.between(0.4, 0.7));
  for (const { x, y, w, h } of places.slice(0, faults.inkedCodes)) {
    for (let line = 0; line < 5; line += 1) stroke(canvas, [{ x: x - 2, y: y + random.between(0, h) }, { x: x + w + 2, y: y + random.between(0, h) }], { widthMm: 0.9, levels: 220 });
  }
  if (faults.cutCornerMm > 0) {
    const [left, top] = [random.chance(0.5), random.chance(0.5)];
    const reach = faults.cutCornerMm * masterPxPerMm;
    for (let row = 0; row < reach; row += 1)
      for (let column = 0; column < reach - row; column += 1) canvas.pixels[(top ? row : canvas.height - 1 - row) * canvas.width + (left ? column : canvas.width - 1 - column)] = faults.background;
  }
  if (faults.isPunched) for (const { x, y, w } of punchZones(page).slice(0, 2)) blot(x + w / 2, y + w / 2, 3, 0.15);
}

/** Paper to picture: turned round the middle of the picture, seen aslant, and fitted or cropped. */
function placing(paper: PaperSize, faults: Faults, random: Random): { map: Homography; width: number; height: number } {
  const { widthMm, heightMm } = paperSizes[paper];
  const perMm = (faults.dpi / 25.4) * faults.scale;
  const isLying = Math.round(faults.turnDegrees / 90) % 2 !== 0;
  const glass = [widthMm, heightMm].map((mm) => Math.round((mm * faults.dpi * (1 + 2 * faults.round)) / 25.4)) as [number, number];
  const [width, height] = isLying ? [glass[1], glass[0]] : glass;
  const turn = (faults.turnDegrees * Math.PI) / 180;
  const [across, down] = faults.aslant;
  const shift = { x: random.between(-0.5, 0.5) * perMm, y: random.between(-0.5, 0.5) * perMm };
  const square = cornersOf({ x: 0, y: 0, w: widthMm, h: heightMm });
  const pairs = square.map((from) => {
    const [u, v] = [from.x / widthMm - 0.5, from.y / heightMm - 0.5];
    const x = (from.x - widthMm / 2) * perMm * (1 + across * v) * (faults.isMirrored ? -1 : 1);
    const y = (from.y - heightMm / 2) * perMm * (1 + down * u);
    return { from, to: { x: width / 2 + shift.x + x * Math.cos(turn) - y * Math.sin(turn), y: height / 2 + shift.y + x * Math.sin(turn) + y * Math.cos(turn) } };
  });
  const map = fitHomography(pairs);
  if (!map) throw new Error('A sheet was placed on a line.');
  return { map, width, height };
}

const waveLengthMm = 130;

interface Look {
  readonly canvas: Canvas;
  readonly faults: Faults;
  readonly toMm: Homography;
  readonly phase: number;
}

function looked({ canvas, faults, toMm, phase }: Look, width: number, height: number): Uint8Array {
  const data = new Uint8Array(width * height).fill(faults.background);
  const toMaster = after([masterPxPerMm, 0, 0, 0, masterPxPerMm, 0, 0, 0, 1], toMm);
  const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0, g = 0, h = 0, i = 1] = toMaster;
  const { pixels } = canvas;
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      const depth = g * (x + 0.5) + h * (y + 0.5) + i;
      let u = (a * (x + 0.5) + b * (y + 0.5) + c) / depth;
      const v = (d * (x + 0.5) + e * (y + 0.5) + f) / depth;
      if (faults.waveMm > 0) u += faults.waveMm * masterPxPerMm * Math.sin(v / masterPxPerMm / waveLengthMm * 2 * Math.PI + phase);
      const [left, top] = [Math.floor(u - 0.5), Math.floor(v - 0.5)];
      if (left < 0 || top < 0 || left >= canvas.width - 1 || top >= canvas.height - 1) continue;
      const [right, down] = [u - 0.5 - left, v - 0.5 - top];
      const at = top * canvas.width + left;
      const level = (pixels[at]! * (1 - right) + pixels[at + 1]! * right) * (1 - down) + (pixels[at + canvas.width]! * (1 - right) + pixels[at + canvas.width + 1]! * right) * down;
      // Paper that is seen is never quite white.
      const paper = 244 - (244 - level * 0.956) * faults.contrast;
      data[y * width + x] = paper * (1 - faults.fading * ((x / width) * 0.6 + (y / height) * 0.4));
    }
  }
  return data;
}

async function filmed(data: Uint8Array, { width, height }: { width: number; height: number }, faults: Faults, random: Random): Promise<Uint8Array> {
  const raw = { width, height, channels: 1 as const };
  const blurred = faults.blurPx >= 0.3 ? new Uint8Array(await sharp(data, { raw }).blur(faults.blurPx).extractChannel(0).raw().toBuffer()) : data;
  if (faults.noise > 0) {
    const draws = Float32Array.from({ length: 4096 }, () => random.normal() * faults.noise);
    let state = random.whole(1, 1 << 30);
    for (let at = 0; at < blurred.length; at += 1) {
      state = (Math.imul(state, 1664525) + 1013904223) | 0;
      blurred[at] = Math.max(0, Math.min(255, blurred[at]! + draws[(state >>> 12) & 4095]!));
    }
  }
  const shown = faults.isBilevel ? blurred.map((level) => (level < 150 ? 0 : 255)) : faults.isNegative ? blurred.map((level) => 255 - level) : blurred;
  if (faults.isBilevel) return shown;
  const jpeg = await sharp(shown, { raw }).jpeg({ quality: faults.jpeg }).toBuffer();
  return new Uint8Array(await sharp(jpeg).extractChannel(0).raw().toBuffer());
}

/** The picture of a sheet with all its faults, and where everything on it truly is. */
export async function scan(canvas: Canvas, paper: PaperSize, faults: Faults, random: Random): Promise<Scan> {
  damage(canvas, paper, faults, random);
  const { map, width, height } = placing(paper, faults, random);
  const phase = random.between(0, 6);
  const data = looked({ canvas, faults, toMm: inverse(map), phase }, width, height);
  // The wave moves paper sideways only, by its height, so that it is undone exactly.
  const truth = ({ x, y }: Point): Point => mapped(map, { x: x - faults.waveMm * Math.sin((y / waveLengthMm) * 2 * Math.PI + phase), y });
  return { grey: { width, height, data: await filmed(data, { width, height }, faults, random) }, truth, pxPerMm: (faults.dpi / 25.4) * faults.scale };
}
