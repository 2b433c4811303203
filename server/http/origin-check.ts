import type { RequestHandler } from 'express';
import type { Config } from '../config/config';
import { notAllowed } from '../errors';

const reading = new Set(['GET', 'HEAD', 'OPTIONS']);

/** A write must come from our own pages: browsers name the origin, and other sites cannot forge it. */
export const originCheck =
  ({ publicOrigin }: Pick<Config, 'publicOrigin'>): RequestHandler =>
  (req, _res, next) => {
    if (reading.has(req.method)) return next();
    const origin = req.get('Origin');
    const site = req.get('Sec-Fetch-Site');
    const own = publicOrigin ?? `${req.protocol}://${req.get('Host') ?? ''}`;
    if (origin !== undefined && origin !== own) throw notAllowed('This request came from another site.');
    if (site !== undefined && site !== 'same-origin' && site !== 'none') throw notAllowed('This request came from another site.');
    next();
  };
