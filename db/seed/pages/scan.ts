import sharp from 'sharp';
import { randomFrom } from '../truth/random';
import type { Random } from '../truth/random';
import { PAGE_HEIGHT_MM, PAGE_WIDTH_MM, sheetBoxes } from './sheet-layout';

/** A4 at 150 dots to the inch. */
export const SCAN_WIDTH_PX = 1240;
export const SCAN_HEIGHT_PX = 1754;

const MAX_SKEW_DEGREES = 0.8;
const MAX_SHIFT_MM = 0.3;

/** How one sheet lay on the glass. */
export interface ScanPose {
  readonly skewDegrees: number;
  readonly shiftXMm: number;
  readonly shiftYMm: number;
}

export const flat: ScanPose = { skewDegrees: 0, shiftXMm: 0, shiftYMm: 0 };

/** Most sheets lie within 0.4 degrees, none beyond 0.8; the shift is at most 0.3 mm either way. */
export function scanPose(seed: string, candidate: string, pageNo: number): ScanPose {
  const random = randomFrom(seed, 'pose', candidate, pageNo);
  return {
    skewDegrees: (random.between(-1, 1) + random.between(-1, 1)) * (MAX_SKEW_DEGREES / 2),
    shiftXMm: random.between(-MAX_SHIFT_MM, MAX_SHIFT_MM),
    shiftYMm: random.between(-MAX_SHIFT_MM, MAX_SHIFT_MM),
  };
}

/** Where a point of the printed page lies on the scan, both in mm. Skew turns clockwise round the middle of the page. */
export function onScan(pose: ScanPose, x: number, y: number): { readonly x: number; readonly y: number } {
  const turn = (pose.skewDegrees * Math.PI) / 180;
  const [dx, dy] = [x - PAGE_WIDTH_MM / 2, y - PAGE_HEIGHT_MM / 2];
  return {
    x: PAGE_WIDTH_MM / 2 + dx * Math.cos(turn) - dy * Math.sin(turn) + pose.shiftXMm,
    y: PAGE_HEIGHT_MM / 2 + dx * Math.sin(turn) + dy * Math.cos(turn) + pose.shiftYMm,
  };
}

/** How far the farthest corner of any box lies from where it was printed. */
export function boxDisplacementMm(pose: ScanPose, itemCount: number): number {
  let farthest = 0;
  for (const { x, y, w, h } of sheetBoxes(itemCount)) {
    for (const [cornerX, cornerY] of [[x, y], [x + w, y], [x, y + h], [x + w, y + h]] as const) {
      const there = onScan(pose, cornerX, cornerY);
      farthest = Math.max(farthest, Math.hypot(there.x - cornerX, there.y - cornerY));
    }
  }
  return farthest;
}

/** The page as it lies on the glass: the lid behind it, the edge's shadow, and the sheet turned and shifted. */
export function onTheGlass(pose: ScanPose, sheet: string): string {
  const [midX, midY] = [PAGE_WIDTH_MM / 2, PAGE_HEIGHT_MM / 2];
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${SCAN_WIDTH_PX}" height="${SCAN_HEIGHT_PX}" viewBox="0 0 ${PAGE_WIDTH_MM} ${PAGE_HEIGHT_MM}" preserveAspectRatio="none">`,
    `<rect width="${PAGE_WIDTH_MM}" height="${PAGE_HEIGHT_MM}" fill="#dcdcda"/>`,
    `<g transform="translate(${pose.shiftXMm.toFixed(4)} ${pose.shiftYMm.toFixed(4)}) rotate(${pose.skewDegrees.toFixed(5)} ${midX} ${midY})">`,
    `<rect x="-0.1" y="-0.1" width="${PAGE_WIDTH_MM + 0.6}" height="${PAGE_HEIGHT_MM + 0.5}" fill="#8f8f8c" fill-opacity="0.6"/>`,
    `<rect width="${PAGE_WIDTH_MM}" height="${PAGE_HEIGHT_MM}" fill="#fff"/>`,
    sheet,
    '</g></svg>',
  ].join('');
}

const TILE = 512;
const LAST = TILE - 1;
/** Light and grain are counted in 256ths of a grey level, so that the pass over the pixels stays in whole numbers. */
const FINE = 256;
let noiseTile: Int16Array | undefined;

/** Sensor noise on bare paper, the same tile for every page and each page at its own place in it. */
function noise(): Int16Array {
  if (noiseTile) return noiseTile;
  const random = randomFrom('scanner noise');
  noiseTile = Int16Array.from({ length: TILE * TILE }, () => Math.round(random.normal() * 1.9 * FINE));
  return noiseTile;
}

