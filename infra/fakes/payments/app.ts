import express, { type Express } from 'express';
import { CALLS } from './calls/index.js';
import { controlRoutes } from './control/routes.js';
import { pageRoutes } from './pages/routes.js';
import type { Provider } from './provider.js';
import { answerCall, sendError, unknownAddress } from './wire/answer.js';

const BODY_LIMIT = '256kb';

/** The API under /v1, the hosted pages, the test controls under /_control. */
export function buildApp(provider: Provider): Express {
  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.get('/healthz', (_request, response) => void response.json({ status: 'ok' }));
  app.use('/v1', express.text({ type: () => true, limit: BODY_LIMIT }));
  for (const call of CALLS) app[call.method](call.path, answerCall(provider, call));
  app.use('/v1', unknownAddress);
  app.use('/_control', controlRoutes(provider));
  app.use(pageRoutes(provider));
  app.use(sendError);
  return app;
}
