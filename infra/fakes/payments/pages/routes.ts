import express, { Router, type NextFunction, type Request, type Response } from 'express';
import type { Provider } from '../provider.js';
import { checkoutRoutes } from './checkout-routes.js';
import { portalRoutes } from './portal-routes.js';
import { setupRoutes } from './setup-routes.js';
import { STYLE } from './style.js';

/** The pages a browser is sent to. */
export function pageRoutes(provider: Provider): Router {
  const router = Router();
  router.use(guard);
  router.get('/page.css', (_request, response) => void response.type('css').send(STYLE));
  router.use(express.text({ type: 'application/x-www-form-urlencoded', limit: '16kb' }));
  router.use(checkoutRoutes(provider), portalRoutes(provider), setupRoutes(provider));
  return router;
}

/** No script at all. `form-action` stays open: browsers hold it against the redirect back to the shop's page. */
function guard(_request: Request, response: Response, next: NextFunction): void {
  response.set(
    'content-security-policy',
    "default-src 'none'; style-src 'self'; base-uri 'none'; frame-ancestors 'none'",
  );
  response.set('x-content-type-options', 'nosniff');
  response.set('referrer-policy', 'no-referrer');
  response.set('cache-control', 'no-store');
  next();
}
