import type { Router } from 'express';
import { changeAttendance, confirmClassList, getNames, listCandidates, previewClassList } from '../../shared/contracts/class-list';
import type { Context } from '../context';
import { route } from '../http/route';
import { seenRev } from '../http/seen-rev';
import * as candidates from '../services/candidates';
import * as classList from '../services/class-list';

export function classListRoutes(router: Router, context: Context): void {
  route(router, context, previewClassList, ({ actor, params, body }) => classList.previewClassList(context, actor, params.id, body.text));
  route(router, context, confirmClassList, ({ actor, params, body }) => classList.importClassList(context, actor, params.id, body.text, body.hash));
  route(router, context, getNames, ({ actor, params }) => ({ names: classList.namesFor(context, actor, params.id) }));
  route(router, context, listCandidates, ({ actor, params }) => ({ candidates: candidates.candidatesOf(context, actor, params.id) }));
  route(router, context, changeAttendance, ({ actor, params, body, req }) => candidates.changeAttendance(context, actor, params.id, seenRev(req), body.attendance));
}
