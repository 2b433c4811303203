import { fileURLToPath } from 'node:url';
import type PDFDocument from 'pdfkit';
import { printRuns, type RunStyle } from './print-runs';

export type Document = InstanceType<typeof PDFDocument>;

const file = (name: string): string => fileURLToPath(new URL(`../../assets/fonts/${name}.ttf`, import.meta.url));
export const fonts = {
  text: file('AtkinsonHyperlegibleNext_400Regular'),
  strong: file('AtkinsonHyperlegibleNext_600SemiBold'),
  value: file('AtkinsonHyperlegibleMono_500Medium'),
  symbol: file('STIXTwoText_400Regular_Italic'),
} as const;

export interface Part {
  readonly fount: Exclude<keyof typeof fonts, 'symbol'>;
  readonly size: number;
  readonly text: string;
}

interface Piece {
  readonly fount: keyof typeof fonts;
  readonly font: string;
  readonly size: number;
  readonly text: string;
  /** How far its baseline lies below the top of the line. */
  readonly baseline: number;
  readonly width: number;
}

/** In sizes of the text: the baseline below the top of a line, the drop of a subscript, the height of a line. */
export const ascent = 0.95;
const drop = 0.18;
const lineHeight = 1.32;
const scale: Readonly<Record<RunStyle, number>> = { plain: 1, symbol: 1.06, subscript: 0.7 };

/** Pieces without spaces stay together, however many founts they need; longer ones than this may be cut. */
const longestWord = 40;

function piecesOf(document: Document, { fount, size, text }: Part): Piece[] {
  return printRuns(text).flatMap(({ style, text: run }) => {
    const own = style === 'symbol' ? 'symbol' : fount;
    const font = fonts[own];
    const set = document.font(font).fontSize(size * scale[style]);
    const baseline = size * (style === 'subscript' ? ascent + drop : ascent);
    const tokens = run.match(new RegExp(`\\n|[^\\S\\n]+|\\S{1,${longestWord}}`, 'g')) ?? [];
    return tokens.map((token) => ({ fount: own, font, size: size * scale[style], text: token, baseline, width: token === '\n' ? 0 : set.widthOfString(token) }));
  });
}

/** Words, spaces and line breaks, each of one piece or more. */
function wordsOf(pieces: readonly Piece[]): Piece[][] {
  const words: Piece[][] = [];
  let length = 0;
  for (const piece of pieces) {
    const open = words.at(-1);
    const joins = open !== undefined && piece.text.trim() !== '' && open[0]?.text.trim() !== '' && length + piece.text.length <= longestWord;
    length = joins ? length + piece.text.length : piece.text.length;
    if (joins) open.push(piece);
    else words.push([piece]);
  }
  return words;
}

/** A piece with its place in a line: `x` from where the line begins. */
export interface SetPiece extends Piece {
  readonly x: number;
}

/** Text in lines no wider than the room, broken between words only. Pieces are placed, not drawn. */
export function linesOf(document: Document, room: number, parts: readonly Part[]): SetPiece[][] {
  const lines: SetPiece[][] = [[]];
  let x = 0;
  const nextLine = (): void => {
    lines.push([]);
    x = 0;
  };
  for (const word of wordsOf(parts.flatMap((part) => piecesOf(document, part)))) {
    const isBlank = word[0]?.text.trim() === '';
    const width = word.reduce((sum, piece) => sum + piece.width, 0);
    if (word[0]?.text === '\n' || (!isBlank && x > 0 && x + width > room)) nextLine();
    if (word[0]?.text === '\n' || (isBlank && x === 0)) continue;
    for (const piece of word) {
      if (!isBlank) lines.at(-1)?.push({ ...piece, x });
      x += piece.width;
    }
  }
  return lines;
}

/** Sets a paragraph at the left margin, in lines that break between words only, over as many pages as it needs. */
export function paragraph(document: Document, ...parts: readonly Part[]): Document {
  const { left, right, bottom } = document.page.margins;
  const height = Math.max(...parts.map(({ size }) => size)) * lineHeight;
  let { y } = document;
  linesOf(document, document.page.width - left - right, parts).forEach((line, index) => {
    if (index > 0) y += height;
    if (line.length > 0 && y + height > document.page.height - bottom) {
      document.addPage();
      y = document.page.margins.top;
    }
    for (const piece of line) document.font(piece.font).fontSize(piece.size).text(piece.text, left + piece.x, y, { lineBreak: false, baseline: -piece.baseline });
  });
  document.x = left;
  document.y = y + height;
  return document.font(fonts.text).fontSize(parts[0]?.size ?? 10);
}
