import { existsSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import sharp from 'sharp';
import type { Agent } from 'supertest';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import type { UploadView } from '../../shared/contracts/scans';
import { openDatabase } from '../../db/client';
import { startChildServer, type ChildServer } from '../support/child-server';
import { asFormat, bombPng, boxed, emptyPdf, encryptedPdf, garbledExif, manyPageTiff, pdfOf, plainZip, scannedPdf, zipOf } from '../support/hostile-files';
import { pageJpeg } from '../support/pictures';
import { beginBatch, sendFile } from '../support/scans';
import { seededFolder, type SeededFolder } from '../support/seeded-folder';

const half = (bytes: Buffer): Buffer => bytes.subarray(0, Math.floor(bytes.length / 2));
const svg = Buffer.from('<?xml version="1.0"?>\n<svg xmlns="http://www.w3.org/2000/svg" width="900" height="900"><image href="file:///etc/passwd"/></svg>');
const zeros = (megabytes: number): Buffer => Buffer.alloc(megabytes * 1024 * 1024);

const noPicture = /^This is not a picture of a page\. Send PDF, JPEG, PNG, TIFF or WebP, or a ZIP of them\.$/;
const damaged = /^The file is incomplete or damaged\. Scan or upload it again\.$/;
const badPdf = /^The PDF is incomplete or damaged\. Scan or save it again\.$/;
const badZip = /^The archive is incomplete or damaged\. Pack and upload it again\.$/;
const tooManyPixels = /^The picture has more than 60 million pixels\. Scan at 600 dpi or less\.$/;
const bomb = /^The archive unpacks to far more than scans would\./;
const outside = /^The archive names a place outside itself\./;
const inside = (reason: RegExp): RegExp => new RegExp(`^None of its \\d+ pages can be taken\\. The first: ${reason.source.replace(/^\^|\$$/g, '')}`);

type Hostile = readonly [title: string, fileName: string, bytes: () => Buffer | Promise<Buffer>, problem: RegExp];

/** Files refused whole. Sentences are ours; the faults are those the formats' specifications allow and forbid. */
const hostile: readonly Hostile[] = [
  ['a PDF under a password', 'W1-p1.pdf', encryptedPdf, /^The PDF is protected by a password\./],
  ['a PDF cut off', 'W1-p1.pdf', () => emptyPdf(4).subarray(0, 60), badPdf],
  ['a PDF of nothing but its first line', 'W1-p1.pdf', () => Buffer.from('%PDF-1.7\n'), badPdf],
  ['a PDF without pages', 'W1-p1.pdf', () => emptyPdf(0), /^The PDF (has no page|is incomplete)/],
  ['a PDF with a page 5 metres square', 'W1-p1.pdf', () => emptyPdf(1, 14_400, 14_400), /^The page is 5\.1 m long\. Scan on A3 or smaller\.$/],
  ['a PDF with a page of 200,000 points', 'W1-p1.pdf', () => emptyPdf(1, 200_000, 200_000), /^The page is \d+\.\d m long\./],
  ['a PDF of 20,000 pages', 'W1-p1.pdf', () => emptyPdf(20_000), /^The file holds 20,000 pages; 2,000 are the most\./],
  ['a PDF whose pages go round in a circle', 'W1-p1.pdf', () => pdfOf(['<< /Type /Catalog /Pages 2 0 R >>', '<< /Type /Pages /Count 3 /Kids [2 0 R 2 0 R 2 0 R] >>']), /PDF|page/],
  ['a PDF that claims a billion pages', 'W1-p1.pdf', () => pdfOf(['<< /Type /Catalog /Pages 2 0 R >>', '<< /Type /Pages /Count 999999999 /Kids [] >>']), /pages|PDF/],
  ['random bytes after the mark of a PDF', 'W1-p1.pdf', () => Buffer.concat([Buffer.from('%PDF-1.4\n'), Buffer.alloc(50_000, 0xa7)]), badPdf],
  ['a JPEG cut off', 'W1-p1.jpg', async () => half(await pageJpeg(1)), damaged],
  ['a JPEG of its mark alone', 'W1-p1.jpg', () => Buffer.from([0xff, 0xd8, 0xff, 0xe0]), damaged],
  ['a JPEG mark before nonsense', 'W1-p1.jpg', () => Buffer.concat([Buffer.from([0xff, 0xd8, 0xff]), Buffer.alloc(9000, 0x5a)]), damaged],
  ['a picture too small to read', 'W1-p1.jpg', () => pageJpeg(1, { width: 120, height: 160 }), /^The picture is 120 by 160 pixels: too small to read\./],
  ['a picture of one row', 'W1-p1.png', () => sharp({ create: { width: 9000, height: 1, channels: 3, background: 'white' } }).png().toBuffer(), /^The picture is 9000 by 1 pixels: too small to read\./],
  ['a PNG cut off', 'W1-p1.png', async () => half(await asFormat(1, 'png')), damaged],
  ['a PNG of its mark alone', 'W1-p1.png', () => Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]), damaged],
  ['a PNG of 30,000 by 30,000 pixels', 'W1-p1.png', () => bombPng(30_000, 30_000), tooManyPixels],
  ['a PNG of 2,147,483,647 pixels each way', 'W1-p1.png', () => bombPng(2_147_483_647, 2_147_483_647), /^The (picture has more than 60 million pixels|file is incomplete or damaged)/],
  ['a PNG of no size', 'W1-p1.png', () => bombPng(0, 0), damaged],
  ['a PNG with fewer rows than it says', 'W1-p1.png', () => bombPng(6000, 8000), damaged],
  ['a TIFF cut off', 'W1-p1.tif', async () => half(await asFormat(1, 'tiff')), damaged],
  ['a TIFF of its mark alone', 'W1-p1.tif', () => Buffer.from('II*\u0000', 'latin1'), damaged],
  ['a TIFF of 5,000 pages', 'W1-p1.tif', () => manyPageTiff(5000), /^The file holds 5,000 pages; 2,000 are the most\.|^The file is incomplete or damaged/],
  ['a TIFF whose pages go round in a circle', 'W1-p1.tif', () => manyPageTiff(3, { isLoop: true }), /./],
  ['a TIFF of 100,000 by 100,000 pixels', 'W1-p1.tif', () => manyPageTiff(1, { width: 100_000, height: 100_000 }), /^The (picture has more than 60 million pixels|file is incomplete or damaged)/],
  ['a WebP cut off', 'W1-p1.webp', async () => half(await asFormat(1, 'webp')), damaged],
  ['text', 'W1-p1.jpg', () => Buffer.from('nothing to see'), noPicture],
  ['one byte', 'W1-p1.jpg', () => Buffer.from([0]), noPicture],
  ['a drawing named as a picture', 'W1-p1.png', () => svg, /^This is a drawing \(SVG\)/],
  ['a drawing behind a comment', 'W1-p1.jpg', () => Buffer.concat([Buffer.from('<!-- a scan -->\n'), svg.subarray(22)]), /^This is a drawing \(SVG\)/],
  ['a web page', 'W1-p1.pdf', () => Buffer.from('<!DOCTYPE html><html><script>alert(1)</script></html>'), noPicture],
  ['a GIF', 'W1-p1.gif', () => sharp({ create: { width: 900, height: 900, channels: 3, background: 'white' } }).gif().toBuffer(), noPicture],
  ['a program', 'W1-p1.jpg', () => Buffer.concat([Buffer.from([0x7f, 0x45, 0x4c, 0x46]), Buffer.alloc(5000, 1)]), noPicture],
  ['a phone picture', 'W1-p1.jpg', () => boxed('heic'), /^This phone format \(HEIC\) is not read\./],
  ['a phone picture of another brand', 'W1-p1.heic', () => boxed('mif1'), /^This phone format \(HEIC\) is not read\./],
  ['an AVIF', 'W1-p1.jpg', async () => boxed('avif'), /^This picture format \(AVIF\) is not read\./],
  ['an archive cut off', 'all.zip', async () => half(plainZip({ 'W1-p1.jpg': await pageJpeg(1) })), badZip],
  ['an empty archive', 'all.zip', () => zipOf([]), /^The archive is empty\.$/],
  ['an archive of folders alone', 'all.zip', () => zipOf([{ name: 'scans/', bytes: Buffer.alloc(0) }]), /^The archive is empty\.$/],
  ['an archive that unpacks to a gigabyte', 'all.zip', () => zipOf(Array.from({ length: 12 }, (_, index) => ({ name: `W${index}-p1.tif`, bytes: zeros(100) }))), bomb],
  ['an archive whose directory lies about a size', 'all.zip', () => zipOf([{ name: 'W1-p1.tif', bytes: zeros(40), announced: 1000 }]), inside(damaged)],
  ['an archive that names a place above itself', 'all.zip', async () => zipOf([{ name: '../../../../tmp/meniscus-outside.jpg', bytes: await pageJpeg(1) }]), outside],
  ['an archive that names a place from the root', 'all.zip', async () => zipOf([{ name: '/etc/meniscus.jpg', bytes: await pageJpeg(1) }]), outside],
  ['an archive that names a drive', 'all.zip', async () => zipOf([{ name: 'C:\\scans\\W1-p1.jpg', bytes: await pageJpeg(1) }]), outside],
  ['an archive inside an archive', 'all.zip', () => plainZip({ 'inner.zip': zipOf([]) }), inside(/^This is an archive inside an archive\./)],
  ['an archive with a password', 'all.zip', async () => zipOf([{ name: 'W1-p1.jpg', bytes: await pageJpeg(1), flags: 1 }]), inside(/^It is protected by a password\./)],
  ['an archive packed in an unknown way', 'all.zip', async () => zipOf([{ name: 'W1-p1.jpg', bytes: await pageJpeg(1), method: 14 }]), inside(/^It is packed in a way that is not read here\./)],
  ['an archive with false long sizes', 'all.zip', async () => zipOf([{ name: 'W1-p1.jpg', bytes: await pageJpeg(1), announced: 0xffffffff, extra: Buffer.from([1, 0, 8, 0, 255, 255, 255, 255, 255, 255, 15, 0]) }]), /^The archive (unpacks|is incomplete)/],
  ['an archive whose long sizes are missing', 'all.zip', async () => zipOf([{ name: 'W1-p1.jpg', bytes: await pageJpeg(1), announced: 0xffffffff }]), /^The archive (unpacks|is incomplete)/],
  ['an archive of 5,000 files', 'all.zip', () => zipOf(Array.from({ length: 5000 }, (_, index) => ({ name: `${index}.jpg`, bytes: Buffer.from('x') }))), /^The archive holds 5,000 files; 2,000 are the most\./],
  ['an archive whose entries point outside it', 'all.zip', async () => zipOf([{ name: 'W1-p1.jpg', bytes: await pageJpeg(1), offset: 4_000_000_000 }]), inside(damaged)],
  ['a text document, which is an archive', 'W1.docx', () => plainZip({ '[Content_Types].xml': Buffer.from('<Types/>'), 'word/document.xml': Buffer.from('<w/>') }), inside(noPicture)],
];

