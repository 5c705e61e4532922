import compression from 'compression';
import express, { type Express } from 'express';
import session from 'express-session';
import helmet from 'helmet';
import { pinoHttp } from 'pino-http';
import { randomUUID } from 'node:crypto';
import type { Config } from './platform/config/config.js';
import { csrf } from './platform/http/csrf.js';
import { mountHealth } from './platform/http/health-routes.js';
import { mountRoutes, type MountOptions } from './platform/http/mount.js';
import { mountOpenApi } from './platform/http/open-api.js';
import { notFound } from './platform/http/problem-error.js';
import { problemHandler } from './platform/http/problem-handler.js';
import type { Route } from './platform/http/route.js';
import { mountWebFiles } from './platform/http/web-files.js';
import type { Logger } from './platform/log/logger.js';
import { maskedUrl } from './platform/log/masked-url.js';
import { safeError } from './platform/log/safe-error.js';
import { LONGEST_MS, type SessionStore } from './platform/sessions/session-store.js';
import type { DataSource } from 'typeorm';

export type AppParts = {
  config: Config;
  log: Logger;
  dataSource: DataSource;
  sessions: SessionStore;
  routes: readonly Route[];
  /** The payment provider's webhook: raw bytes in, since the signature is over them. */
  webhook: express.RequestHandler;
  mount: MountOptions;
  isOpen: () => boolean;
};

/** The middleware in order. */
export function createApp(parts: AppParts): Express {
  const { config, log } = parts;
  const secure = config.origin.startsWith('https:');
  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.set('trust proxy', config.trustedProxies);
  app.use(requestLog(log));
  app.use(securityHeaders(secure));
  mountHealth(app, parts.dataSource, parts.isOpen);
  app.post(
    '/api/webhooks/payments',
    express.raw({ type: 'application/json', limit: '512kb' }),
    parts.webhook,
  );
  app.use('/api', compression({ threshold: 2048 }));
  app.use('/api', express.json({ limit: '512kb', strict: true, inflate: false }));
  app.use('/api', csrf({ origin: config.origin, secret: config.secret, secure }));
  app.use('/api', sessionCookie(config, parts.sessions, secure));
  mountOpenApi(app, parts.routes);
  mountRoutes(app, parts.routes, parts.mount);
  app.use('/api', () => {
    throw notFound('This address');
  });
  mountWebFiles(app, config.webRoot);
  app.use(() => {
    throw notFound('This page');
  });
  app.use(problemHandler(log));
  return app;
}

function requestLog(log: Logger) {
  return pinoHttp({
    logger: log,
    genReqId: () => randomUUID(),
    quietReqLogger: true,
    autoLogging: { ignore: (request) => request.url === '/api/health' || request.url === '/api/ready' },
    serializers: {
      err: safeError,
      req: (request: { id: string; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        url: maskedUrl(request.url),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
    customLogLevel: (_request, response) => (response.statusCode >= 500 ? 'error' : 'info'),
  });
}

function securityHeaders(secure: boolean) {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        'default-src': ["'self'"],
        'script-src': ["'self'"],
        'style-src': ["'self'", "'unsafe-inline'"],
        'img-src': ["'self'", 'data:', 'blob:'],
        'font-src': ["'self'"],
        'connect-src': ["'self'"],
        'object-src': ["'none'"],
        'base-uri': ["'self'"],
        'form-action': ["'self'"],
        'frame-ancestors': ["'none'"],
        ...(secure ? { 'upgrade-insecure-requests': [] } : {}),
      },
    },
    hsts: secure ? { maxAge: 31_536_000, includeSubDomains: false } : false,
    referrerPolicy: { policy: 'same-origin' },
    crossOriginEmbedderPolicy: false,
  });
}

function sessionCookie(config: Config, store: SessionStore, secure: boolean) {
  return session({
    name: secure ? '__Host-bookmatch' : 'bookmatch',
    secret: config.secret,
    store,
    resave: false,
    saveUninitialized: false,
    cookie: { httpOnly: true, sameSite: 'lax', secure, path: '/', maxAge: LONGEST_MS },
  });
}
