import { randomUUID } from 'node:crypto';
import express, { Router, type Express, type RequestHandler } from 'express';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';
import { createPassport } from './auth/passport';
import { sessionMiddleware } from './auth/session-middleware';
import type { Config } from './config/config';
import type { Context } from './context';
import { errorHandler, unknownAddress } from './http/error-handler';
import { originCheck } from './http/origin-check';
import { webApp } from './http/web-app';
import { registerRoutes } from './routes/register';

const securityHeaders = ({ cookieSecure }: Config): RequestHandler =>
  helmet({
    contentSecurityPolicy: {
      directives: {
        // NOTE react-native-web writes its style sheet into the page at run time.
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'blob:', 'data:'],
        upgradeInsecureRequests: cookieSecure ? [] : null,
      },
    },
    strictTransportSecurity: cookieSecure,
  });

/** Middleware, routes and error handler round a context. Opens nothing itself. */
export function createApp(context: Context, handlers: { web?: RequestHandler } = {}): Express {
  const { config, log } = context;
  const app = express();
  app.disable('x-powered-by');
  if (config.publicOrigin) app.set('trust proxy', 1);
  app.use(pinoHttp({ logger: log, genReqId: () => randomUUID(), autoLogging: config.mode === 'development' }));
  if (!config.devWebOrigin) app.use(securityHeaders(config));
  const passport = createPassport(context);
  const api = Router();
  api.use(originCheck(config));
  api.use(sessionMiddleware(context, passport));
  api.use(express.json({ limit: '1mb' }));
  registerRoutes(api, context, passport);
  api.use(unknownAddress);

  app.use('/api', api);
  app.use(handlers.web ?? webApp(config.webDir));
  app.use(unknownAddress);
  app.use(errorHandler(context));
  return app;
}
