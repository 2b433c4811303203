import type { Router } from 'express';
import { getPrintingFile, getSheetPreview, listPrintings, makePrinting } from '../../shared/contracts/printings';
import type { Context } from '../context';
import { asyncRoute, route } from '../http/route';
import { sendPicture } from '../http/stored-picture';
import * as printings from '../services/printings';
import { sheetPreviewFor } from '../services/sheet-preview';

export function printingRoutes(router: Router, context: Context): void {
  route(router, context, getSheetPreview, ({ actor, params, query }) => sheetPreviewFor(context, actor, params.id, query.paperSize));
  route(router, context, makePrinting, ({ actor, params, body }) => printings.printFor(context, actor, params.id, body));
  route(router, context, listPrintings, ({ actor, params }) => ({ printings: printings.printingsFor(context, actor, params.id) }));
  asyncRoute(router, context, getPrintingFile, async ({ actor, params, req, res }) => {
    const { sha256, fileName } = printings.printingFileFor(context, actor, params.id);
    res.set('Content-Disposition', `attachment; filename="${fileName}"`);
    await sendPicture(req, res, context.storage, { sha256, mediaType: 'application/pdf', named: undefined });
  });
}
