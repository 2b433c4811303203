import type { RequestHandler } from 'express';
import session from 'express-session';
import type { Context } from '../context';
import type { AppPassport } from './passport';
import { SqliteSessionStore } from './session-store';

/** Reads the session cookie and puts the person behind it into req.user. */
export function sessionMiddleware(context: Context, passport: AppPassport): RequestHandler[] {
  const { config } = context;
  return [
    session({
      name: 'meniscus',
      secret: config.sessionSecret,
      store: new SqliteSessionStore(context),
      resave: false,
      saveUninitialized: false,
      cookie: { httpOnly: true, sameSite: 'lax', secure: config.cookieSecure, maxAge: config.sessionMs },
    }),
    passport.session(),
  ];
}