/** Paper is no pure white, and warmer than the ink. */
const PAPER = [241, 240, 235] as const;

/** Ink takes its grain from the paper: full ink shows this many times the grain of bare paper. */
const INK_GRAIN = 4;

/** What a cheap office scanner makes of the page: soft edges, grain, one side darker, and JPEG. */
export async function scanned(svg: string, random: Random): Promise<Buffer> {
  const drawn = await sharp(Buffer.from(svg)).ensureAlpha().raw().toBuffer();
  const pixels = exposed(drawn, random);
  return sharp(pixels, { raw: { width: SCAN_WIDTH_PX, height: SCAN_HEIGHT_PX, channels: 3 } })
    .withDensity(150)
    .jpeg({ quality: 74, chromaSubsampling: '4:2:0', optimiseCoding: false })
    .toBuffer();
}

/** Uneven light, blur and grain in one pass over the pixels, four bytes each in, three out. */
function exposed(drawn: Buffer, random: Random): Uint8ClampedArray {
  const width = SCAN_WIDTH_PX;
  const height = SCAN_HEIGHT_PX;
  const grain = noise();
  const out = new Uint8ClampedArray(width * height * 3);
  const offsetX = random.whole(0, LAST);
  const offsetY = random.whole(0, LAST);
  const { lightX, lightY } = light(random);
  /** The share of each of the four neighbours in a pixel, in 256ths. */
  const soft = random.whole(26, 36);
  const white = new Int32Array(drawn.buffer, drawn.byteOffset, width * height);
  const paperRed = PAPER[0] * FINE;
  const paperGreen = PAPER[1] * FINE;
  const paperBlue = PAPER[2] * FINE;
  let pixel = 0;
  let write = 0;
  for (let y = 0; y < height; y += 1) {
    const row = ((y + offsetY) & LAST) * TILE;
    const rowLight = lightY[y] as number;
    const up = y === 0 ? 0 : width;
    const down = y === height - 1 ? 0 : width;
    for (let x = 0; x < width; x += 1) {
      const speck = grain[row + ((x + offsetX) & LAST)] as number;
      const lit = rowLight + (lightX[x] as number);
      const around =
        (white[pixel] as number) &
        (white[pixel - up] as number) &
        (white[pixel + down] as number) &
        (white[pixel - 1] as number) &
        (white[pixel + 1] as number);
      if (around === -1) {
        const shift = lit + speck;
        out[write] = (paperRed + shift) >> 8;
        out[write + 1] = (paperGreen + shift) >> 8;
        out[write + 2] = (paperBlue + shift) >> 8;
      } else {
        const at = pixel * 4;
        const green = blurred(drawn, at + 1, up * 4, down * 4, soft);
        const shift = lit + speck + ((speck * (255 - green) * INK_GRAIN) >> 8);
        out[write] = (blurred(drawn, at, up * 4, down * 4, soft) * PAPER[0] + shift) >> 8;
        out[write + 1] = (green * PAPER[1] + shift) >> 8;
        out[write + 2] = (blurred(drawn, at + 2, up * 4, down * 4, soft) * PAPER[2] + shift) >> 8;
      }
      write += 3;
      pixel += 1;
    }
  }
  return out;
}

/** One byte softened by its four neighbours; 256 at white, as a factor of the paper. */
function blurred(bytes: Buffer, at: number, up: number, down: number, soft: number): number {
  const around =
    (bytes[at - 4] ?? 255) + (bytes[at + 4] ?? 255) + (bytes[at - up] as number) + (bytes[at + down] as number);
  const value = ((256 - 4 * soft) * (bytes[at] as number) + soft * around) >> 8;
  return value + (value >> 7);
}

/** Lamp and lid: one side darker than the other, and both darker than the middle. */
function light(random: Random): { readonly lightX: Int32Array; readonly lightY: Int32Array } {
  const slopeX = random.between(-9, 9);
  const slopeY = random.between(-7, 7);
  const bow = random.between(2, 9);
  const level = random.between(2, 8);
  const fall = (length: number, slope: number, bend: number, base: number): Int32Array =>
    Int32Array.from({ length }, (_, index) => {
      const from = index / length - 0.5;
      return Math.round((slope * from - bend * from * from + base) * FINE);
    });
  return { lightX: fall(SCAN_WIDTH_PX, slopeX, 2 * bow, level), lightY: fall(SCAN_HEIGHT_PX, slopeY, bow, 0) };
}
