import type { Request } from 'express';
import { invalidRequest } from '../errors';

/** The rev a write says it saw, from If-Match. A write to a thing that has one must name it. */
export function seenRev(req: Request): number {
  const named = req.get('If-Match')?.replaceAll('"', '');
  if (named === undefined || !/^\d{1,9}$/.test(named)) throw invalidRequest('If-Match: name the rev you saw.');
  return Number(named);
}
