import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import type { ByteRange, Storage } from '../storage/storage';
import { notFound } from '../errors';

/** The one range asked for; null for the whole, and for several at once, which are answered whole. */
function rangeOf(req: Request, size: number): ByteRange | 'outside' | null {
  const asked = req.range(size, { combine: true });
  if (asked === undefined || asked === -2) return null;
  if (asked === -1) return 'outside';
  const [first] = asked;
  return asked.type === 'bytes' && asked.length === 1 && first ? first : null;
}

async function sendBytes(req: Request, res: Response, storage: Storage, sha256: string): Promise<void> {
  const size = await storage.size(sha256);
  if (size === null) throw notFound();
  const range = rangeOf(req, size);
  if (range === 'outside') {
    res.status(416).set('Content-Range', `bytes */${size}`).end();
    return;
  }
  res.set('Content-Length', String(range ? range.end - range.start + 1 : size));
  if (range) res.status(206).set('Content-Range', `bytes ${range.start}-${range.end}/${size}`);
  try {
    await pipeline(await storage.stream(sha256, range ?? undefined), res);
  } catch (error) {
    // Someone who goes away in the middle is no fault of ours.
    if (!(error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE')) throw error;
  }
}

interface Picture {
  readonly sha256: string;
  readonly mediaType: string;
  /** The version that the address names. */
  readonly named: string | undefined;
}

/**
 * Sends a stored picture: private, with ranges, its hash as ETag. An address that names the hash (`v`) never changes what it
 * shows and may be kept for an hour; any other is asked about again each time.
 */
export async function sendPicture(req: Request, res: Response, storage: Storage, { sha256, mediaType, named }: Picture): Promise<void> {
  const isNamed = named !== undefined && named.length >= 12 && sha256.startsWith(named);
  res.set({ ETag: `"${sha256}"`, 'Content-Type': mediaType, 'Cache-Control': isNamed ? 'private, max-age=3600' : 'private, no-cache', 'Accept-Ranges': 'bytes' });
  if (req.fresh) res.status(304).end();
  else if (req.method === 'HEAD') res.end();
  else await sendBytes(req, res, storage, sha256);
}
