import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { crc32, deflateRawSync, deflateSync } from 'node:zlib';
import { zipSync } from 'fflate';
import sharp from 'sharp';
import { pageJpeg } from './pictures';

/** Small makers of files that a reader of files had better not trust; layouts from the formats' own specifications. */

const u32 = (value: number): Buffer => {
  const bytes = Buffer.alloc(4);
  bytes.writeUInt32BE(value >>> 0);
  return bytes;
};

const pngChunk = (type: string, data: Buffer): Buffer => Buffer.concat([u32(data.length), Buffer.from(type, 'latin1'), data, u32(crc32(Buffer.concat([Buffer.from(type, 'latin1'), data])))]);

/** A one-bit PNG of any announced size, white, small on disk. */
export function bombPng(width: number, height: number): Buffer {
  const head = Buffer.concat([u32(width), u32(height), Buffer.from([1, 0, 0, 0, 0])]);
  const row = Buffer.alloc(1 + Math.ceil(Math.min(width, 100_000) / 8), 0xff);
  row[0] = 0;
  const rows = Buffer.concat(Array.from({ length: Math.min(height, 2000) }, () => row));
  return Buffer.concat([Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]), pngChunk('IHDR', head), pngChunk('IDAT', deflateSync(rows)), pngChunk('IEND', Buffer.alloc(0))]);
}

/** A PDF written out object by object, with its table of positions. */
export function pdfOf(objects: readonly string[], trailer = ''): Buffer {
  let text = '%PDF-1.4\n';
  const positions = objects.map((body, index) => {
    const at = text.length;
    text += `${index + 1} 0 obj\n${body}\nendobj\n`;
    return at;
  });
  const start = text.length;
  text += `xref\n0 ${objects.length + 1}\n0000000000 65535 f \n${positions.map((at) => `${String(at).padStart(10, '0')} 00000 n \n`).join('')}`;
  text += `trailer\n<< /Size ${objects.length + 1} /Root 1 0 R ${trailer} >>\nstartxref\n${start}\n%%EOF\n`;
  return Buffer.from(text, 'latin1');
}

/** A PDF of empty pages, all of one size in points. */
export const emptyPdf = (pages: number, width = 595, height = 842): Buffer =>
  pdfOf([
    '<< /Type /Catalog /Pages 2 0 R >>',
    `<< /Type /Pages /Count ${pages} /Kids [${Array.from({ length: pages }, (_, index) => `${index + 3} 0 R`).join(' ')}] >>`,
    ...Array.from({ length: pages }, () => `<< /Type /Page /Parent 2 0 R /MediaBox [0 0 ${width} ${height}] >>`),
  ]);

/** A PDF whose pages each show one JPEG and nothing else, as scanners write them. */
export function scannedPdf(jpegs: readonly Buffer[], { width, height }: { readonly width: number; readonly height: number }): Buffer {
  const objects = ['<< /Type /Catalog /Pages 2 0 R >>', `<< /Type /Pages /Count ${jpegs.length} /Kids [${jpegs.map((_, index) => `${3 + index * 3} 0 R`).join(' ')}] >>`];
  jpegs.forEach((jpeg, index) => {
    const at = 3 + index * 3;
    const drawing = 'q 595 0 0 842 0 0 cm /Im0 Do Q';
    objects.push(
      `<< /Type /Page /Parent 2 0 R /MediaBox [0 0 595 842] /Resources << /XObject << /Im0 ${at + 1} 0 R >> >> /Contents ${at + 2} 0 R >>`,
      `<< /Type /XObject /Subtype /Image /Width ${width} /Height ${height} /ColorSpace /DeviceRGB /BitsPerComponent 8 /Filter /DCTDecode /Length ${jpeg.length} >>\nstream\n${jpeg.toString('latin1')}\nendstream`,
      `<< /Length ${drawing.length} >>\nstream\n${drawing}\nendstream`,
    );
  });
  return pdfOf(objects);
}

