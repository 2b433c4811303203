import { readFile, rm } from 'node:fs/promises';
import type { RequestHandler, Router } from 'express';
import { getBoxes, getSample, putSample, saveBoxes } from '../../shared/contracts/layouts';
import { requireActor } from '../auth/access';
import type { Context } from '../context';
import { invalidRequest, notFound } from '../errors';
import { oneFile } from '../http/one-file';
import { asyncRoute, route } from '../http/route';
import { seenRev } from '../http/seen-rev';
import { sampleJpeg } from '../ingest/sample-image';
import * as layouts from '../services/layouts';

export function layoutRoutes(router: Router, context: Context): void {
  /** Nobody fills the disk who may not store a sample. */
  const mayStore: RequestHandler = (req, _res, next) => {
    const actor = requireActor(context, req.user?.personId);
    const params = putSample.params?.safeParse(req.params);
    if (!params?.success) throw notFound();
    layouts.requireSamplePlace(context, actor, params.data.id, params.data.page);
    next();
  };

  route(router, context, getBoxes, ({ actor, params }) => layouts.layoutFor(context, actor, params.id));
  route(router, context, saveBoxes, ({ actor, params, body, req }) => layouts.saveLayout(context, actor, params.id, seenRev(req), body));
  asyncRoute(
    router,
    context,
    putSample,
    async ({ actor, params, req }) => {
      if (!req.file) throw invalidRequest('Send one picture, in the field “file”.', { file: 'Send one picture.' });
      const bytes = await readFile(req.file.path).finally(() => rm(req.file?.path ?? '', { force: true }));
      const jpeg = await sampleJpeg(bytes);
      if (!jpeg) throw invalidRequest('This is not a picture that can be shown: JPEG, PNG, WebP or TIFF.', { file: 'Not a picture.' });
      return layouts.saveSample(context, actor, params.id, params.page, jpeg);
    },
    mayStore,
    oneFile(20),
  );
  asyncRoute(router, context, getSample, async ({ actor, params, req, res }) => {
    const sha256 = layouts.sampleOf(context, actor, params.id, params.page);
    res.set({ 'Cache-Control': 'private, no-cache', ETag: `"${sha256}"`, 'Content-Type': 'image/jpeg' });
    if (req.fresh) res.status(304).end();
    else res.send(await context.storage.read(sha256));
  });
}
