import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { type RequestHandler, Router } from 'express';

/** The built web app: hashed files are kept by browsers for good, the page itself never; unknown addresses are the app's own routes. */
export function webApp(folder: string): RequestHandler {
  const router = Router();
  const page = join(folder, 'index.html');
  const lasting = { immutable: true, maxAge: '365d', index: false } as const;
  router.use('/_expo', express.static(join(folder, '_expo'), lasting));
  router.use('/assets', express.static(join(folder, 'assets'), lasting));
  router.use(express.static(folder, { index: false, maxAge: 0 }));
  router.get('/{*path}', (req, res, next) => {
    if (!existsSync(page) || !req.accepts('html')) return next();
    res.set('Cache-Control', 'no-cache').sendFile(page);
  });
  return router;
}
