import { rm } from 'node:fs/promises';
import type { RequestHandler, Router } from 'express';
import {
  beginUpload,
  changeBatch,
  completeUpload,
  discardPage,
  getBatch,
  getCrop,
  getPageImage,
  getPageImageFile,
  getUpload,
  listBatches,
  listLoosePages,
  loosenPage,
  makeBatch,
  partBytes,
  placePage,
  putPart,
  retryUpload,
  turnPage,
} from '../../shared/contracts/scans';
import { requireActor } from '../auth/access';
import type { Context } from '../context';
import { invalidRequest, notFound } from '../errors';
import { oneFile } from '../http/one-file';
import { asyncRoute, route } from '../http/route';
import { seenRev } from '../http/seen-rev';
import { sendPicture } from '../http/stored-picture';
import * as batches from '../services/batches';
import * as pages from '../services/pages';
import * as uploads from '../services/uploads';

function uploadRoutes(router: Router, context: Context): void {
  /** Nobody fills the disk with parts of a file that is not theirs to send. */
  const mayKeep: RequestHandler = (req, _res, next) => {
    const actor = requireActor(context, req.user?.personId);
    const params = putPart.params?.safeParse(req.params);
    if (!params?.success) throw notFound();
    uploads.requirePart(context, actor, params.data.id, params.data.part);
    next();
  };

  route(router, context, beginUpload, ({ actor, params, body }) => uploads.beginUpload(context, actor, params.id, body));
  route(router, context, retryUpload, ({ actor, params }) => uploads.retryUpload(context, actor, params.id));
  route(router, context, getUpload, ({ actor, params }) => uploads.uploadFor(context, actor, params.id));
  asyncRoute(router, context, completeUpload, ({ actor, params }) => uploads.completeUpload(context, actor, params.id));
  asyncRoute(
    router,
    context,
    putPart,
    async ({ actor, params, req }) => {
      if (!req.file) throw invalidRequest('Send the part in the field “file”.', { file: 'Send the part.' });
      const { path, size } = req.file;
      try {
        return await uploads.keepPart(context, actor, params.id, params.part, { path, size });
      } finally {
        await rm(path, { force: true });
      }
    },
    mayKeep,
    oneFile(partBytes / 1024 / 1024, context.parts.incoming),
  );
}

function pictureRoutes(router: Router, context: Context): void {
  asyncRoute(router, context, getPageImageFile, ({ actor, params, query, req, res }) =>
    sendPicture(req, res, context.storage, { ...pages.pictureOfPage(context, actor, params.id, query.size), named: query.v }),
  );
  asyncRoute(router, context, getCrop, ({ actor, params, query, req, res }) =>
    sendPicture(req, res, context.storage, { sha256: pages.pictureOfCrop(context, actor, params.id, query.box), mediaType: 'image/jpeg', named: query.v }),
  );
}

export function scanRoutes(router: Router, context: Context): void {
  route(router, context, listBatches, ({ actor, params }) => ({ batches: batches.batchesFor(context, actor, params.id) }));
  route(router, context, makeBatch, ({ actor, params, body }) => batches.createBatch(context, actor, params.id, body.bundle));
  route(router, context, getBatch, ({ actor, params }) => batches.batchFor(context, actor, params.id));
  asyncRoute(router, context, changeBatch, ({ actor, params }) => batches.cancelBatch(context, actor, params.id));
  uploadRoutes(router, context);
  route(router, context, listLoosePages, ({ actor, params }) => pages.looseFor(context, actor, params.id));
  route(router, context, getPageImage, ({ actor, params }) => pages.pageImageFor(context, actor, params.id));
  asyncRoute(router, context, placePage, ({ actor, params, body, req }) => pages.placePage(context, actor, params.id, seenRev(req), body));
  asyncRoute(router, context, turnPage, ({ actor, params, body, req }) => pages.turnPage(context, actor, params.id, seenRev(req), body.by));
  route(router, context, discardPage, ({ actor, params, req }) => pages.discardPage(context, actor, params.id, seenRev(req)));
  route(router, context, loosenPage, ({ actor, params, body, req }) => pages.loosenPage(context, actor, params.id, seenRev(req), body.reopen));
  pictureRoutes(router, context);
}
