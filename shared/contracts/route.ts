import type { z } from 'zod';
import type { MembershipRole } from './enums';

/** Roles as guards know them: those of a course, and the exams officer, who has none. */
export type GuardRole = MembershipRole | 'officer';

export type Access =
  | { readonly who: 'anyone' }
  | { readonly who: 'signed-in' }
  /** Within the course of the thing named: others with a role there get not_allowed, everyone else not_found. */
  | { readonly who: 'course'; readonly roles: readonly GuardRole[] };

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

export interface RouteContract<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  readonly method: Method;
  /** Under /api, with :names. */
  readonly path: string;
  readonly summary: string;
  readonly access: Access;
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  /** JSON sent back; absent where the answer is bytes or empty. */
  readonly response?: Response;
  /** Media type of an answer that is not JSON. */
  readonly bytes?: string;
  /** Media type of a request that is not JSON. */
  readonly accepts?: 'multipart/form-data' | 'application/zip';
  /** 200 unless said; 204 where nothing is sent back. */
  readonly status?: 200 | 201 | 202 | 204;
}

/** Keeps the literal types of one route, so that client and server share them. */
export const defineRoute = <
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Response extends z.ZodType,
>(
  contract: RouteContract<Params, Query, Body, Response>,
): RouteContract<Params, Query, Body, Response> => contract;

export type ParamsOf<C> = C extends RouteContract<infer P, z.ZodType, z.ZodType, z.ZodType> ? z.output<P> : never;
export type QueryOf<C> = C extends RouteContract<z.ZodType, infer Q, z.ZodType, z.ZodType> ? z.output<Q> : never;
export type BodyOf<C> = C extends RouteContract<z.ZodType, z.ZodType, infer B, z.ZodType> ? z.output<B> : never;
/** What a client sends: defaults may be left out. */
export type SentBodyOf<C> = C extends RouteContract<z.ZodType, z.ZodType, infer B, z.ZodType> ? z.input<B> : never;
export type ResponseOf<C> = C extends RouteContract<z.ZodType, z.ZodType, z.ZodType, infer R> ? z.output<R> : never;
