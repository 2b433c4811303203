import type { Router } from 'express';
import { bindScript, getByHand, getNumberStrip, getPeopleAndPaper, listByHand, listNumberStrips, makeByHand, readNumber, settleNumber, swapScripts, typeByHand } from '../../shared/contracts/people-and-paper';
import type { Context } from '../context';
import { asyncRoute, route } from '../http/route';
import { sendPicture } from '../http/stored-picture';
import * as binding from '../services/people/binding';
import * as hand from '../services/people/by-hand';
import * as numbers from '../services/people/numbers';
import { peopleAndPaper } from '../services/people/overview';

export function peopleAndPaperRoutes(router: Router, context: Context): void {
  route(router, context, listNumberStrips, ({ actor, params, query }) => numbers.numberStrips(context, actor, params.id, query.limit));
  asyncRoute(router, context, getNumberStrip, ({ actor, params, query, req, res }) =>
    sendPicture(req, res, context.storage, { sha256: numbers.pictureOfStrip(context, actor, params.id), mediaType: 'image/jpeg', named: query.v }),
  );
  route(router, context, readNumber, ({ actor, params, body }) => {
    numbers.readNumber(context, actor, params.id, body);
    return { kept: true as const };
  });
  route(router, context, getPeopleAndPaper, ({ actor, params }) => peopleAndPaper(context, actor, params.id));
  route(router, context, bindScript, ({ actor, params, body }) => binding.bindScript(context, actor, params.id, body));
  route(router, context, swapScripts, ({ actor, params, body }) => binding.swapScripts(context, actor, params.id, body));
  route(router, context, settleNumber, ({ actor, params, body }) => binding.settleNumber(context, actor, params.id, body));
  route(router, context, makeByHand, ({ actor, params, body }) => hand.makeByHand(context, actor, params.id, body));
  route(router, context, listByHand, ({ actor, params }) => ({ scripts: hand.handScripts(context, actor, params.id) }));
  route(router, context, getByHand, ({ actor, params }) => hand.handSheet(context, actor, params.id));
  route(router, context, typeByHand, ({ actor, params, body }) => {
    hand.typeByHand(context, actor, params.id, body);
    return { kept: true as const };
  });
}
