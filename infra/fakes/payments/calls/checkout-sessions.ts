import type Stripe from 'stripe';
import { expireSession } from '../acts/complete-session.js';
import type { Desk } from '../desk.js';
import { newId } from '../ids.js';
import { buildCheckoutSession } from '../objects/checkout-session.js';
import { onShelf, type SessionRecord } from '../state/book.js';
import { call, expandable, type Call } from '../wire/call.js';
import { invalid, noSuch } from '../wire/error.js';
import { mergeMetadata } from '../wire/metadata.js';
import { fields, type Names } from '../wire/spec.js';
import { checkoutLines } from './checkout-lines.js';
import { checkoutCreateParams, type CheckoutCreate } from './checkout-params.js';
import { checkCheckout, checkTotal } from './checkout-rules.js';

const DAY_SECONDS = 24 * 60 * 60;

const create = call({
  method: 'post',
  path: '/v1/checkout/sessions',
  params: checkoutCreateParams,
  run(desk, params) {
    checkCheckout(desk, params);
    const lines = checkoutLines(desk, params);
    checkTotal(lines);
    const record: SessionRecord = {
      session: sessionFrom(desk, params, lines),
      lines,
      intentDescription: params.payment_intent_data?.description ?? null,
      intentMetadata: mergeMetadata({}, params.payment_intent_data?.metadata),
      subscriptionMetadata: mergeMetadata({}, params.subscription_data?.metadata),
      trialEnd: params.subscription_data?.trial_end ?? null,
    };
    desk.book.sessions[record.session.id] = record;
    return record.session;
  },
});

function sessionFrom(desk: Desk, params: CheckoutCreate, lines: Stripe.LineItem[]): Stripe.Checkout.Session {
  const id = newId('cs_test_a1', 56);
  const onTrial = params.subscription_data?.trial_end !== undefined;
  const customer = params.customer === undefined ? undefined : onShelf(desk.book.customers, params.customer);
  return buildCheckoutSession({
    id,
    mode: params.mode,
    amountCents: onTrial ? 0 : lines.reduce((sum, line) => sum + line.amount_total, 0),
    currency: lines[0]?.currency ?? 'usd',
    customer: params.customer ?? null,
    allowedMethods: params.allowed_payment_method_types ?? null,
    customerEmail: params.customer_email ?? customer?.email ?? null,
    clientReferenceId: params.client_reference_id ?? null,
    metadata: mergeMetadata({}, params.metadata),
    successUrl: params.success_url,
    cancelUrl: params.cancel_url ?? null,
    locale: params.locale ?? null,
    expiresAt: params.expires_at ?? desk.now() + DAY_SECONDS,
    url: desk.url(`/c/pay/${id}`),
    now: desk.now(),
  });
}

function sessionOf(desk: Desk, id: string): Stripe.Checkout.Session {
  const record = onShelf(desk.book.sessions, id);
  if (record === undefined) throw noSuch('checkout.session', id, 'session', 404);
  return record.session;
}

const retrieve = call({
  method: 'get',
  path: '/v1/checkout/sessions/:id',
  params: fields({ ...expandable } satisfies Names<Stripe.Checkout.SessionRetrieveParams>),
  run: (desk, _params, id) => sessionOf(desk, id),
});

const expire = call({
  method: 'post',
  path: '/v1/checkout/sessions/:id/expire',
  params: fields({ ...expandable } satisfies Names<Stripe.Checkout.SessionExpireParams>),
  run(desk, _params, id) {
    const session = sessionOf(desk, id);
    if (session.status !== 'open') {
      throw invalid(`Only an open session can be expired; this one is ${session.status}.`, 'session');
    }
    expireSession(desk, session);
    return session;
  },
});

export const checkoutSessionCalls: Call[] = [create, retrieve, expire];
