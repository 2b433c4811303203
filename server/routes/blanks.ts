import type { Router } from 'express';
import { getBlankSuggestions, recordBlankReadings } from '../../shared/contracts/blanks';
import type { Context } from '../context';
import { route } from '../http/route';
import * as blanks from '../services/blanks';

export function blankRoutes(router: Router, context: Context): void {
  route(router, context, getBlankSuggestions, ({ actor, params, query }) => blanks.blankSuggestions(context, actor, params.id, query));
  route(router, context, recordBlankReadings, ({ actor, params, body }) => ({ rows: blanks.recordBlankReadings(context, actor, params.id, body) }));
}
