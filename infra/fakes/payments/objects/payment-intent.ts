import type Stripe from 'stripe';
import { newId } from '../ids.js';

export interface IntentSource {
  /** Integer cents. */
  amountCents: number;
  currency: string;
  customer: string | null;
  description: string | null;
  metadata: Stripe.Metadata;
  now: number;
}

/** A payment that has been asked for and not yet tried. */
export function buildPaymentIntent(from: IntentSource): Stripe.PaymentIntent {
  const id = newId('pi_');
  return {
    id,
    object: 'payment_intent',
    allowed_payment_method_types: null,
    amount: from.amountCents,
    amount_capturable: 0,
    amount_details: { tip: {} },
    amount_received: 0,
    application: null,
    application_fee_amount: null,
    automatic_payment_methods: null,
    canceled_at: null,
    cancellation_reason: null,
    capture_method: 'automatic',
    client_secret: `${id}_secret_${newId('')}`,
    confirmation_method: 'automatic',
    created: from.now,
    currency: from.currency,
    customer: from.customer,
    customer_account: null,
    description: from.description,
    excluded_payment_method_types: null,
    last_payment_error: null,
    latest_charge: null,
    livemode: false,
    managed_payments: null,
    metadata: from.metadata,
    next_action: null,
    on_behalf_of: null,
    payment_method: null,
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: ['card'],
    payment_record: null,
    processing: null,
    receipt_email: null,
    review: null,
    setup_future_usage: null,
    shipping: null,
    source: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: 'requires_payment_method',
    transfer_data: null,
    transfer_group: null,
  };
}
