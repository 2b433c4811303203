import { open } from 'node:fs/promises';

/** What a file is by its first bytes, whatever its name says. */
export type FileKind = 'jpeg' | 'png' | 'tiff' | 'webp' | 'pdf' | 'heic' | 'empty' | 'other';

const bytesToSniff = 16;

const startsWith = (head: Uint8Array, bytes: readonly number[], from = 0): boolean => bytes.every((byte, index) => head[from + index] === byte);
const ascii = (head: Uint8Array, from: number, to: number): string => String.fromCharCode(...head.subarray(from, to));

/** Tells the kind of a file from its first 16 bytes (signatures as the formats' own specifications give them). */
export function fileKind(head: Uint8Array): FileKind {
  if (head.length === 0) return 'empty';
  if (startsWith(head, [0xff, 0xd8, 0xff])) return 'jpeg';
  if (startsWith(head, [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])) return 'png';
  if (startsWith(head, [0x49, 0x49, 0x2a, 0x00]) || startsWith(head, [0x4d, 0x4d, 0x00, 0x2a])) return 'tiff';
  if (ascii(head, 0, 4) === 'RIFF' && ascii(head, 8, 12) === 'WEBP') return 'webp';
  if (ascii(head, 0, 5) === '%PDF-') return 'pdf';
  if (ascii(head, 4, 8) === 'ftyp' && /^(hei|hev|mif|msf)/.test(ascii(head, 8, 12))) return 'heic';
  return 'other';
}

const refusals: Readonly<Partial<Record<FileKind, string>>> = {
  empty: 'The file is empty.',
  pdf: 'This is a PDF. Send one picture a page: JPEG, PNG, TIFF or WebP.',
  heic: 'This phone format is not read. Set the camera to JPEG, or send JPEG, PNG, TIFF or WebP.',
  other: 'This is not a picture of a page. Send JPEG, PNG, TIFF or WebP.',
};

/** Why a kind is not taken, in a sentence for the person who sent it; null where it is. */
export const refusalOf = (kind: FileKind): string | null => refusals[kind] ?? null;

export const mediaTypes: Readonly<Partial<Record<FileKind, string>>> = { jpeg: 'image/jpeg', png: 'image/png', tiff: 'image/tiff', webp: 'image/webp' };

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
