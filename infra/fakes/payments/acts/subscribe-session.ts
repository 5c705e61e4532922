import type Stripe from 'stripe';
import type { TestCard } from '../cards.js';
import type { Desk } from '../desk.js';
import { newId } from '../ids.js';
import type { SessionRecord } from '../state/book.js';
import { nextPeriodEnd } from '../calendar.js';
import { buildCustomer } from '../objects/customer.js';
import { buildPaymentIntent } from '../objects/payment-intent.js';
import { buildPaymentMethod } from '../objects/payment-method.js';
import { buildSubscription } from '../objects/subscription.js';
import { buildSubscriptionItem } from '../objects/subscription-item.js';
import { chargeCard } from './charge-card.js';
import { completeSession } from './complete-session.js';
import { billSubscription, collect, stepMonths } from './invoicing.js';

/** Starts the subscription of an open session. A card that is declined leaves the session open. */
export function subscribeSession(desk: Desk, record: SessionRecord, card: TestCard, email: string): boolean {
  if (card.declinesNow !== null) return declineStart(desk, record, card, card.declinesNow, email);
  const customer = customerOf(desk, record, email);
  const paymentMethod = buildPaymentMethod({ card, email, customer: customer.id, now: desk.now() });
  desk.book.paymentMethods[paymentMethod.id] = paymentMethod;
  const subscription = openSubscription(desk, record, customer, paymentMethod.id);
  desk.publish('customer.subscription.created', subscription);
  const invoice = billSubscription(desk, subscription, 'subscription_create');
  collect(desk, subscription, invoice, { cardPresent: true });
  const { session } = record;
  session.customer = customer.id;
  session.subscription = subscription.id;
  session.invoice = invoice.id;
  completeSession(desk, session, email, invoice.amount_paid > 0 ? 'paid' : 'no_payment_required');
  return true;
}

function customerOf(desk: Desk, record: SessionRecord, email: string): Stripe.Customer {
  const held = typeof record.session.customer === 'string' ? record.session.customer : null;
  const known = held === null ? undefined : desk.book.customers[held];
  if (known !== undefined) return known;
  const fresh = buildCustomer({
    email,
    name: null,
    phone: null,
    description: null,
    metadata: {},
    now: desk.now(),
  });
  desk.book.customers[fresh.id] = fresh;
  return fresh;
}

function openSubscription(
  desk: Desk,
  record: SessionRecord,
  customer: Stripe.Customer,
  paymentMethod: string,
): Stripe.Subscription {
  const id = newId('sub_');
  const now = desk.now();
  const items = record.lines.map((line) => itemOf(id, line, now, record.trialEnd));
  const subscription = buildSubscription({
    id,
    customer: customer.id,
    items,
    currency: record.session.currency ?? 'usd',
    paymentMethod,
    metadata: { ...record.subscriptionMetadata },
    trialEnd: record.trialEnd,
    now,
  });
  customer.currency = subscription.currency;
  desk.book.subscriptions[id] = subscription;
  return subscription;
}

function itemOf(
  id: string,
  line: Stripe.LineItem,
  now: number,
  trialEnd: number | null,
): Stripe.SubscriptionItem {
  if (line.price === null) throw new Error('A subscription line has no price');
  const periodEnd = trialEnd ?? nextPeriodEnd(now, now, stepMonths(line.price));
  const quantity = line.quantity ?? 1;
  return buildSubscriptionItem({
    subscription: id,
    price: line.price,
    quantity,
    periodStart: now,
    periodEnd,
    now,
  });
}

/** During a trial nothing is charged, so a refused card leaves no payment behind. */
function declineStart(
  desk: Desk,
  record: SessionRecord,
  card: TestCard,
  declineCode: string,
  email: string,
): false {
  if (record.trialEnd !== null) return false;
  const customer = typeof record.session.customer === 'string' ? record.session.customer : null;
  const now = desk.now();
  const intent = buildPaymentIntent({
    amountCents: record.session.amount_total ?? 0,
    currency: record.session.currency ?? 'usd',
    customer,
    description: 'Subscription creation',
    metadata: {},
    now,
  });
  const paymentMethod = buildPaymentMethod({ card, email, customer, now });
  chargeCard(desk, { intent, card, paymentMethod, email, declineCode });
  return false;
}
