import { Router, type Request, type Response } from 'express';
import { paySession } from '../acts/pay-session.js';
import { expireSession } from '../acts/complete-session.js';
import { subscribeSession } from '../acts/subscribe-session.js';
import { cardByName, declineMessage, type TestCard } from '../cards.js';
import type { Desk } from '../desk.js';
import type { Provider } from '../provider.js';
import { onShelf, type SessionRecord } from '../state/book.js';
import { isEmail } from '../wire/scalars.js';
import { checkoutPage, closedPage } from './checkout-page.js';
import { fieldOf } from './form-field.js';

interface Found {
  desk: Desk;
  record: SessionRecord;
}

/** The checkout page of a session, its payment and its way back. */
export function checkoutRoutes(provider: Provider): Router {
  const router = Router();
  router.get('/c/pay/:id', (request, response) => {
    const found = find(provider, request.params.id);
    if (found === null) return missing(response);
    if (!refuseClosed(found, response)) show(found, response, 200, {});
  });
  router.post('/c/pay/:id', (request, response) => {
    const found = find(provider, request.params.id);
    if (found === null) return missing(response);
    if (!refuseClosed(found, response)) submit(found, request, response);
    provider.changed();
  });
  return router;
}

function find(provider: Provider, id: string): Found | null {
  for (const account of provider.accounts()) {
    const desk = provider.desk(account);
    const record = onShelf(desk.book.sessions, id);
    if (record !== undefined) return { desk, record };
  }
  return null;
}

function missing(response: Response): void {
  response.status(404).send(closedPage('No such page', 'This payment page does not exist.'));
}

/** A second submit of a paid session goes where the first went; an expired one is refused. */
function refuseClosed({ desk, record }: Found, response: Response): boolean {
  const { session } = record;
  if (session.status === 'open' && session.expires_at <= desk.now()) expireSession(desk, session);
  if (session.status === 'complete') response.redirect(303, successUrl(record));
  if (session.status === 'expired') {
    response
      .status(410)
      .send(closedPage('This page has expired', 'Nothing was charged. Ask for a new link.'));
  }
  return session.status !== 'open';
}

function successUrl({ session }: SessionRecord): string {
  return (session.success_url ?? '/').replaceAll('{CHECKOUT_SESSION_ID}', session.id);
}

interface Typed {
  email?: string;
  card?: string;
  error?: string;
}

function show({ desk, record }: Found, response: Response, status: number, typed: Typed): void {
  const view = { email: typed.email ?? '', card: typed.card ?? 'pays', error: typed.error ?? null };
  response.status(status).send(checkoutPage({ record, seller: sellerOf(desk), ...view }));
}

function sellerOf(desk: Desk): string {
  const account = desk.state.accounts[desk.account ?? desk.state.platformId];
  return account?.business_profile?.name ?? account?.email ?? 'test shop';
}

function submit(found: Found, request: Request, response: Response): void {
  const { session } = found.record;
  const email = session.customer_email ?? session.customer_details?.email ?? fieldOf(request, 'email').trim();
  const typed = { email, card: fieldOf(request, 'card') };
  const card = cardByName(typed.card);
  if (!isEmail(email)) return show(found, response, 422, { ...typed, error: 'Enter an email address.' });
  if (card === undefined) return show(found, response, 422, { ...typed, error: 'Choose a card.' });
  if (pay(found, card, email)) return response.redirect(303, successUrl(found.record));
  show(found, response, 402, { ...typed, error: declineMessage(card.declinesNow ?? '') });
}

function pay({ desk, record }: Found, card: TestCard, email: string): boolean {
  const act = record.session.mode === 'payment' ? paySession : subscribeSession;
  return act(desk, record, card, email);
}
