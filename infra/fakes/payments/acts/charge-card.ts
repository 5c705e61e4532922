import type Stripe from 'stripe';
import { declineMessage, type TestCard } from '../cards.js';
import type { Desk } from '../desk.js';
import { buildBalanceTransaction, cardFeeCents } from '../objects/balance-transaction.js';
import { buildCharge } from '../objects/charge.js';

export interface CardOrder {
  intent: Stripe.PaymentIntent;
  card: TestCard;
  paymentMethod: Stripe.PaymentMethod;
  email: string | null;
  /** The provider's decline code, null when the charge goes through. */
  declineCode: string | null;
}

/**
 * Tries a payment once and says so in events. Gives whether it went through.
 * An intent that was declined may be tried again; each try leaves a charge.
 */
export function chargeCard(desk: Desk, order: CardOrder): boolean {
  desk.book.paymentMethods[order.paymentMethod.id] = order.paymentMethod;
  desk.book.paymentIntents[order.intent.id] = order.intent;
  const charge = buildCharge({
    ...order,
    paymentMethod: order.paymentMethod.id,
    balanceTransaction: null,
    now: desk.now(),
  });
  desk.book.charges[charge.id] = charge;
  order.intent.latest_charge = charge.id;
  if (order.declineCode === null) succeed(desk, order, charge);
  else decline(desk, order, charge, order.declineCode);
  return order.declineCode === null;
}

function succeed(desk: Desk, order: CardOrder, charge: Stripe.Charge): void {
  const { intent } = order;
  charge.balance_transaction = enterCharge(desk, charge);
  intent.status = 'succeeded';
  intent.amount_received = intent.amount;
  intent.payment_method = order.paymentMethod.id;
  intent.last_payment_error = null;
  desk.publish('charge.succeeded', charge);
  desk.publish('payment_intent.succeeded', intent);
}

function enterCharge(desk: Desk, charge: Stripe.Charge): string {
  const entry = buildBalanceTransaction({
    kind: 'charge',
    amountCents: charge.amount,
    feeCents: cardFeeCents(charge.amount),
    currency: charge.currency,
    source: charge.id,
    description: charge.description,
    now: desk.now(),
  });
  desk.book.balanceTransactions[entry.id] = entry;
  return entry.id;
}

function decline(desk: Desk, order: CardOrder, charge: Stripe.Charge, declineCode: string): void {
  const { intent } = order;
  intent.status = 'requires_payment_method';
  intent.payment_method = null;
  intent.last_payment_error = {
    type: 'card_error',
    code: 'card_declined',
    decline_code: declineCode,
    charge: charge.id,
    message: declineMessage(declineCode),
    payment_method: order.paymentMethod,
  };
  desk.publish('payment_intent.payment_failed', intent);
}
