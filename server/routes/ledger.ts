import type { Router } from 'express';
import {
  getAnswer,
  getAnswerHistory,
  getExportFile,
  getLedger,
  getTotals,
  makeExport,
  recordThirdReading,
  ruleAnswer,
  takeBackRuling,
} from '../../shared/contracts/ledger';
import type { Context } from '../context';
import { asyncRoute, route } from '../http/route';
import { seenRev } from '../http/seen-rev';
import { answerView } from '../services/answers';
import { exportFileOf, makeMarksExport } from '../services/exports';
import { answerHistory } from '../services/history';
import { ledger } from '../services/ledger';
import * as rulings from '../services/rulings';
import { totals } from '../services/totals';

export function ledgerRoutes(router: Router, context: Context): void {
  route(router, context, getLedger, ({ actor, params, query }) => ledger(context, actor, params.id, query));
  route(router, context, getAnswer, ({ actor, params }) => answerView(context, actor, params.id));
  route(router, context, getAnswerHistory, ({ actor, params }) => ({ acts: answerHistory(context, actor, params.id) }));
  route(router, context, recordThirdReading, ({ actor, params, body }) => rulings.recordThirdReading(context, actor, params.id, params.reading, body));
  route(router, context, ruleAnswer, ({ actor, params, body, req }) => rulings.ruleAnswer(context, actor, params.id, seenRev(req), body));
  route(router, context, takeBackRuling, ({ actor, params }) => rulings.takeBackRuling(context, actor, params.id));
  route(router, context, getTotals, ({ actor, params }) => totals(context, actor, params.id));
  asyncRoute(router, context, makeExport, ({ actor, params }) => makeMarksExport(context, actor, params.id));
  asyncRoute(router, context, getExportFile, async ({ actor, params, res }) => {
    const { fileName, bytes } = await exportFileOf(context, actor, params.id);
    res.set('Cache-Control', 'private, no-store').attachment(fileName).type('text/csv').send(bytes);
  });
}
