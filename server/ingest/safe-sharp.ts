import sharp, { type Sharp, type SharpOptions } from 'sharp';

/** A4 at 600 dpi has 35 million pixels. */
export const mostPixels = 60_000_000;

// NOTE libvips would read SVG and more from hostile bytes; this holds for the whole process.
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({ operation: ['VipsForeignLoadJpeg', 'VipsForeignLoadPng', 'VipsForeignLoadTiff', 'VipsForeignLoadWebp'] });
sharp.concurrency(1);
sharp.cache(false);

/** Decodes what scanners send and nothing else, of a bounded size, and tells of every fault. */
export const safeSharp = (input: string | Uint8Array, options: SharpOptions = {}): Sharp => sharp(input, { limitInputPixels: mostPixels, failOn: 'warning', ...options });
