import type Stripe from 'stripe';

export interface RefundSource {
  id: string;
  charge: Stripe.Charge;
  amountCents: number;
  reason: Stripe.Refund.Reason | null;
  metadata: Stripe.Metadata;
  balanceTransaction: string;
  now: number;
}

export function buildRefund(from: RefundSource): Stripe.Refund {
  return {
    id: from.id,
    object: 'refund',
    amount: from.amountCents,
    balance_transaction: from.balanceTransaction,
    charge: from.charge.id,
    created: from.now,
    currency: from.charge.currency,
    customer: from.charge.customer,
    customer_account: null,
    destination_details: { card: { type: 'refund' }, type: 'card' },
    metadata: from.metadata,
    payment_intent: from.charge.payment_intent,
    payment_method: from.charge.payment_method,
    reason: from.reason,
    receipt_number: null,
    source_transfer_reversal: null,
    status: 'succeeded',
    transfer_reversal: null,
  };
}
