import { Router, type Request, type Response } from 'express';
import type Stripe from 'stripe';
import { setCancelAtPeriodEnd } from '../acts/cancel-at-period-end.js';
import { changeCard } from '../acts/change-card.js';
import { payOpenInvoices, renew } from '../acts/renew.js';
import { cardByName } from '../cards.js';
import type { Desk } from '../desk.js';
import type { Provider } from '../provider.js';
import { onShelf } from '../state/book.js';
import { closedPage } from './checkout-page.js';
import { fieldOf } from './form-field.js';
import { portalPage } from './portal-page.js';

interface Found {
  desk: Desk;
  session: Stripe.BillingPortal.Session;
}

/** The page on which a customer minds a subscription, with the controls a test needs. */
export function portalRoutes(provider: Provider): Router {
  const router = Router();
  router.get('/p/session/:id', (request, response) => {
    const found = find(provider, request.params.id);
    if (found === null) return missing(response);
    show(found, response, 200, null);
  });
  router.post('/p/session/:id', (request, response) => {
    const found = find(provider, request.params.id);
    if (found === null) return missing(response);
    submit(found, request, response);
    provider.changed();
  });
  return router;
}

function find(provider: Provider, id: string): Found | null {
  for (const account of provider.accounts()) {
    const desk = provider.desk(account);
    const session = onShelf(desk.book.portalSessions, id);
    if (session !== undefined) return { desk, session };
  }
  return null;
}

function missing(response: Response): void {
  response.status(404).send(closedPage('No such page', 'This page does not exist.'));
}

function subscriptionsOf({ desk, session }: Found): Stripe.Subscription[] {
  return Object.values(desk.book.subscriptions).filter((one) => one.customer === session.customer);
}

function show(found: Found, response: Response, status: number, error: string | null): void {
  const { desk, session } = found;
  response.status(status).send(portalPage({ desk, session, subscriptions: subscriptionsOf(found), error }));
}

type Action = (desk: Desk, subscription: Stripe.Subscription, request: Request) => string | null;

/** Each gives a message when it could not be done. */
const ACTIONS: Record<string, Action> = {
  advance: (desk, subscription) => done(() => renew(desk, subscription)),
  cancel: (desk, subscription) => done(() => setCancelAtPeriodEnd(desk, subscription, true)),
  card: putCard,
  'fail-next': (desk, subscription) => done(() => (desk.book.failNext[subscription.id] = true)),
  pay: (desk, subscription) => (payOpenInvoices(desk, subscription) ? null : 'The card was declined.'),
  resume: (desk, subscription) => done(() => setCancelAtPeriodEnd(desk, subscription, false)),
};

function done(act: () => unknown): null {
  act();
  return null;
}

function putCard(desk: Desk, subscription: Stripe.Subscription, request: Request): string | null {
  const card = cardByName(fieldOf(request, 'card'));
  if (card === undefined) return 'Choose a card.';
  return changeCard(desk, subscription, card) ? null : 'The card was declined.';
}

/** Answers with a redirect, so that a reload does not act again. */
function submit(found: Found, request: Request, response: Response): void {
  const name = fieldOf(request, 'action');
  const act = Object.hasOwn(ACTIONS, name) ? ACTIONS[name] : undefined;
  const id = fieldOf(request, 'subscription');
  const subscription = subscriptionsOf(found).find((one) => one.id === id);
  if (act === undefined || subscription === undefined || subscription.status === 'canceled') {
    return show(found, response, 422, 'That cannot be done.');
  }
  const error = act(found.desk, subscription, request);
  if (error !== null) return show(found, response, 402, error);
  response.redirect(303, `/p/session/${found.session.id}`);
}
