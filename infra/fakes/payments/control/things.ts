import { Router } from 'express';
import type Stripe from 'stripe';
import { advanceSubscription, STEPS } from '../acts/advance-subscription.js';
import { setStanding } from '../acts/onboarding.js';
import type { Desk } from '../desk.js';
import type { Provider } from '../provider.js';
import { seedPrices } from '../seed.js';
import { onShelf } from '../state/book.js';
import { invalid, noSuch } from '../wire/error.js';
import { priceSeedFrom } from './price-seed.js';
import { needed, Reader } from './read.js';

/** Prices, subscriptions, accounts and the clock. */
export function thingRoutes(provider: Provider): Router {
  const router = Router();
  router.post('/prices', (request, response) => {
    response.json(putUpPrice(provider, request.body));
  });
  router.post('/subscriptions/:id/advance', (request, response) => {
    response.json(advance(provider, request.params.id, request.body));
  });
  router.post('/accounts/:id/standing', (request, response) => {
    response.json(changeStanding(provider, request.params.id, request.body));
  });
  router.post('/clock', (request, response) => {
    const reader = new Reader(request.body);
    provider.state.clockAheadSeconds += needed(reader.integer('advanceSeconds'), 'advanceSeconds');
    reader.end();
    provider.sweep();
    provider.changed();
    response.json({ now: provider.now() });
  });
  return router;
}

function putUpPrice(provider: Provider, body: unknown): Stripe.Price | undefined {
  const seed = priceSeedFrom(body);
  const { book, now } = provider.desk(null);
  seedPrices(book, [seed], now());
  provider.changed();
  return onShelf(book.prices, seed.id);
}

function advance(provider: Provider, id: string, body: unknown): Stripe.Subscription {
  const reader = new Reader(body);
  const step = needed(reader.oneOf('to', STEPS), 'to');
  reader.end();
  const { desk, subscription } = findSubscription(provider, id);
  if (subscription.status === 'canceled') throw invalid('The subscription has ended.');
  advanceSubscription(desk, subscription, step);
  return subscription;
}

function findSubscription(provider: Provider, id: string): { desk: Desk; subscription: Stripe.Subscription } {
  for (const account of provider.accounts()) {
    const desk = provider.desk(account);
    const subscription = onShelf(desk.book.subscriptions, id);
    if (subscription !== undefined) return { desk, subscription };
  }
  throw noSuch('subscription', id, 'id', 404);
}

function changeStanding(provider: Provider, id: string, body: unknown): Stripe.Account {
  const account = onShelf(provider.state.accounts, id);
  if (account === undefined) throw noSuch('account', id, 'id', 404);
  const reader = new Reader(body);
  const standing = {
    detailsSubmitted: reader.flag('detailsSubmitted') ?? true,
    enabled: reader.flag('enabled') ?? true,
  };
  reader.end();
  setStanding(provider.desk(id), account, standing);
  return account;
}
