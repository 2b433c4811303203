import { mkdir, open, rm, stat } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { kindOfFile, refusalOf, type FileKind } from '../file-kinds';
import { inMegabytes, mostPages, mostPictureBytes } from './limits';
import type { Counted } from './open-worker';
import { InputRefusal, tooManyPages } from './refusal';
import { unpackZip } from './zip-entries';

/** A page that a file is known to hold, before anything of it is decoded. The index counts over the whole file. */
export type PlannedPage = Unnumbered & { readonly index: number };

export interface PageSource {
  readonly path: string;
  readonly kind: FileKind;
  /** Which page of the file at the path. */
  readonly frame: number;
  /** Pages of the file at the path. */
  readonly of: number;
  readonly isOneBit: boolean;
}

/** `name` is that of its file inside an archive; null where the upload itself is that file. */
type Unnumbered = { readonly name: string | null } & ({ readonly source: PageSource } | { readonly refusal: string });

type Count = (file: { readonly path: string; readonly kind: string }) => Promise<Counted>;

interface Piece {
  readonly name: string | null;
  readonly pages: readonly PageSource[];
  readonly refusal: string | null;
}

const refused = (name: string | null, refusal: string): Piece => ({ name, pages: [], refusal });

/** A JPEG or PNG is one page; the bit depth stands in byte 24 of a PNG (its specification, IHDR). */
async function onePicture(path: string, kind: 'jpeg' | 'png'): Promise<Counted> {
  if (kind === 'jpeg') return { ok: true, pages: 1, isOneBit: false };
  const file = await open(path, 'r');
  try {
    const { buffer } = await file.read(Buffer.alloc(1), 0, 1, 24);
    return { ok: true, pages: 1, isOneBit: buffer[0] === 1 };
  } finally {
    await file.close();
  }
}

async function pieceOf(path: string, name: string | null, count: Count): Promise<Piece> {
  const kind = await kindOfFile(path);
  if (kind === 'zip') return refused(name, 'This is an archive inside an archive. Send it by itself.');
  const refusal = refusalOf(kind);
  if (refusal !== null) return refused(name, refusal);
  if (kind !== 'pdf' && kind !== 'tiff' && (await stat(path)).size > mostPictureBytes) return refused(name, `The picture is larger than ${inMegabytes(mostPictureBytes)}. Scan at 600 dpi or less.`);
  const counted = kind === 'jpeg' || kind === 'png' ? await onePicture(path, kind) : await count({ path, kind });
  if (!counted.ok) return refused(name, counted.refusal);
  if (counted.pages > mostPages) return refused(name, tooManyPages(counted.pages, mostPages));
  return { name, refusal: null, pages: Array.from({ length: counted.pages }, (_, frame) => ({ path, kind, frame, of: counted.pages, isOneBit: counted.isOneBit })) };
}

async function piecesOfArchive(path: string, workDir: string, count: Count): Promise<Piece[]> {
  const folder = join(workDir, 'entries');
  await rm(folder, { recursive: true, force: true });
  await mkdir(folder, { recursive: true });
  const pieces: Piece[] = [];
  for (const entry of await unpackZip(path, folder)) pieces.push('path' in entry ? await pieceOf(entry.path, entry.name, count) : refused(entry.name, entry.refusal));
  return pieces;
}

/** The pages of a file in their order, with those that cannot be taken and why. The same file gives the same plan. */
export async function planPages(path: string, workDir: string, count: Count): Promise<PlannedPage[]> {
  const isArchive = (await kindOfFile(path)) === 'zip';
  const pieces = isArchive ? await piecesOfArchive(path, workDir, count) : [await pieceOf(path, null, count)];
  const [only] = pieces;
  if (!isArchive && only && only.refusal !== null) throw new InputRefusal(only.refusal);
  const pages = pieces.flatMap(({ name, pages: sources, refusal }): Unnumbered[] => (refusal === null ? sources.map((source) => ({ name, source })) : [{ name, refusal }]));
  if (pages.length > mostPages) throw new InputRefusal(tooManyPages(pages.length, mostPages));
  return pages.map((page, index) => ({ ...page, index }));
}

/** The name a page goes by when its place is looked for: of the file that holds it, without folders. */
export const nameOfPage = (page: Pick<PlannedPage, 'name'>, fileName: string): string => basename(page.name ?? fileName);
