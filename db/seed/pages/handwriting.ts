import type { Hand, HandFont, Pen } from '../truth/hands';
import type { Random } from '../truth/random';
import { openFour } from './open-four';
import { outline, pathData } from './outlines';
import type { Outline, Piece, Point } from './outlines';

const inks: Record<Pen, readonly string[]> = {
  blue: ['#1d2f7a', '#22398c', '#2b3f7d'],
  black: ['#26262c', '#1f2023', '#33323a'],
  pencil: ['#5c5c60', '#66666a', '#55555a'],
};

/** What a pen left, as path data in hundredths of a mm: filled shapes, and lines of the pen's width. */
export interface Ink {
  readonly shapes: string;
  readonly lines: string;
}

export const joined = (inks: readonly Ink[]): Ink => ({
  shapes: inks.map((ink) => ink.shapes).join(''),
  lines: inks.map((ink) => ink.lines).join(''),
});

export interface Stroke {
  readonly hand: Hand;
  readonly random: Random;
}

/** NOTE: few long paths, since every path costs the drawing library far more than the points in it. */
export function inkSvg({ shapes, lines }: Ink, hand: Hand, strength: number): string {
  const shades = inks[hand.pen];
  const shade = shades[Math.floor(hand.strokeMm * 1000) % shades.length] ?? '#22398c';
  const opacity = strength.toFixed(2);
  return [
    '<g transform="scale(.01)">',
    shapes && `<path fill="${shade}" fill-opacity="${opacity}" d="${shapes}"/>`,
    lines &&
      `<path fill="none" stroke="${shade}" stroke-opacity="${opacity}" stroke-width="${Math.round(hand.strokeMm * 100)}" stroke-linecap="round" stroke-linejoin="round" d="${lines}"/>`,
    '</g>',
  ].join('');
}

interface FontMeasure {
  /** Height of a digit and width of the pen, as shares of the font size. */
  readonly digit: number;
  readonly stem: number;
}

const measures = new Map<HandFont, FontMeasure>();

/** A line of ink of length L and width w has about the area L w and the edge 2 L; so w is twice the area over the edge. */
function measure(name: HandFont): FontMeasure {
  const known = measures.get(name);
  if (known) return known;
  let area = 0;
  let edge = 0;
  let top = 0;
  for (const digit of '0235789') {
    for (const contour of outline(name, digit).contours) {
      area += signedArea(contour);
      contour.forEach((point, index) => {
        const next = contour[(index + 1) % contour.length] ?? point;
        edge += Math.hypot(next.x - point.x, next.y - point.y);
        if (digit === '5') top = Math.max(top, -point.y);
      });
    }
  }
  const made = { digit: top, stem: (2 * Math.abs(area)) / edge };
  measures.set(name, made);
  return made;
}

function signedArea(contour: readonly Point[]): number {
  let twice = 0;
  contour.forEach((point, index) => {
    const next = contour[(index + 1) % contour.length] ?? point;
    twice += point.x * next.y - next.x * point.y;
  });
  return twice / 2;
}

export interface Line {
  readonly text: string;
  readonly x: number;
  readonly baseline: number;
  readonly digitMm: number;
  /** The line is drawn closer together rather than run past this. */
  readonly maxWidth: number;
}

export interface Drawn extends Ink {
  readonly width: number;
}

/** Characters that not every hand's font has, as a hand would write them. */
const writable: Readonly<Record<string, string>> = { '−': '-', '×': 'x', '–': '-' };

const SPACE_EM = 0.3;

/** A line in a candidate's hand; two figures in braces, such as {1/7}, are drawn as one that could be either. */
export function handwritten({ hand, random }: Stroke, line: Line): Drawn {
  const { digit, stem } = measure(hand.font);
  const marks = marksOf(line.text);
  const advanceOf = (mark: string): number =>
    mark === ' ' ? SPACE_EM : mark.length > 1 ? 0.72 * digit : figure(hand.font, mark).advance * hand.spread;
  const natural = marks.reduce((sum, mark) => sum + advanceOf(mark), 0) * (line.digitMm / digit);
  const size = (line.digitMm / digit) * Math.min(1, line.maxWidth / natural);
  // Small writing is done with a lighter hand.
  const penMm = hand.strokeMm * (0.5 + 0.5 * Math.min(1, line.digitMm / hand.digitMm));
  const grow = Math.max(-0.38 * stem, (penMm / size - stem) / 2);
  const drift = random.between(-0.012, 0.016) * hand.unrest;
  const wave = random.between(0, 6);
  let at = 0;
  let shapes = '';
  let lines = '';
  for (const mark of marks) {
    const width = advanceOf(mark) * size;
    if (mark !== ' ') {
      const rise = (drift * at + Math.sin(wave + at / 7) * 0.03 * line.digitMm + random.normal() * 0.018 * line.digitMm) * hand.unrest;
      const origin = { x: line.x + at, y: line.baseline - rise };
      if (mark.length > 1) lines += between(mark, { hand, random }, origin, size * digit);
      else shapes += glyph(figure(hand.font, mark), { hand, random }, origin, size, grow);
    }
    at += width * (1 + random.normal() * 0.035 * hand.unrest);
  }
  return { shapes, lines, width: at };
}

