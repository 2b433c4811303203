import type { Router } from 'express';
import { getItemBank } from '../../shared/contracts/item-bank';
import { getItem, listItems, lockPaper as lockContract, makeItem, orderItems, removeItem, saveItem, spotTest as spotTestContract, workKey } from '../../shared/contracts/items';
import type { Context } from '../context';
import { route } from '../http/route';
import { seenRev } from '../http/seen-rev';
import { itemBank } from '../services/item-bank';
import * as items from '../services/items';
import { lockPaper } from '../services/paper-lock';
import { spotTest } from '../services/spot-test';

export function itemRoutes(router: Router, context: Context): void {
  route(router, context, getItemBank, ({ actor, params }) => ({ items: itemBank(context, actor, params.id) }));
  route(router, context, listItems, ({ actor, params }) => items.itemsOf(context, actor, params.id));
  route(router, context, makeItem, ({ actor, params, body }) => items.createItem(context, actor, params.id, body));
  route(router, context, getItem, ({ actor, params }) => items.itemFor(context, actor, params.id));
  route(router, context, saveItem, ({ actor, params, body, req }) => items.saveItem(context, actor, params.id, seenRev(req), body));
  route(router, context, removeItem, ({ actor, params, req }) => items.removeItem(context, actor, params.id, seenRev(req)));
  route(router, context, orderItems, ({ actor, params, body }) => items.orderItems(context, actor, params.id, body.items));
  route(router, context, workKey, ({ actor, body }) => items.workKey(context, actor, body));
  route(router, context, spotTestContract, ({ actor, params, body }) => spotTest(context, actor, params.id, body));
  route(router, context, lockContract, ({ actor, params, body }) => lockPaper(context, actor, params.id, body.isForPrinting));
}
