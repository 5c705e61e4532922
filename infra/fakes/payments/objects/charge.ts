import type Stripe from 'stripe';
import { declineMessage, type TestCard } from '../cards.js';
import { newId } from '../ids.js';
import { emptyAddress } from './address.js';
import { cardDetails } from './charge-card-details.js';
import { listOf } from './list.js';

export interface ChargeSource {
  intent: Stripe.PaymentIntent;
  card: TestCard;
  paymentMethod: string;
  email: string | null;
  /** Null when the charge went through. */
  declineCode: string | null;
  balanceTransaction: string | null;
  now: number;
}

export function buildCharge(from: ChargeSource): Stripe.Charge {
  const id = newId('ch_');
  const paid = from.declineCode === null;
  const { intent } = from;
  return {
    id,
    object: 'charge',
    amount: intent.amount,
    amount_captured: paid ? intent.amount : 0,
    amount_refunded: 0,
    application: null,
    application_fee: null,
    application_fee_amount: null,
    balance_transaction: from.balanceTransaction,
    billing_details: { address: emptyAddress(), email: from.email, name: null, phone: null, tax_id: null },
    calculated_statement_descriptor: null,
    captured: paid,
    created: from.now,
    currency: intent.currency,
    customer: intent.customer,
    description: intent.description,
    disputed: false,
    failure_balance_transaction: null,
    failure_code: paid ? null : 'card_declined',
    failure_message: from.declineCode === null ? null : declineMessage(from.declineCode),
    fraud_details: {},
    livemode: false,
    metadata: { ...intent.metadata },
    on_behalf_of: null,
    outcome: outcomeOf(from.declineCode),
    paid,
    payment_intent: intent.id,
    payment_method: from.paymentMethod,
    payment_method_details: cardDetails(from.card, intent.amount),
    receipt_email: intent.receipt_email,
    receipt_number: null,
    receipt_url: null,
    refunded: false,
    refunds: listOf<Stripe.Refund>([], `/v1/charges/${id}/refunds`),
    review: null,
    shipping: null,
    source: null,
    source_transfer: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: paid ? 'succeeded' : 'failed',
    transfer_data: null,
    transfer_group: null,
  };
}

function outcomeOf(declineCode: string | null): Stripe.Charge.Outcome {
  const paid = declineCode === null;
  return {
    advice_code: null,
    network_advice_code: null,
    network_decline_code: null,
    network_status: paid ? 'approved_by_network' : 'declined_by_network',
    reason: declineCode,
    seller_message: paid ? 'Payment complete.' : 'The bank did not say why.',
    type: paid ? 'authorized' : 'issuer_declined',
  };
}