/** A character as a hand writes it: the font's own, but for a 4 that would pass for a 9. */
const figure = (name: HandFont, mark: string): Outline =>
  mark === '4' && (name === 'kalam' || name === 'kalam-light') ? openFour(measure(name).digit, measure(name).stem) : outline(name, mark);

function marksOf(text: string): string[] {
  const marks: string[] = [];
  for (const [mark] of text.matchAll(/\{[^}]+\}|[\s\S]/gu)) marks.push(writable[mark] ?? mark);
  return marks;
}

/** Corners closer than this, in hundredths of a mm, are left out: a scan dot is 17 wide. */
const CLOSE = 9;

/** One character: turned, slanted, stretched and bent a little, and its edge moved to give the pen's width. */
function glyph({ contours }: Outline, { hand, random }: Stroke, origin: Point, size: number, grow: number): string {
  const { unrest } = hand;
  const turn = random.normal() * 0.028 * unrest;
  const slant = Math.tan((hand.slantDegrees * Math.PI) / 180) + random.normal() * 0.02 * unrest;
  const wide = (1 + random.normal() * 0.04 * unrest) * size * 100;
  const tall = (1 + random.normal() * 0.04 * unrest) * size * 100;
  const phaseX = random.between(0, 6.28);
  const phaseY = random.between(0, 6.28);
  const bend = 0.011 * unrest;
  const weight = grow * (1 + random.normal() * 0.12 * unrest);
  let area = 0;
  for (const contour of contours) area += signedArea(contour);
  const outward = area > 0 ? weight : -weight;
  let data = '';
  for (const contour of contours) {
    const count = contour.length;
    let penX = 0;
    let penY = 0;
    for (let index = 0; index < count; index += 1) {
      const point = contour[index] as Point;
      const before = contour[(index + count - 1) % count] as Point;
      const after = contour[(index + 1) % count] as Point;
      const dx = after.x - before.x;
      const dy = after.y - before.y;
      const length = Math.hypot(dx, dy) || 1;
      const px = point.x + (dy / length) * outward;
      const py = point.y - (dx / length) * outward;
      const bentX = px + bend * Math.sin(phaseX + py * 9) - slant * py;
      const bentY = py + bend * Math.sin(phaseY + px * 9);
      const x = Math.round(origin.x * 100 + wide * (bentX - turn * bentY));
      const y = Math.round(origin.y * 100 + tall * (bentY + turn * bentX));
      if (index === 0) data += `M${x} ${y}`;
      else if (Math.abs(x - penX) + Math.abs(y - penY) < CLOSE) continue;
      else data += `l${x - penX} ${y - penY}`;
      penX = x;
      penY = y;
    }
    data += 'Z';
  }
  return data;
}

const curve = (...numbers: readonly number[]): Piece => ({
  letter: 'C',
  points: [0, 2, 4].map((index) => ({ x: numbers[index] ?? 0, y: numbers[index + 1] ?? 0 })),
});
const start = (x: number, y: number): Piece => ({ letter: 'M', points: [{ x, y }] });

/** Figures that could be either of two, as pen lines one digit high: x to the right, y downwards from the baseline. */
const betweenShapes: Readonly<Record<string, readonly Piece[]>> = {
  // A 1 with a long flag, or a narrow 7.
  '{1/7}': [start(0.08, -0.8), curve(0.17, -0.86, 0.31, -0.92, 0.45, -0.97), curve(0.41, -0.66, 0.34, -0.33, 0.26, 0.01)],
  // A 4 that closes at the top, or a 9 with a pointed bowl.
  '{4/9}': [
    start(0.41, -0.97),
    curve(0.27, -0.8, 0.11, -0.6, 0.08, -0.45),
    curve(0.14, -0.37, 0.34, -0.38, 0.5, -0.45),
    start(0.51, -0.88),
    curve(0.5, -0.6, 0.46, -0.3, 0.41, 0.03),
  ],
};

export const canBeUnclear = (pair: string): boolean => `{${pair}}` in betweenShapes;

function between(mark: string, { hand, random }: Stroke, origin: Point, digitMm: number): string {
  const shape = betweenShapes[mark];
  if (!shape) throw new RangeError(`No figure is drawn for ${mark}.`);
  const slant = Math.tan((hand.slantDegrees * Math.PI) / 180) * 0.5 + random.normal() * 0.03 * hand.unrest;
  return pathData(shape, ({ x, y }) => ({ x: origin.x + digitMm * (x - slant * y), y: origin.y + digitMm * y }));
}

/** A pen line through the points, bent as a hand bends it. */
export function penLine(points: readonly Point[]): Ink {
  const pieces: Piece[] = points.map((point, index) => {
    const next = points[index + 1];
    if (index === 0) return { letter: 'M', points: [point] };
    const end = next ? { x: (point.x + next.x) / 2, y: (point.y + next.y) / 2 } : point;
    return { letter: 'Q', points: [point, end] };
  });
  return { shapes: '', lines: pathData(pieces, (point) => point) };
}
