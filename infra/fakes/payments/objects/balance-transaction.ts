import type Stripe from 'stripe';
import { newId } from '../ids.js';

const FEE_PER_MILLE = 29;
const FEE_FIXED_CENTS = 30;
const DAYS_TO_FUNDS = 2;

/** The provider's published US card fee, 2.9 % and 30 cents, rounded half up to the cent. */
export function cardFeeCents(amountCents: number): number {
  return Math.floor((amountCents * FEE_PER_MILLE + 500) / 1000) + FEE_FIXED_CENTS;
}

export interface MovementSource {
  kind: 'charge' | 'refund';
  /** Integer cents, negative for money that leaves. */
  amountCents: number;
  feeCents: number;
  currency: string;
  source: string;
  description: string | null;
  now: number;
}

export function buildBalanceTransaction(from: MovementSource): Stripe.BalanceTransaction {
  return {
    id: newId('txn_'),
    object: 'balance_transaction',
    amount: from.amountCents,
    available_on: from.now + DAYS_TO_FUNDS * 24 * 60 * 60,
    balance_type: 'payments',
    created: from.now,
    currency: from.currency,
    description: from.description,
    exchange_rate: null,
    fee: from.feeCents,
    fee_details: from.feeCents === 0 ? [] : [processingFee(from)],
    net: from.amountCents - from.feeCents,
    reporting_category: from.kind,
    source: from.source,
    status: 'pending',
    type: from.kind,
  };
}

function processingFee(from: MovementSource): Stripe.BalanceTransaction.FeeDetail {
  return {
    amount: from.feeCents,
    application: null,
    currency: from.currency,
    description: 'Card processing fee',
    type: 'stripe_fee',
  };
}
