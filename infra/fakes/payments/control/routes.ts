import express, { Router, type NextFunction, type Request, type Response } from 'express';
import type { Provider } from '../provider.js';
import { invalid } from '../wire/error.js';
import { faultRoutes } from './faults.js';
import { thingRoutes } from './things.js';
import { webhookRoutes } from './webhooks.js';

/** What tests use to make the provider misbehave, or time pass. README.md lists it all. */
export function controlRoutes(provider: Provider): Router {
  const router = Router();
  router.use(noBrowser, express.json({ limit: '256kb' }));
  router.post('/reset', (_request, response) => {
    provider.reset();
    response.json({ ok: true });
  });
  router.use(faultRoutes(provider), webhookRoutes(provider), thingRoutes(provider));
  router.use((request: Request) => {
    throw invalid(`No such control: ${request.method} ${request.path}`);
  });
  return router;
}

/** A page in somebody's browser has no business here: browsers name their origin, tests do not. */
function noBrowser(request: Request, _response: Response, next: NextFunction): void {
  if (request.get('origin') !== undefined) throw invalid('The controls are not for browsers.');
  if (request.method !== 'GET' && request.is('application/json') === false) {
    throw invalid('The controls take JSON only.');
  }
  next();
}
