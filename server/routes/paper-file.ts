import type { Router } from 'express';
import { z } from 'zod';
import { getPaperFile, getPaperPdf, getPaperQti, getPaperSchema, paperFile, putPaperFile } from '../../shared/contracts/paper-file';
import type { Context } from '../context';
import { asyncRoute, openRoute, route } from '../http/route';
import { seenRev } from '../http/seen-rev';
import * as papers from '../services/paper-file';
import { paperPdf } from '../services/paper-pdf';
import { paperQti } from '../services/paper-qti';

export function paperFileRoutes(router: Router, context: Context): void {
  const schema = { $id: 'paper-1.json', title: 'A paper of numeric items', ...z.toJSONSchema(paperFile, { io: 'input' }) };
  openRoute(router, context, getPaperSchema, () => schema);
  route(router, context, getPaperFile, ({ actor, params }) => papers.paperFileFor(context, actor, params.id));
  route(router, context, putPaperFile, ({ actor, params, body, req }) => papers.takePaperFile(context, actor, params.id, seenRev(req), body));
  asyncRoute(router, context, getPaperPdf, async ({ actor, params, res }) => {
    const { fileName, bytes } = await paperPdf(context, actor, params.id);
    res.set({ 'Content-Type': 'application/pdf', 'Content-Disposition': `inline; filename="${fileName}"`, 'Cache-Control': 'private, no-store' }).send(bytes);
  });
  route(router, context, getPaperQti, ({ actor, params, res }) => {
    const { fileName, bytes } = paperQti(context, actor, params.id);
    res.set({ 'Content-Type': 'application/zip', 'Content-Disposition': `attachment; filename="${fileName}"`, 'Cache-Control': 'private, no-store' }).send(bytes);
  });
}
