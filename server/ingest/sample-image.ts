import sharp from 'sharp';

const longSidePx = 2000;
const mostPixels = 120_000_000;

/** The picture formats a phone or a scanner gives, told by their first bytes. NOTE sharp would render SVG too. */
function isPicture(head: Uint8Array): boolean {
  const text = Buffer.from(head.subarray(0, 12)).toString('latin1');
  const isTiff = text.startsWith('II*\u0000') || text.startsWith('MM\u0000*');
  return text.startsWith('\u00ff\u00d8\u00ff') || text.startsWith('\u0089PNG\r\n\u001a\n') || (text.startsWith('RIFF') && text.slice(8) === 'WEBP') || isTiff;
}

/** An upright JPEG of a page picture, 2000 px at most on its long side; null when the bytes are no picture. */
export async function sampleJpeg(bytes: Uint8Array): Promise<Buffer | null> {
  if (!isPicture(bytes)) return null;
  try {
    return await sharp(bytes, { limitInputPixels: mostPixels, failOn: 'error' })
      .autoOrient()
      .resize({ width: longSidePx, height: longSidePx, fit: 'inside', withoutEnlargement: true })
      .flatten({ background: 'white' })
      .jpeg({ quality: 82, mozjpeg: true })
      .toBuffer();
  } catch {
    return null;
  }
}
