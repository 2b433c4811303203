import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Font } from 'opentype.js';
import type { HandFont } from '../truth/hands';

export type PrintFont = 'regular' | 'semibold' | 'mono' | 'serif-italic';
export type FontName = HandFont | PrintFont;

const files: Record<FontName, string> = {
  regular: 'atkinson-hyperlegible-next/400Regular/AtkinsonHyperlegibleNext_400Regular.ttf',
  semibold: 'atkinson-hyperlegible-next/600SemiBold/AtkinsonHyperlegibleNext_600SemiBold.ttf',
  mono: 'atkinson-hyperlegible-mono/600SemiBold/AtkinsonHyperlegibleMono_600SemiBold.ttf',
  'serif-italic': 'stix-two-text/400Regular_Italic/STIXTwoText_400Regular_Italic.ttf',
  caveat: 'caveat/400Regular/Caveat_400Regular.ttf',
  'kalam-light': 'kalam/300Light/Kalam_300Light.ttf',
  kalam: 'kalam/400Regular/Kalam_400Regular.ttf',
  gochi: 'gochi-hand/400Regular/GochiHand_400Regular.ttf',
  reenie: 'reenie-beanie/400Regular/ReenieBeanie_400Regular.ttf',
  nothing: 'nothing-you-could-do/400Regular/NothingYouCouldDo_400Regular.ttf',
};

const find = createRequire(import.meta.url);
// NOTE: Node takes the package's older build, whose names an import statement cannot see.
const { parse } = find('opentype.js') as typeof import('opentype.js');
const fonts = new Map<FontName, Font>();

/** The packaged font, read once a process. */
export function font(name: FontName): Font {
  const known = fonts.get(name);
  if (known) return known;
  const bytes = readFileSync(find.resolve(`@expo-google-fonts/${files[name]}`));
  const parsed = parse(bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength));
  fonts.set(name, parsed);
  return parsed;
}

export interface Point {
  readonly x: number;
  readonly y: number;
}

/** A piece of a character's edge, in units of the font size, y downwards from the baseline. */
export type Piece = { readonly letter: 'M' | 'L' | 'Q' | 'C'; readonly points: readonly Point[] } | { readonly letter: 'Z'; readonly points: readonly [] };

/** One character, in the same units. */
export interface Outline {
  readonly advance: number;
  readonly pieces: readonly Piece[];
  /** Closed curves as corner points; the last is not the first again. */
  readonly contours: readonly (readonly Point[])[];
}

const outlines = new Map<string, Outline>();

/** The outline of one character, worked out once a process. Throws for a character that the font lacks. */
export function outline(name: FontName, character: string): Outline {
  const key = `${name} ${character}`;
  const known = outlines.get(key);
  if (known) return known;
  const source = font(name);
  if (!source.charToGlyphIndex(character)) throw new RangeError(`The font ${name} has no ${character}.`);
  const glyph = source.charToGlyph(character);
  const pieces = glyph.getPath(0, 0, 1).commands.map(pieceOf);
  const made = { advance: (glyph.advanceWidth ?? 0) / source.unitsPerEm, pieces, contours: cornersOf(pieces) };
  outlines.set(key, made);
  return made;
}

type Command = ReturnType<Font['getPath']>['commands'][number];

function pieceOf(command: Command): Piece {
  switch (command.type) {
    case 'Z':
      return { letter: 'Z', points: [] };
    case 'M':
    case 'L':
      return { letter: command.type, points: [{ x: command.x, y: command.y }] };
    case 'Q':
      return { letter: 'Q', points: [{ x: command.x1, y: command.y1 }, { x: command.x, y: command.y }] };
    case 'C':
      return {
        letter: 'C',
        points: [{ x: command.x1, y: command.y1 }, { x: command.x2, y: command.y2 }, { x: command.x, y: command.y }],
      };
  }
}

/**
 * Path data in whole hundredths of a mm for points that `place` puts on the page, in mm; to be drawn under scale(.01).
 * NOTE: the path writer of opentype.js 2.0.0 drops curves when it rounds. Steps are relative: short text is read faster.
 */
export function pathData(pieces: readonly Piece[], place: (point: Point) => Point): string {
  let fromX = 0;
  let fromY = 0;
  let data = '';
  for (const { letter, points } of pieces) {
    if (letter === 'Z') {
      data += 'z';
      continue;
    }
    const isStart = letter === 'M';
    let [x, y] = [fromX, fromY];
    let numbers = '';
    for (const point of points) {
      const placed = place(point);
      x = Math.round(placed.x * 100);
      y = Math.round(placed.y * 100);
      numbers += `${numbers && ' '}${isStart ? x : x - fromX} ${isStart ? y : y - fromY}`;
    }
    data += (isStart ? letter : letter.toLowerCase()) + numbers;
    [fromX, fromY] = [x, y];
  }
  return data;
}

/** NOTE: not every font's contours end in a Z, so a new M closes the one before. */
function cornersOf(pieces: readonly Piece[]): Point[][] {
  const contours: Point[][] = [];
  let open: Point[] = [];
  for (const { letter, points } of pieces) {
    if (letter === 'Z') continue;
    if (letter === 'M') contours.push((open = []));
    const from = open.at(-1);
    const steps = letter === 'Q' ? 3 : letter === 'C' ? 4 : 1;
    for (let step = 1; step <= steps; step += 1) open.push(along(from ? [from, ...points] : points, step / steps));
  }
  return contours.map(withoutRepeats).filter((contour) => contour.length > 2);
}

/** A point of the curve with these control points (de Casteljau). */
function along(points: readonly Point[], t: number): Point {
  const [first, ...rest] = points;
  if (!first) throw new RangeError('A curve needs a point.');
  if (rest.length === 0) return first;
  return along(
    rest.map((point, index) => {
      const before = points[index] ?? point;
      return { x: before.x + (point.x - before.x) * t, y: before.y + (point.y - before.y) * t };
    }),
    t,
  );
}

/** Points closer than a 250th of the font size say nothing and have no clear direction. */
function withoutRepeats(points: readonly Point[]): Point[] {
  const kept: Point[] = [];
  const near = (a: Point, b: Point): boolean => Math.hypot(a.x - b.x, a.y - b.y) < 0.004;
  for (const point of points) {
    const last = kept.at(-1);
    if (!last || !near(last, point)) kept.push(point);
  }
  const [first] = kept;
  const last = kept.at(-1);
  if (first && last && kept.length > 3 && near(first, last)) kept.pop();
  return kept;
}
