import { readFile, stat, writeFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { PDFiumLibrary, type PDFiumDocument, type PDFiumImageObject, type PDFiumPage } from '@hyzyla/pdfium';
import { safeSharp } from '../safe-sharp';
import { drawnDpi, inMegabytes, longestPagePt, mostDrawnPixels, mostPdfBytes } from './limits';
import { damaged } from './refusal';

export type Counted = { readonly ok: true; readonly pages: number; readonly isOneBit: boolean } | { readonly ok: false; readonly refusal: string };

export type PdfPage = { readonly ok: true; readonly path: string; readonly isOneBit: boolean } | { readonly ok: false; readonly refusal: string };

const pointsPerInch = 72;
/** A picture smaller than this on its short side is a stamp, not the scan of a page. */
const scanShortSidePx = 1000;

let library: Promise<PDFiumLibrary> | undefined;

async function loadLibrary(): Promise<PDFiumLibrary> {
  const wasm = await readFile(createRequire(import.meta.url).resolve('@hyzyla/pdfium/pdfium.wasm'));
  return PDFiumLibrary.init({ wasmBinary: new Uint8Array(wasm).buffer });
}

function refusalFor(error: unknown): string {
  const message = error instanceof Error ? error.message : '';
  if (/password/i.test(message)) return 'The PDF is protected by a password. Save it without one and send it again.';
  if (/security/i.test(message)) return 'The PDF is protected in a way that is not read here. Print it to a new PDF, or send pictures.';
  return 'The PDF is incomplete or damaged. Scan or save it again.';
}

async function withPdf<Result>(path: string, work: (document: PDFiumDocument, bytes: Buffer) => Promise<Result>): Promise<Result | { ok: false; refusal: string }> {
  if ((await stat(path)).size > mostPdfBytes) return { ok: false, refusal: `The PDF is larger than ${inMegabytes(mostPdfBytes)}. Split it into several files.` };
  const bytes = await readFile(path);
  let document: PDFiumDocument;
  try {
    document = await (await (library ??= loadLibrary())).loadDocument(bytes);
  } catch (error) {
    return { ok: false, refusal: refusalFor(error) };
  }
  try {
    return await work(document, bytes);
  } finally {
    document.destroy();
  }
}

async function countPicture(path: string): Promise<Counted> {
  try {
    const { pages = 1, bitsPerSample } = await safeSharp(path).metadata();
    return { ok: true, pages, isOneBit: bitsPerSample === 1 };
  } catch (error) {
    const isHuge = error instanceof Error && error.message.includes('pixel limit');
    return { ok: false, refusal: isHuge ? 'The picture has more than 60 million pixels. Scan at 600 dpi or less.' : damaged };
  }
}

/** How many pages a file has, from its head; nothing is decoded. */
export function countPages({ path, kind }: { path: string; kind: string }): Promise<Counted> {
  if (kind !== 'pdf') return countPicture(path);
  return withPdf(path, async (document): Promise<Counted> => {
    const pages = document.getPageCount();
    return pages > 0 ? { ok: true, pages, isOneBit: false } : { ok: false, refusal: 'The PDF has no page.' };
  });
}

/** Whether a page of the file is turned, as far as its bytes tell. */
function turnsPages(bytes: Buffer): boolean {
  for (let at = bytes.indexOf('/Rotate'); at >= 0; at = bytes.indexOf('/Rotate', at + 1)) {
    if (/^\/Rotate\s+-?[1-9]/.test(bytes.toString('latin1', at, at + 16))) return true;
  }
  return false;
}

/** Whether pages may carry what the picture of a scan does not show: notes written over it, a turn. Packed objects cannot be looked through. */
const mayHideMore = (bytes: Buffer): boolean => bytes.includes('/Annot') || bytes.includes('/ObjStm') || turnsPages(bytes);

interface Scan {
  readonly jpeg: Uint8Array | null;
  readonly isOneBit: boolean;
}

/** What the only picture of a page is: the scanner's own JPEG where it can stand for the page. */
async function scanOf(page: PDFiumPage, hidesMore: boolean): Promise<Scan> {
  const none = { jpeg: null, isOneBit: false };
  if (page.getObjectCount() !== 1) return none;
  const object = page.getObject(0);
  if (object.type !== 'image') return none;
  const { data, filters, width, height } = await (object as PDFiumImageObject).getImageDataRaw();
  const isOneBit = filters.some((filter) => filter === 'CCITTFaxDecode' || filter === 'JBIG2Decode');
  const isOwnJpeg = filters.length === 1 && filters[0] === 'DCTDecode' && Math.min(width, height) > scanShortSidePx;
  if (!isOwnJpeg || hidesMore) return { jpeg: null, isOneBit };
  const { channels = 0, format } = await safeSharp(data).metadata();
  // NOTE four channels stand reversed in some PDFs; the page knows, the bytes alone do not.
  return format === 'jpeg' && channels <= 3 ? { jpeg: data, isOneBit } : none;
}

async function drawPage(page: PDFiumPage): Promise<Uint8Array> {
  const { originalWidth, originalHeight } = page.getOriginalSize();
  const wanted = drawnDpi / pointsPerInch;
  const scale = Math.min(wanted, Math.sqrt(mostDrawnPixels / (originalWidth * originalHeight)));
  const { data, width, height } = await page.render({ scale, render: 'bitmap', colorSpace: 'Gray', renderFormFields: true });
  return safeSharp(data, { raw: { width, height, channels: 1 } }).toColourspace('b-w').jpeg({ quality: 88, optimiseCoding: false }).toBuffer();
}

async function onePage(document: PDFiumDocument, index: number, hidesMore: boolean, path: string): Promise<PdfPage> {
  try {
    const page = document.getPage(index);
    const { originalWidth, originalHeight } = page.getOriginalSize();
    const longest = Math.max(originalWidth, originalHeight);
    if (!(Math.min(originalWidth, originalHeight) >= 1)) return { ok: false, refusal: 'The page has no size.' };
    if (longest > longestPagePt) return { ok: false, refusal: `The page is ${(longest / pointsPerInch / 39.37).toFixed(1)} m long. Scan on A3 or smaller.` };
    const { jpeg, isOneBit } = await scanOf(page, hidesMore).catch(() => ({ jpeg: null, isOneBit: false }));
    await writeFile(path, jpeg ?? (await drawPage(page)));
    return { ok: true, path, isOneBit };
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOSPC') throw error;
    return { ok: false, refusal: 'The page cannot be drawn: that part of the PDF is damaged.' };
  }
}

/** Writes some pages of a PDF as pictures into a folder: the scanner's own JPEG, or the page drawn in grey. */
export function pdfPages({ path, from, to, outDir }: { path: string; from: number; to: number; outDir: string }): Promise<readonly PdfPage[] | { ok: false; refusal: string }> {
  return withPdf(path, async (document, bytes) => {
    const hidesMore = mayHideMore(bytes);
    const pages: PdfPage[] = [];
    for (let index = from; index < to; index += 1) pages.push(await onePage(document, index, hidesMore, join(outDir, `page-${index}.jpg`)));
    return pages;
  });
}
