import { randomUUID } from 'node:crypto';
import express, { Router, type Express } from 'express';
import session from 'express-session';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';
import { createPassport } from './auth/passport';
import { SqliteSessionStore } from './auth/session-store';
import type { Context } from './context';
import { errorHandler, unknownAddress } from './http/error-handler';
import { originCheck } from './http/origin-check';
import { webApp } from './http/web-app';
import { registerRoutes } from './routes/register';

/** Middleware, routes and error handler round a context. Opens nothing itself. */
export function createApp(context: Context): Express {
  const { config, log } = context;
  const app = express();
  app.disable('x-powered-by');
  if (config.publicOrigin) app.set('trust proxy', 1);
  app.use(pinoHttp({ logger: log, genReqId: () => randomUUID(), autoLogging: config.mode === 'development' }));
  app.use(
    helmet({
      contentSecurityPolicy: {
        directives: {
          // NOTE react-native-web writes its style sheet into the page at run time.
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'blob:', 'data:'],
          upgradeInsecureRequests: config.cookieSecure ? [] : null,
        },
      },
      strictTransportSecurity: config.cookieSecure,
    }),
  );

  const passport = createPassport(context);
  const api = Router();
  api.use(originCheck(config));
  api.use(
    session({
      name: 'meniscus',
      secret: config.sessionSecret,
      store: new SqliteSessionStore(context),
      resave: false,
      saveUninitialized: false,
      cookie: { httpOnly: true, sameSite: 'lax', secure: config.cookieSecure, maxAge: config.sessionMs },
    }),
  );
  api.use(passport.session());
  api.use(express.json({ limit: '1mb' }));
  registerRoutes(api, context, passport);
  api.use(unknownAddress);

  app.use('/api', api);
  app.use(webApp(config.webDir));
  app.use(unknownAddress);
  app.use(errorHandler(context));
  return app;
}
