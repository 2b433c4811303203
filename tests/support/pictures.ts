import sharp from 'sharp';

/** A page-sized JPEG with a mark in its top left corner, unlike any other of another seed. */
export function pageJpeg(seed: number, { width = 620, height = 877 } = {}): Promise<Buffer> {
  const mark = Buffer.alloc(40 * 40 * 3, (seed * 37) % 200);
  return sharp({ create: { width, height, channels: 3, background: { r: 250, g: 250, b: 245 - (seed % 90) } } })
    .composite([{ input: mark, raw: { width: 40, height: 40, channels: 3 }, left: 5, top: 5 }])
    .jpeg({ quality: 90 })
    .toBuffer();
}
