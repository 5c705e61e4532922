import { Router, type Request, type Response } from 'express';
import type Stripe from 'stripe';
import { setStanding } from '../acts/onboarding.js';
import type { Provider } from '../provider.js';
import { onShelf } from '../state/book.js';
import type { LinkRecord } from '../state/state.js';
import { closedPage } from './checkout-page.js';
import { fieldOf } from './form-field.js';
import { setupPage } from './setup-page.js';

interface Found {
  provider: Provider;
  token: string;
  link: LinkRecord;
  account: Stripe.Account;
}

/** The onboarding page of a connected account. A link that was used or is too old leads to the refresh address. */
export function setupRoutes(provider: Provider): Router {
  const router = Router();
  router.get('/setup/s/:token', (request, response) => {
    const found = open(provider, request.params.token, response);
    if (found !== null) response.send(setupPage(found.token, found.account, null));
  });
  router.post('/setup/s/:token', (request, response) => {
    const found = open(provider, request.params.token, response);
    if (found !== null) submit(found, request, response);
    provider.changed();
  });
  return router;
}

function open(provider: Provider, token: string, response: Response): Found | null {
  const link = onShelf(provider.state.links, token);
  const account = link === undefined ? undefined : onShelf(provider.state.accounts, link.account);
  if (link === undefined || account === undefined) {
    response.status(404).send(closedPage('No such page', 'This page does not exist.'));
    return null;
  }
  if (!link.used && link.expiresAt > provider.now()) return { provider, token, link, account };
  response.redirect(303, link.refreshUrl);
  return null;
}

function submit(found: Found, request: Request, response: Response): void {
  const action = fieldOf(request, 'action');
  const businessName = fieldOf(request, 'business_name').trim();
  if (action !== 'later' && (businessName === '' || businessName.length > 100)) {
    response.status(422).send(setupPage(found.token, found.account, 'Enter the name of the business.'));
    return;
  }
  if (action !== 'later') finish(found, businessName, action === 'complete');
  response.redirect(303, found.link.returnUrl);
}

function finish({ provider, link, account }: Found, businessName: string, enabled: boolean): void {
  link.used = true;
  setStanding(provider.desk(account.id), account, { detailsSubmitted: true, enabled, businessName });
}
