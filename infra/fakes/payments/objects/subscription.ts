import type Stripe from 'stripe';
import { listOf } from './list.js';

export interface SubscriptionSource {
  id: string;
  customer: string;
  items: Stripe.SubscriptionItem[];
  currency: string;
  paymentMethod: string | null;
  metadata: Stripe.Metadata;
  /** Unix seconds, null without a trial. */
  trialEnd: number | null;
  now: number;
}

export function buildSubscription(from: SubscriptionSource): Stripe.Subscription {
  return {
    id: from.id,
    object: 'subscription',
    ...whatIsNotUsed(),
    billing_cycle_anchor: from.trialEnd ?? from.now,
    cancel_at: null,
    cancel_at_period_end: false,
    canceled_at: null,
    cancellation_details: { comment: null, feedback: null, feedback_option: null, reason: null },
    collection_method: 'charge_automatically',
    created: from.now,
    currency: from.currency,
    customer: from.customer,
    default_payment_method: from.paymentMethod,
    ended_at: null,
    items: listOf(from.items, `/v1/subscription_items?subscription=${from.id}`),
    latest_invoice: null,
    livemode: false,
    metadata: from.metadata,
    start_date: from.now,
    status: from.trialEnd === null ? 'active' : 'trialing',
    trial_end: from.trialEnd,
    trial_settings: {
      end_behavior: { billing_cycle_anchor: 'now', missing_payment_method: 'create_invoice' },
    },
    trial_start: from.trialEnd === null ? null : from.now,
  };
}

/** Everything of a subscription that our product has no call for. */
function whatIsNotUsed() {
  return {
    application: null,
    application_fee_percent: null,
    automatic_tax: { disabled_reason: null, enabled: false, liability: null },
    billing_cycle_anchor_config: null,
    billing_mode: { flexible: null, type: 'classic' },
    billing_schedules: [],
    billing_thresholds: null,
    customer_account: null,
    days_until_due: null,
    default_source: null,
    default_tax_rates: [],
    description: null,
    discounts: [],
    invoice_settings: {
      account_tax_ids: null,
      custom_fields: null,
      description: null,
      footer: null,
      issuer: { type: 'self' },
    },
    managed_payments: null,
    next_pending_invoice_item_invoice: null,
    on_behalf_of: null,
    pause_collection: null,
    payment_settings: {
      payment_method_options: null,
      payment_method_types: null,
      save_default_payment_method: 'off',
    },
    pending_invoice_item_interval: null,
    pending_setup_intent: null,
    pending_update: null,
    schedule: null,
    test_clock: null,
    transfer_data: null,
  } satisfies Partial<Stripe.Subscription>;
}
