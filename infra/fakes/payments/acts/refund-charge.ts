import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { newId } from '../ids.js';
import { buildBalanceTransaction } from '../objects/balance-transaction.js';
import { buildRefund } from '../objects/refund.js';
import { invalid } from '../wire/error.js';

export interface RefundOrder {
  charge: Stripe.Charge;
  /** Integer cents; all that is left unless given. */
  amountCents: number | undefined;
  reason: Stripe.Refund.Reason | null;
  metadata: Stripe.Metadata;
}

/** Gives money back. Errors: 400 when nothing is left, or less than asked for. */
export function refundCharge(desk: Desk, order: RefundOrder): Stripe.Refund {
  const { charge } = order;
  const amountCents = refundable(charge, order.amountCents);
  const id = newId('re_');
  const entry = buildBalanceTransaction({
    kind: 'refund',
    amountCents: -amountCents,
    feeCents: 0,
    currency: charge.currency,
    source: id,
    description: charge.description,
    now: desk.now(),
  });
  desk.book.balanceTransactions[entry.id] = entry;
  const refund = buildRefund({ ...order, id, amountCents, balanceTransaction: entry.id, now: desk.now() });
  desk.book.refunds[id] = refund;
  noteOnCharge(desk, charge, refund);
  return refund;
}

function refundable(charge: Stripe.Charge, asked: number | undefined): number {
  const left = charge.amount_captured - charge.amount_refunded;
  if (left <= 0)
    throw invalid(`Charge ${charge.id} has already been refunded.`, undefined, 'charge_already_refunded');
  if (asked !== undefined && asked > left) {
    throw invalid(`Refund amount (${asked}) is greater than unrefunded amount on charge (${left})`, 'amount');
  }
  return asked ?? left;
}

function noteOnCharge(desk: Desk, charge: Stripe.Charge, refund: Stripe.Refund): void {
  const previous = { amount_refunded: charge.amount_refunded, refunded: charge.refunded };
  charge.amount_refunded += refund.amount;
  charge.refunded = charge.amount_refunded === charge.amount_captured;
  charge.refunds?.data.unshift(refund);
  desk.publish('charge.refunded', charge, previous);
}
