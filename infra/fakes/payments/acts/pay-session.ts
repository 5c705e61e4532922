import type Stripe from 'stripe';
import type { TestCard } from '../cards.js';
import type { Desk } from '../desk.js';
import type { SessionRecord } from '../state/book.js';
import { buildPaymentIntent } from '../objects/payment-intent.js';
import { buildPaymentMethod } from '../objects/payment-method.js';
import { chargeCard } from './charge-card.js';
import { completeSession } from './complete-session.js';

/** Pays an open session of mode `payment`. Gives whether the card went through; a decline leaves it open. */
export function paySession(desk: Desk, record: SessionRecord, card: TestCard, email: string): boolean {
  const { session } = record;
  const intent = intentOf(desk, record);
  const customer = typeof session.customer === 'string' ? session.customer : null;
  const paymentMethod = buildPaymentMethod({ card, email, customer, now: desk.now() });
  const paid = chargeCard(desk, { intent, card, paymentMethod, email, declineCode: card.declinesNow });
  if (paid) completeSession(desk, session, email, 'paid');
  return paid;
}

/** One intent a session, made at the first try and kept for the next. */
function intentOf(desk: Desk, record: SessionRecord): Stripe.PaymentIntent {
  const { session } = record;
  const held = typeof session.payment_intent === 'string' ? session.payment_intent : null;
  const known = held === null ? undefined : desk.book.paymentIntents[held];
  if (known !== undefined) return known;
  const fresh = buildPaymentIntent({
    amountCents: session.amount_total ?? 0,
    currency: session.currency ?? 'usd',
    customer: typeof session.customer === 'string' ? session.customer : null,
    description: record.intentDescription,
    metadata: { ...record.intentMetadata },
    now: desk.now(),
  });
  session.payment_intent = fresh.id;
  return fresh;
}
