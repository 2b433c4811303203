import { raw, type Request, type Response, type Router } from 'express';
import { z } from 'zod';
import { getPaperFile, getPaperPdf, getPaperQti, getPaperSchema, paperFile, previewPaperQti, putPaperFile, putPaperQti, type PaperFile } from '../../shared/contracts/paper-file';
import type { Context } from '../context';
import { asyncRoute, openRoute, route } from '../http/route';
import { seenMark } from '../http/seen-rev';
import * as papers from '../services/paper-file';
import { paperPdf } from '../services/paper-pdf';
import { invalidRequest } from '../errors';
import { paperQti } from '../services/paper-qti';
import { previewQti, takeQti } from '../services/take-qti';

const zipBytes = raw({ type: 'application/zip', limit: '4mb', inflate: false });

function sentZip(req: Request): Uint8Array {
  if (!Buffer.isBuffer(req.body)) throw invalidRequest('Send the package as application/zip.');
  return req.body;
}

function marked(res: Response, file: PaperFile): PaperFile {
  res.set('ETag', `"${papers.paperMark(file)}"`);
  return file;
}

export function paperFileRoutes(router: Router, context: Context): void {
  const schema = { $id: 'paper-1.json', title: 'A paper of items', ...z.toJSONSchema(paperFile, { io: 'input' }) };
  openRoute(router, context, getPaperSchema, () => schema);
  route(router, context, getPaperFile, ({ actor, params, res }) => marked(res, papers.paperFileFor(context, actor, params.id)));
  route(router, context, putPaperFile, ({ actor, params, body, req, res }) => marked(res, papers.takePaperFile(context, actor, params.id, seenMark(req), body)));
  asyncRoute(router, context, getPaperPdf, async ({ actor, params, res }) => {
    const { fileName, bytes } = await paperPdf(context, actor, params.id);
    res.set({ 'Content-Type': 'application/pdf', 'Content-Disposition': `inline; filename="${fileName}"`, 'Cache-Control': 'private, no-store' }).send(bytes);
  });
  route(router, context, getPaperQti, ({ actor, params, res }) => {
    const { fileName, bytes } = paperQti(context, actor, params.id);
    res.set({ 'Content-Type': 'application/zip', 'Content-Disposition': `attachment; filename="${fileName}"`, 'Cache-Control': 'private, no-store' }).send(bytes);
  });
  asyncRoute(router, context, previewPaperQti, async ({ actor, params, req }) => previewQti(context, actor, params.id, sentZip(req)), zipBytes);
  asyncRoute(
    router,
    context,
    putPaperQti,
    async ({ actor, params, query, req }) => takeQti(context, actor, params.id, seenMark(req), { bytes: sentZip(req), takesRest: query.rest === 'take' }),
    zipBytes,
  );
}
