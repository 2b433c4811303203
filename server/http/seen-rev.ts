import type { Request } from 'express';
import { invalidRequest } from '../errors';

/** The rev a write says it saw, from If-Match. A write to a thing that has one must name it. */
export function seenRev(req: Request): number {
  const named = req.get('If-Match')?.replaceAll('"', '');
  if (named === undefined || !/^\d{1,9}$/.test(named)) throw invalidRequest('If-Match: name the rev you saw.');
  return Number(named);
}

/** The mark of a paper that a write says it saw, from If-Match: the ETag its file came with. */
export function seenMark(req: Request): string {
  const named = req.get('If-Match')?.replace(/^W\//, '').replaceAll('"', '').trim();
  if (named === undefined || !/^[0-9a-f]{1,64}$/.test(named)) throw invalidRequest('If-Match: name the ETag that the paper came with.');
  return named;
}