const storedFiles = (folder: string): string[] => (existsSync(folder) ? readdirSync(folder, { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile()).map(({ name }) => name) : []);

describe('hostile files', () => {
  let folder: SeededFolder;
  let server: ChildServer;
  let reader: Agent;
  let batchId: string;
  beforeAll(async () => {
    folder = await seededFolder(['W1', 'W2', 'W3']);
    server = await startChildServer(folder.dataDir);
    reader = await server.signInAs('readerOne');
    batchId = (await beginBatch(reader, folder.sittingId)).id;
  });
  afterAll(async () => {
    await server.kill();
    rmSync(folder.dataDir, { recursive: true, force: true });
  });

  const settled = async (uploadId: string): Promise<UploadView> => {
    for (;;) {
      const { body } = await reader.get(`/api/uploads/${uploadId}`).expect(200);
      if ((body as UploadView).state !== 'received') return body as UploadView;
      await new Promise((resolve) => setTimeout(resolve, 50));
    }
  };
  const bring = async (fileName: string, bytes: Buffer): Promise<UploadView> => {
    if (bytes.length <= 8 * 1024 * 1024) return settled((await sendFile(reader, batchId, fileName, bytes)).id);
    throw new Error(`${fileName} is larger than one part.`);
  };

  it.each(hostile)('refuses %s by name', async (_title, fileName, bytes, problem) => {
    const upload = await bring(fileName, await bytes());
    expect(upload.state).toBe('refused');
    expect(upload.problem).toMatch(problem);
  });

  it('does not take an empty file', async () => {
    const refused = await reader.post(`/api/batches/${batchId}/uploads`).send({ fileName: 'W1-p1.jpg', size: 0 }).expect(400);
    expect((refused.body as { error: { message: string } }).error.message).toContain('The file is empty.');
  });

  it('takes a file of 320 MB part by part without holding it', async () => {
    const part = Buffer.alloc(8 * 1024 * 1024, 0x5a);
    const parts = 40;
    const before = server.peakMb();
    const { body } = await reader.post(`/api/batches/${batchId}/uploads`).send({ fileName: 'W1-p1.tif', size: part.length * parts }).expect(201);
    const { id } = body as UploadView;
    for (let n = 0; n < parts; n += 1) await reader.put(`/api/uploads/${id}/parts/${n}`).attach('file', part, 'part').expect(200);
    await reader.post(`/api/uploads/${id}/complete`).expect(202);
    expect(await settled(id)).toMatchObject({ state: 'refused', problem: expect.stringMatching(noPicture) as string });
    expect(server.peakMb() - before).toBeLessThan(160);
  });

  it('has kept nothing of any of them, stayed up, and held less than a gigabyte', async () => {
    expect(hostile.length).toBeGreaterThanOrEqual(40);
    await reader.get('/api/ready').expect(200);
    const db = openDatabase(join(folder.dataDir, 'meniscus.sqlite'));
    // A file is refused a moment before its parts are gone and its job is over.
    await vi.waitFor(() => expect(db.$client.prepare("select count(*) from job where state <> 'done'").pluck().get()).toBe(0), { timeout: 5000 });
    expect(storedFiles(join(folder.dataDir, 'parts'))).toEqual([]);
    expect(storedFiles(join(folder.dataDir, 'blobs'))).toEqual([]);
    expect(db.$client.prepare('select count(*) from blob').pluck().get()).toBe(0);
    db.$client.close();
    expect(server.peakMb()).toBeLessThan(1024);
  });

  it('takes a picture with garbled EXIF, and one with the wrong ending', async () => {
    expect(await bring('W1-p1.jpg', await garbledExif(9))).toMatchObject({ state: 'done', pages: [{ place: 'W1, page 1' }] });
    expect(await bring('W2-p1.jpg', await asFormat(10, 'png'))).toMatchObject({ state: 'done', pages: [{ place: 'W2, page 1' }] });
  });

  it('refuses the bad pages of a good file by file and page, and takes the rest', async () => {
    const [one, two] = await Promise.all([pageJpeg(31), pageJpeg(32)]);
    const upload = await bring('row.zip', plainZip({ 'W3-p1.jpg': one, 'broken.jpg': half(two), 'again.jpg': one, 'notes.txt': Buffer.from('six scripts'), 'back/of/hall.jpg': two }));
    expect(upload).toMatchObject({
      state: 'done',
      of: 5,
      pages: [
        { name: 'W3-p1.jpg', state: 'placed', place: 'W3, page 1' },
        { name: 'broken.jpg', state: 'refused', why: 'The file is incomplete or damaged. Scan or upload it again.' },
        { name: 'again.jpg', state: 'refused', why: 'The same picture as W3-p1.jpg. It was not kept twice.' },
        { name: 'notes.txt', state: 'refused', why: 'This is not a picture of a page. Send PDF, JPEG, PNG, TIFF or WebP, or a ZIP of them.' },
        { name: 'back/of/hall.jpg', state: 'loose' },
      ],
    });
  });

  it('takes the scanner’s own JPEGs out of a PDF, byte for byte', async () => {
    const size = { width: 1240, height: 1754 };
    const jpegs = await Promise.all([51, 52].map((seed) => pageJpeg(seed, size)));
    const upload = await bring('stack.pdf', scannedPdf(jpegs, size));
    expect(upload).toMatchObject({ state: 'done', of: 2, pages: [{ state: 'loose', why: 'The file holds 2 pages. Say whose each is.' }, { state: 'loose' }] });
    const kept = await Promise.all(upload.pages.map(({ id }) => reader.get(`/api/page-images/${id}/file`).query({ size: 'original' }).expect(200)));
    expect(kept.map(({ body }) => jpegs.findIndex((jpeg) => jpeg.equals(body as Buffer)))).toEqual([0, 1]);
  });

  it('draws any other page of a PDF at 200 dpi, and keeps a huge one to a bounded size', async () => {
    const drawn = await bring('W3.pdf', emptyPdf(1, 595, 842));
    const large = await bring('plan.pdf', emptyPdf(1, 7000, 7000));
    const sizes = await Promise.all([drawn, large].map(async ({ pages: [page] }) => sharp((await reader.get(`/api/page-images/${page?.id}/file`).query({ size: 'original' }).expect(200)).body as Buffer).metadata()));
    // 595 and 842 pt at 200/72 pixels a point.
    expect(sizes[0]).toMatchObject({ width: 1652, height: 2338, channels: 1 });
    expect((sizes[1]?.width ?? 0) * (sizes[1]?.height ?? 0)).toBeLessThanOrEqual(16_000_000);
  });

  it('takes a one-bit scan with the advice to scan in grey', async () => {
    const bits = await sharp(await pageJpeg(61)).greyscale().threshold(120).toColourspace('b-w').tiff({ compression: 'ccittfax4', bitdepth: 1 }).toBuffer();
    const upload = await bring('W9-p1.tif', bits);
    expect(upload.pages).toMatchObject([{ state: 'loose', note: 'A black-and-white scan: faint pencil may be missing. Scan in grey.' }]);
  });
});
