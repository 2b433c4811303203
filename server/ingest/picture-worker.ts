import { stat } from 'node:fs/promises';
import { checkWith } from '../print/sheet-check';
import { decodePage, greyOf, refusalFor, resized, type Decoded, type PageOfFile } from './decode';
import { kindOfFile, mediaTypes, refusalOf } from './file-kinds';
import { isShownAsItCame, wholePagePictures, type Cut, type MadePictures } from './page-pictures';
import { loadCodeFinder, type CodeFinder } from './sheet/codes';
import { inverted, isColoured, type Pixels } from './sheet/pixels';
import { readSheet, type SheetReading } from './sheet/read-sheet';
import { sheetPictures } from './sheet/sheet-pictures';
import { layoutsOf, type SheetKeys, type SheetReport } from './sheet/sheet-task';

/** Codes, frames and faint strokes are all there at 220 dpi; more pixels cost time only. */
const readLongSidePx = 2600;

export interface PictureTask extends PageOfFile {
  readonly cut: Cut | null;
}

/** `cut` is for a page on which no code is found. */
export interface SheetTask extends PictureTask {
  readonly sheets: SheetKeys;
}

interface Refused {
  readonly ok: false;
  readonly refusal: string;
}

export interface MadePage extends MadePictures {
  readonly ok: true;
  readonly mediaType: string;
  /** Pages of the file. */
  readonly pages: number;
}

export type PictureResult = Refused | MadePage;
export type SheetResult = Refused | (MadePage & { readonly sheet: SheetReport });

type Page = Extract<Decoded, { ok: true }>;

/** Decodes a page and goes on with it; what cannot be decoded is refused in a sentence. */
async function onPage<Made extends { readonly ok: boolean }>(task: PageOfFile, make: (page: Page, mediaType: string) => Promise<Made>): Promise<Refused | Made> {
  const kind = await kindOfFile(task.path);
  const refusal = refusalOf(kind);
  if (refusal !== null) return { ok: false, refusal };
  try {
    const decoded = await decodePage(task);
    return decoded.ok ? await make(decoded, mediaTypes[kind] ?? 'application/octet-stream') : decoded;
  } catch (error) {
    return { ok: false, refusal: refusalFor(error) };
  }
}

async function wholePage({ path, turns, cut }: PictureTask, { pixels, metadata, pages }: Page, mediaType: string): Promise<MadePage> {
  const asItCame = isShownAsItCame(metadata, (await stat(path)).size, turns);
  return { ok: true, mediaType, pages, ...(await wholePagePictures(pixels, cut, asItCame)) };
}

/** Whether nothing on a page speaks against what its file name says. */
const isWithoutClaim = (reading: SheetReading): boolean => reading.state === 'unidentified' && (reading.reason === 'no-code' || reading.reason === 'other-codes');

let finder: Promise<CodeFinder> | undefined;

async function sheetPage(task: SheetTask, page: Page, mediaType: string): Promise<MadePage & { readonly sheet: SheetReport }> {
  const { secret, pages } = task.sheets;
  const isLarge = Math.max(page.pixels.width, page.pixels.height) > readLongSidePx;
  const pixels = isLarge ? await resized(page.pixels, readLongSidePx) : page.pixels;
  const layoutOf = layoutsOf(pages);
  const grey = await greyOf(pixels);
  const reading = readSheet(grey, { findCodes: await (finder ??= loadCodeFinder()), checkOf: checkWith(secret), layoutOf });
  if (reading.state !== 'read') return { ...(await wholePage(isWithoutClaim(reading) ? task : { ...task, cut: null }, page, mediaType)), sheet: reading };
  const seen: Pixels = isColoured(pixels) ? pixels : { ...grey, channels: 1 };
  const shown: Pixels = reading.isNegative ? { ...inverted(seen), channels: seen.channels } : seen;
  const { mmToPx, ...pictures } = await sheetPictures(shown, reading, layoutOf(reading.identity)?.boxes ?? []);
  const { map: _, boxes, ...report } = reading;
  const sheet: SheetReport = { ...report, mmToPx, boxes: boxes.map(({ corners: __, ...box }) => box) };
  return { ok: true, mediaType, pages: page.pages, ...pictures, sheet };
}

/** Decodes one page of a file once and makes all its pictures: display, thumbnail, cut-outs. Runs in a worker thread. */
export default function makePage(task: PictureTask): Promise<PictureResult> {
  return onPage(task, (page, mediaType) => wholePage(task, page, mediaType));
}

/** The same for a page that may be a printed sheet: its codes say which, and its pictures show it as it was printed. */
export function makeSheet(task: SheetTask): Promise<SheetResult> {
  return onPage(task, (page, mediaType) => sheetPage(task, page, mediaType));
}
