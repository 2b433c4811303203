import type { Router } from 'express';
import { checkKey, getVetting, vetItem } from '../../shared/contracts/vetting';
import type { Context } from '../context';
import { route } from '../http/route';
import { seenRev } from '../http/seen-rev';
import * as vetting from '../services/vetting';

export function vettingRoutes(router: Router, context: Context): void {
  route(router, context, getVetting, ({ actor, params }) => ({ items: vetting.vettingOf(context, actor, params.id) }));
  route(router, context, checkKey, ({ actor, params, body, req }) => vetting.checkKey(context, actor, params.id, seenRev(req), body.text));
  route(router, context, vetItem, ({ actor, params, body, req }) => vetting.vetItem(context, actor, params.id, seenRev(req), body));
}
