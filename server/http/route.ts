import { createHash } from 'node:crypto';
import type { Request, RequestHandler, Response, Router } from 'express';
import type { z } from 'zod';
import { inTransaction } from '../../db/client';
import { committedTogether } from '../../db/group-commit';
import { findStoredResponse, storeResponse } from '../../db/queries/idempotency';
import type { BodyOf, ParamsOf, QueryOf, ResponseOf, RouteContract } from '../../shared/contracts/route';
import { requireActor, type Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest } from '../errors';

export interface Call<C> {
  readonly context: Context;
  readonly params: ParamsOf<C>;
  readonly query: QueryOf<C>;
  readonly body: BodyOf<C>;
  readonly req: Request;
  readonly res: Response;
}

export interface SignedInCall<C> extends Call<C> {
  readonly actor: Actor;
}

type AnyContract = RouteContract;

/** Parses one part of a request; what is wrong is named by its path. */
function parsePart(schema: z.ZodType | undefined, value: unknown, part: string): unknown {
  if (!schema) return undefined;
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const fields: Record<string, string> = {};
  for (const issue of parsed.error.issues) fields[issue.path.join('.') || part] ??= issue.message;
  const first = Object.entries(fields)[0];
  throw invalidRequest(first ? `${first[0]}: ${first[1]}` : 'The request is not as described.', fields);
}

function parseCall<C extends AnyContract>(context: Context, contract: C, req: Request, res: Response): Call<C> {
  return {
    context,
    req,
    res,
    params: parsePart(contract.params, req.params, 'params') as ParamsOf<C>,
    query: parsePart(contract.query, req.query, 'query') as QueryOf<C>,
    body: parsePart(contract.accepts ? undefined : contract.body, req.body ?? {}, 'body') as BodyOf<C>,
  };
}

/** Sends through the response schema, so that no column leaks; 204 and bytes excepted. */
function send(contract: AnyContract, res: Response, result: unknown): void {
  if (res.headersSent) return;
  if (!contract.response) {
    res.status(contract.status ?? 204).end();
    return;
  }
  res.status(contract.status ?? 200).json(contract.response.parse(result));
}

/** Runs a synchronous write once for each Idempotency-Key of a person: a repeat gets the stored answer. */
function runOnce<C extends AnyContract>(contract: C, call: SignedInCall<C>, work: () => unknown): unknown {
  const key = call.req.get('Idempotency-Key');
  if (!key || contract.method === 'get') return work();
  if (key.length > 200) throw invalidRequest('Idempotency-Key: 200 characters at most.');
  const { db, clock } = call.context;
  const requestHash = createHash('sha256').update(JSON.stringify([contract.method, call.req.path, call.body ?? null])).digest('hex');
  return inTransaction(db, (): unknown => {
    const stored = findStoredResponse(db, call.actor.personId, key);
    if (stored && stored.requestHash !== requestHash) throw conflict('This Idempotency-Key was used for another request.');
    if (stored) return JSON.parse(stored.response);
    const result = work();
    const row = { key, person: call.actor.personId, requestHash, status: contract.status ?? 200, response: JSON.stringify(result ?? null), at: clock.now() };
    storeResponse(db, row);
    return result;
  });
}

/** A route for a person who is signed in; the work is synchronous, so that all of it can be one transaction. */
export function route<C extends AnyContract>(
  router: Router,
  context: Context,
  contract: C,
  work: (call: SignedInCall<C>) => ResponseOf<C> | void,
): void {
  router[contract.method](contract.path, (req, res) => {
    const actor = requireActor(context, req.user?.personId);
    const call = { ...parseCall(context, contract, req, res), actor };
    send(contract, res, runOnce(contract, call, () => work(call)));
  });
}

/** The same for what many send at once: calls that arrive together share one commit, and each is answered once it is on disk. */
export function togetherRoute<C extends AnyContract>(
  router: Router,
  context: Context,
  contract: C,
  work: (call: SignedInCall<C>) => ResponseOf<C> | void,
): void {
  router[contract.method](contract.path, async (req, res) => {
    const actor = requireActor(context, req.user?.personId);
    const call = { ...parseCall(context, contract, req, res), actor };
    send(contract, res, await committedTogether(context.db, () => runOnce(contract, call, () => work(call))));
  });
}

/** A route whose work waits for something: bytes, a hash of a password. */
export function asyncRoute<C extends AnyContract>(
  router: Router,
  context: Context,
  contract: C,
  work: (call: SignedInCall<C>) => Promise<ResponseOf<C> | void>,
  ...before: RequestHandler[]
): void {
  router[contract.method](contract.path, ...before, async (req, res) => {
    const actor = requireActor(context, req.user?.personId);
    send(contract, res, await work({ ...parseCall(context, contract, req, res), actor }));
  });
}

/** A route anyone may call. */
export function openRoute<C extends AnyContract>(
  router: Router,
  context: Context,
  contract: C,
  work: (call: Call<C>) => ResponseOf<C> | void | Promise<ResponseOf<C> | void>,
  ...before: RequestHandler[]
): void {
  router[contract.method](contract.path, ...before, async (req, res) => {
    send(contract, res, await work(parseCall(context, contract, req, res)));
  });
}