/** A PDF under a password: by qpdf where it is there, else one whose key nobody can guess. */
export function encryptedPdf(): Buffer {
  const folder = mkdtempSync(join(tmpdir(), 'meniscus-pdf-'));
  try {
    writeFileSync(join(folder, 'in.pdf'), emptyPdf(1));
    execFileSync('qpdf', ['--encrypt', 'secret', 'owner', '256', '--', join(folder, 'in.pdf'), join(folder, 'out.pdf')]);
    return readFileSync(join(folder, 'out.pdf'));
  } catch {
    const key = '0123456789abcdef'.repeat(4);
    return pdfOf(['<< /Type /Catalog /Pages 2 0 R >>', '<< /Type /Pages /Count 0 /Kids [] >>', `<< /Filter /Standard /V 1 /R 2 /O <${key}> /U <${key}> /P -4 >>`], `/Encrypt 3 0 R /ID [<${key.slice(0, 32)}> <${key.slice(0, 32)}>]`);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

interface Entry {
  readonly name: string;
  readonly bytes: Buffer;
  /** What the directory announces, where it does not tell the truth. */
  readonly announced?: number;
  readonly flags?: number;
  readonly method?: number;
  readonly extra?: Buffer;
  readonly offset?: number;
}

/** An archive written by hand, so that it can lie. */
export function zipOf(entries: readonly Entry[]): Buffer {
  const pieces: Buffer[] = [];
  const directory: Buffer[] = [];
  let at = 0;
  for (const { name, bytes, announced = bytes.length, flags = 0, method = 8, extra = Buffer.alloc(0), offset } of entries) {
    const data = method === 8 ? deflateRawSync(bytes) : bytes;
    const sizes = Buffer.alloc(12);
    sizes.writeUInt32LE(crc32(bytes), 0);
    sizes.writeUInt32LE(data.length, 4);
    sizes.writeUInt32LE(announced, 8);
    const head = Buffer.alloc(4);
    head.writeUInt16LE(20, 0);
    head.writeUInt16LE(flags, 2);
    const rest = Buffer.alloc(6);
    rest.writeUInt16LE(method, 0);
    const lengths = Buffer.alloc(4);
    lengths.writeUInt16LE(Buffer.byteLength(name), 0);
    lengths.writeUInt16LE(extra.length, 2);
    const local = Buffer.concat([Buffer.from('PK\u0003\u0004'), head, rest, sizes, lengths, Buffer.from(name), extra, data]);
    const tail = Buffer.alloc(14);
    tail.writeUInt32LE(offset ?? at, 10);
    directory.push(Buffer.concat([Buffer.from('PK\u0001\u0002'), Buffer.from([20, 0]), head, rest, sizes, lengths, tail, Buffer.from(name), extra]));
    pieces.push(local);
    at += local.length;
  }
  const list = Buffer.concat(directory);
  const end = Buffer.alloc(22);
  end.write('PK\u0005\u0006', 'latin1');
  end.writeUInt16LE(entries.length, 8);
  end.writeUInt16LE(entries.length, 10);
  end.writeUInt32LE(list.length, 12);
  end.writeUInt32LE(at, 16);
  return Buffer.concat([...pieces, list, end]);
}

/** A little TIFF that claims many pages, each the same strip. */
export function manyPageTiff(pages: number, { width = 8, height = 8, isLoop = false } = {}): Buffer {
  const entryCount = 9;
  const size = 2 + entryCount * 12 + 4;
  const strip = Buffer.alloc(Math.ceil(width / 8) * Math.min(height, 100));
  const bytes = Buffer.alloc(8 + strip.length + size * pages);
  bytes.write('II*\u0000', 'latin1');
  bytes.writeUInt32LE(8 + strip.length, 4);
  for (let page = 0; page < pages; page += 1) {
    const at = 8 + strip.length + size * page;
    bytes.writeUInt16LE(entryCount, at);
    const tags: readonly (readonly [number, number])[] = [[256, width], [257, height], [258, 1], [259, 1], [262, 1], [273, 8], [277, 1], [278, height], [279, strip.length]];
    tags.forEach(([tag, value], index) => {
      const entry = at + 2 + index * 12;
      bytes.writeUInt16LE(tag, entry);
      bytes.writeUInt16LE(4, entry + 2);
      bytes.writeUInt32LE(1, entry + 4);
      bytes.writeUInt32LE(value, entry + 8);
    });
    const next = page + 1 < pages ? at + size : isLoop ? 8 + strip.length : 0;
    bytes.writeUInt32LE(next, at + 2 + entryCount * 12);
  }
  return bytes;
}

/** The head of a boxed picture format with a brand, and nothing that could be decoded. */
export const boxed = (brand: string): Buffer => Buffer.concat([u32(24), Buffer.from(`ftyp${brand}`, 'latin1'), u32(0), Buffer.from(`${brand}mif1`, 'latin1'), Buffer.alloc(2000, 7)]);

/** A JPEG whose EXIF says nonsense; its pixels are fine. */
export async function garbledExif(seed: number): Promise<Buffer> {
  const jpeg = await pageJpeg(seed);
  const nonsense = Buffer.concat([Buffer.from('Exif\0\0II*\0', 'latin1'), Buffer.alloc(200, 0xf3)]);
  const segment = Buffer.concat([Buffer.from([0xff, 0xe1, (nonsense.length + 2) >> 8, (nonsense.length + 2) & 255]), nonsense]);
  return Buffer.concat([jpeg.subarray(0, 2), segment, jpeg.subarray(2)]);
}

export const plainZip = (files: Readonly<Record<string, Buffer>>): Buffer => Buffer.from(zipSync(files, { level: 0 }));

export const asFormat = async (seed: number, format: 'png' | 'tiff' | 'webp'): Promise<Buffer> => sharp(await pageJpeg(seed)).toFormat(format).toBuffer();
