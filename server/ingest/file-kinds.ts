import { open } from 'node:fs/promises';

/** What a file is by its first bytes, whatever its name says. */
export type FileKind = 'jpeg' | 'png' | 'tiff' | 'webp' | 'pdf' | 'zip' | 'heic' | 'avif' | 'svg' | 'empty' | 'other';

const bytesToSniff = 512;

const startsWith = (head: Uint8Array, bytes: readonly number[], from = 0): boolean => bytes.every((byte, index) => head[from + index] === byte);
const ascii = (head: Uint8Array, from: number, to: number): string => String.fromCharCode(...head.subarray(from, to));

/** Brands of the boxed formats, the main one and those it is compatible with. */
function boxedKind(head: Uint8Array): FileKind | null {
  if (ascii(head, 4, 8) !== 'ftyp') return null;
  const brands = ascii(head, 8, Math.min(64, head[3] ?? 0));
  if (/^avi[fs]|avif/.test(brands)) return 'avif';
  return /^(hei|hev|mif|msf)/.test(brands) ? 'heic' : null;
}

const isTiff = (head: Uint8Array): boolean => [0x2a, 0x2b].some((version) => startsWith(head, [0x49, 0x49, version, 0]) || startsWith(head, [0x4d, 0x4d, 0, version]));

const isDrawing = (head: Uint8Array): boolean => /^\s*(<\?xml[^>]*>|<!--[^>]*-->|<!DOCTYPE[^>]*>|\s)*<svg[\s>]/i.test(ascii(head, startsWith(head, [0xef, 0xbb, 0xbf]) ? 3 : 0, head.length));

/** Tells the kind of a file from its first 512 bytes (signatures as the formats' own specifications give them). */
export function fileKind(head: Uint8Array): FileKind {
  if (head.length === 0) return 'empty';
  if (startsWith(head, [0xff, 0xd8, 0xff])) return 'jpeg';
  if (startsWith(head, [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])) return 'png';
  if (isTiff(head)) return 'tiff';
  if (ascii(head, 0, 4) === 'RIFF' && ascii(head, 8, 12) === 'WEBP') return 'webp';
  if (ascii(head, 0, 5) === '%PDF-') return 'pdf';
  if (startsWith(head, [0x50, 0x4b, 3, 4]) || startsWith(head, [0x50, 0x4b, 5, 6])) return 'zip';
  return boxedKind(head) ?? (isDrawing(head) ? 'svg' : 'other');
}

const kindsTaken = 'Send PDF, JPEG, PNG, TIFF or WebP, or a ZIP of them.';

const refusals: Readonly<Partial<Record<FileKind, string>>> = {
  empty: 'The file is empty.',
  heic: `This phone format (HEIC) is not read. Set the camera to JPEG, or send PDF, JPEG, PNG, TIFF or WebP.`,
  avif: 'This picture format (AVIF) is not read. Save it as JPEG and send it again.',
  svg: `This is a drawing (SVG), not the scan of a page. ${kindsTaken}`,
  other: `This is not a picture of a page. ${kindsTaken}`,
};

/** Why a kind is not taken, in a sentence for the person who sent it; null where it is. */
export const refusalOf = (kind: FileKind): string | null => refusals[kind] ?? null;

export const mediaTypes: Readonly<Partial<Record<FileKind, string>>> = { jpeg: 'image/jpeg', png: 'image/png', tiff: 'image/tiff', webp: 'image/webp', pdf: 'application/pdf', zip: 'application/zip' };

/** The kind of a file on disk, by its content. */
export async function kindOfFile(path: string): Promise<FileKind> {
  const file = await open(path, 'r');
  try {
    const { buffer, bytesRead } = await file.read(Buffer.alloc(bytesToSniff), 0, bytesToSniff, 0);
    return fileKind(buffer.subarray(0, bytesRead));
  } finally {
    await file.close();
  }
}
