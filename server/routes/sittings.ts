import type { Router } from 'express';
import { getProgress } from '../../shared/contracts/progress';
import { changeSitting, getSitting, listCourses, listSittings, makeSitting } from '../../shared/contracts/sittings';
import type { Context } from '../context';
import { route } from '../http/route';
import { seenRev } from '../http/seen-rev';
import { progressOf } from '../services/progress';
import * as sittings from '../services/sittings';

export function sittingRoutes(router: Router, context: Context): void {
  route(router, context, listCourses, ({ actor }) => ({ courses: sittings.coursesOf(context, actor) }));
  route(router, context, listSittings, ({ actor, params }) => ({ sittings: sittings.sittingsIn(context, actor, params.id) }));
  route(router, context, makeSitting, ({ actor, params, body }) => sittings.createSitting(context, actor, params.id, body));
  route(router, context, getSitting, ({ actor, params }) => sittings.sittingFor(context, actor, params.id));
  route(router, context, changeSitting, ({ actor, params, body, req }) => sittings.changeSitting(context, actor, params.id, seenRev(req), body));
  route(router, context, getProgress, ({ actor, params }) => progressOf(context, actor, params.id));
}
