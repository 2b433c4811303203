import { outline, pathData } from './outlines';
import type { PrintFont } from './outlines';
import {
  FRAME_MM,
  LEFT_MM,
  PAGE_HEIGHT_MM,
  PAGE_WIDTH_MM,
  RIGHT_MM,
  CORNER_MM,
  pageCount,
  pageOfItem,
  placeOfItem,
} from './sheet-layout';

export interface PrintedItem {
  readonly number: number;
  readonly marks: number;
  /** Plain text; `Z_eff`, `3p`, sigma and raised charges such as `Mg²⁺` are set as a printer would. */
  readonly prompt: string;
}

export interface PrintedSheet {
  readonly title: string;
  readonly lines: readonly string[];
  readonly items: readonly PrintedItem[];
}

interface Run {
  readonly text: string;
  readonly font: PrintFont;
  readonly scale: number;
  /** Above the baseline, as a share of the size. */
  readonly rise: number;
}

const INK = '#262624';
const SOFT_INK = '#6b6b68';
const RULE = '#b9b9b4';
const PROMPT_MM = 3.5;

const plain = (text: string, font: PrintFont = 'regular'): Run => ({ text, font, scale: 1, rise: 0 });

/** The runs of a prompt: symbols of quantities and of subshells slope, indices and charges stand off the line. */
export function promptRuns(prompt: string): readonly Run[] {
  const runs: Run[] = [];
  let from = 0;
  for (const found of prompt.matchAll(/Z_eff|σ|\b([1-7])([spdf])\b|([⁰¹²³⁴-⁹]*[⁺⁻])/g)) {
    if (found.index > from) runs.push(plain(prompt.slice(from, found.index)));
    const [whole, shell, subshell, charge] = found;
    if (whole === 'Z_eff') runs.push(plain('Z', 'serif-italic'), { text: 'eff', font: 'regular', scale: 0.7, rise: -0.16 });
    else if (shell && subshell) runs.push(plain(shell), plain(subshell, 'serif-italic'));
    else if (charge) runs.push({ text: lowered(charge), font: 'regular', scale: 0.66, rise: 0.36 });
    else runs.push(plain(whole, 'serif-italic'));
    from = found.index + whole.length;
  }
  if (from < prompt.length) runs.push(plain(prompt.slice(from)));
  return runs;
}

/** Path data in hundredths of a mm, to be filled with one ink. */
interface Print {
  readonly ink: string;
  readonly data: string;
}

/** NOTE: one path an ink for each strip of the page: many paths are slow to draw, and so is one over the whole page. */
const inked = (prints: readonly Print[]): string =>
  [...new Set(prints.map(({ ink }) => ink))]
    .map((ink) => `<path transform="scale(.01)" fill="${ink}" d="${prints.map((print) => (print.ink === ink ? print.data : '')).join('')}"/>`)
    .join('');

const raisedFigures = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** Raised figures as plain ones, to be set smaller and higher: few fonts draw them all alike. */
const lowered = (charge: string): string =>
  [...charge].map((mark) => (mark === '⁺' ? '+' : mark === '⁻' ? '−' : String(raisedFigures.indexOf(mark)))).join('');

interface Setting {
  readonly x: number;
  readonly baseline: number;
  readonly sizeMm: number;
  readonly ink?: string;
  readonly align?: 'left' | 'right';
  /** Words that would run past this are set smaller. */
  readonly maxWidth?: number;
}

function printed(runs: readonly Run[], { x, baseline, sizeMm, ink = INK, align = 'left', maxWidth = Infinity }: Setting): Print {
  const glyphs = runs.flatMap((run) => [...run.text].map((character) => ({ run, ...outline(run.font, character) })));
  const natural = glyphs.reduce((sum, { advance, run }) => sum + advance * sizeMm * run.scale, 0);
  const fitted = sizeMm * Math.min(1, maxWidth / natural);
  const width = Math.min(natural, maxWidth);
  let at = align === 'right' ? x - width : x;
  let data = '';
  for (const { run, advance, pieces } of glyphs) {
    const size = fitted * run.scale;
    const [left, foot] = [at, baseline - run.rise * fitted];
    data += pathData(pieces, (point) => ({ x: left + point.x * size, y: foot + point.y * size }));
    at += advance * size;
  }
  return { ink, data };
}

const text = (words: string, setting: Setting, font: PrintFont = 'regular'): Print => printed([plain(words, font)], setting);

