import type { Response } from 'express';
import type { Storage } from '../storage/storage';

/**
 * Sends a stored picture: private, with ranges, its hash as ETag. An address that names the hash (`v`) never changes what it
 * shows and may be kept for an hour; any other is asked about again each time.
 */
export function sendPicture(res: Response, storage: Storage, sha256: string, named: string | undefined, mediaType = 'image/jpeg'): Promise<void> {
  const isNamed = named !== undefined && named.length >= 12 && sha256.startsWith(named);
  return new Promise((resolve, reject) => {
    const headers = { ETag: `"${sha256}"`, 'Content-Type': mediaType, 'Cache-Control': isNamed ? 'private, max-age=3600' : 'private, no-cache' };
    res.sendFile(storage.localPath(sha256), { headers, cacheControl: false, lastModified: false, dotfiles: 'allow' }, (error?: Error) => (error && !res.headersSent ? reject(error) : resolve()));
  });
}
