import type { Request, RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit, type RateLimitInfo } from 'express-rate-limit';
import type { Context } from '../context';
import { AppError } from '../errors';

const windowMs = 15 * 60_000;

interface SignInLimit {
  readonly middleware: RequestHandler;
  triesLeft(req: Request): number;
  /** After a good sign-in the count starts afresh. */
  forget(req: Request): void;
}

const keyOf = (req: Request): string => {
  const { email } = (req.body ?? {}) as { email?: unknown };
  return `${ipKeyGenerator(req.ip ?? '')} ${typeof email === 'string' ? email.trim().toLowerCase() : ''}`;
};

/** A few refused tries for one name from one address, then a wait whose end is said. */
export function signInLimit({ config }: Pick<Context, 'config'>): SignInLimit {
  const infoOf = (req: Request) => (req as Request & { rateLimit?: RateLimitInfo }).rateLimit;
  const middleware = rateLimit({
    windowMs,
    limit: config.signInTries,
    keyGenerator: keyOf,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: (req) => {
      const minutes = Math.max(1, Math.ceil(((infoOf(req)?.resetTime?.getTime() ?? Date.now() + windowMs) - Date.now()) / 60_000));
      throw new AppError('too_many_requests', `Too many tries for this name. Try again in ${minutes} ${minutes === 1 ? 'minute' : 'minutes'}.`);
    },
  });
  return {
    middleware,
    triesLeft: (req) => infoOf(req)?.remaining ?? 0,
    forget: (req) => middleware.resetKey(keyOf(req)),
  };
}