function itemText(item: PrintedItem): Print[] {
  const place = placeOfItem(item.number);
  const promptX = LEFT_MM + 6.5;
  return [
    text(String(item.number), { x: LEFT_MM, baseline: place.promptBaseline, sizeMm: 3.9 }, 'semibold'),
    printed(promptRuns(item.prompt), { x: promptX, baseline: place.promptBaseline, sizeMm: PROMPT_MM, maxWidth: RIGHT_MM - 8 - promptX }),
    text(`[${item.marks}]`, { x: RIGHT_MM, baseline: place.promptBaseline, sizeMm: PROMPT_MM, align: 'right' }),
    text('Working', { x: LEFT_MM, baseline: place.workingLabelBaseline, sizeMm: 2.8, ink: SOFT_INK }),
    text(`Answer ${item.number}`, { x: place.answer.x, baseline: place.answerLabelBaseline, sizeMm: 2.8, ink: SOFT_INK }),
  ];
}

/** Ruled lines and frames. The frame's outer edge is the box; its line lies inside. */
function itemLines(items: readonly PrintedItem[]): string {
  let rules = '';
  let frames = '';
  const half = FRAME_MM / 2;
  for (const { lines, working, answer } of items.map((item) => placeOfItem(item.number))) {
    for (const y of lines) rules += `M${working.x} ${y}h${working.w}`;
    const [w, h] = [answer.w - FRAME_MM, answer.h - FRAME_MM];
    frames += `M${answer.x + half} ${answer.y + half}h${w}v${h}h${-w}Z`;
  }
  return `<path fill="none" stroke="${RULE}" stroke-width="0.2" d="${rules}"/><path fill="none" stroke="${INK}" stroke-width="${FRAME_MM}" d="${frames}"/>`;
}

const printedPages = new WeakMap<PrintedSheet, Map<number, string>>();

/** What the press put on a page, the same for every candidate. */
export function printedPage(sheet: PrintedSheet, pageNo: number): string {
  const pages = printedPages.get(sheet) ?? new Map<number, string>();
  printedPages.set(sheet, pages);
  const known = pages.get(pageNo);
  if (known) return known;
  const items = sheet.items.filter((item) => pageOfItem(item.number) === pageNo);
  const count = pageCount(sheet.items.length);
  const left = CORNER_MM + 3;
  const right = PAGE_WIDTH_MM - CORNER_MM - 3;
  const foot = PAGE_HEIGHT_MM - 17;
  const later = sheet.items.filter((item) => pageOfItem(item.number) > pageNo);
  const [next, last] = [later[0], later.at(-1)];
  const over = next && last ? `Items ${next.number} to ${last.number} are on the back.` : 'This is the last page.';
  const words = [
    text(sheet.title, { x: left, baseline: 14, sizeMm: 4.1 }, 'semibold'),
    ...sheet.lines.map((line, index) => text(line, { x: left, baseline: 18.6 + index * 4, sizeMm: 3 })),
    text(`page ${pageNo} of ${count}`, { x: right, baseline: 18.6, sizeMm: 3, align: 'right' }),
    text('One answer a box, in pen or soft pencil.', { x: 105, baseline: 37.4, sizeMm: 3 }),
    text('To change it, cross it out and write again in the box.', { x: 105, baseline: 41.6, sizeMm: 3 }),
    text('Candidate', { x: LEFT_MM, baseline: 33.4, sizeMm: 3 }),
    text(over, { x: left, baseline: foot, sizeMm: 2.9 }),
    text('Nothing outside the boxes is read as an answer.', { x: left, baseline: foot + 4.2, sizeMm: 2.9 }),
    text(`page ${pageNo} of ${count}`, { x: right, baseline: foot + 4.2, sizeMm: 2.9, align: 'right' }),
  ];
  const made = inked(words) + items.map((item) => inked(itemText(item))).join('') + itemLines(items);
  pages.set(pageNo, made);
  return made;
}

/** The candidate's number, printed before the exam; never a name. */
export const printedNumber = (candidate: string): string =>
  inked([text(candidate, { x: LEFT_MM, baseline: 43.2, sizeMm: 10.5 }, 'mono')]);

export interface PrintedWord extends Pick<Setting, 'x' | 'baseline' | 'sizeMm'> {
  readonly text: string;
  readonly font: PrintFont;
  readonly align: 'left' | 'right';
}

/** Words that were set elsewhere, each at its place. */
export const inkedWords = (words: readonly PrintedWord[]): string => inked(words.map(({ text: own, font, ...setting }) => text(own, { ...setting, ink: '#111' }, font)));
