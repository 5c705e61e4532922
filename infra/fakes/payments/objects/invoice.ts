import type Stripe from 'stripe';
import { newId } from '../ids.js';
import { listOf } from './list.js';

export interface InvoiceSource {
  customer: Stripe.Customer;
  subscription: Stripe.Subscription;
  lines: Stripe.InvoiceLineItem[];
  reason: 'subscription_create' | 'subscription_cycle' | 'subscription_update';
  number: string;
  periodStart: number;
  periodEnd: number;
  now: number;
}

/** A finalized, unpaid invoice. A credit balance of the customer (negative cents) is taken off what is due. */
export function buildInvoice(from: InvoiceSource): Stripe.Invoice {
  const id = newId('in_');
  const lines = from.lines.map((line) => ({ ...line, invoice: id }));
  return {
    id,
    object: 'invoice',
    ...amounts(from),
    ...billedTo(from.customer),
    ...whatIsNotUsed(),
    attempt_count: 0,
    attempted: false,
    auto_advance: true,
    billing_reason: from.reason,
    collection_method: 'charge_automatically',
    created: from.now,
    currency: from.subscription.currency,
    effective_at: from.now,
    lines: listOf(lines, `/v1/invoices/${id}/lines`),
    livemode: false,
    metadata: {},
    next_payment_attempt: null,
    number: from.number,
    parent: parentOf(from.subscription),
    period_end: from.periodEnd,
    period_start: from.periodStart,
    status: 'open',
    status_transitions: {
      finalized_at: from.now,
      marked_uncollectible_at: null,
      paid_at: null,
      voided_at: null,
    },
    webhooks_delivered_at: from.now,
  };
}

function amounts(from: InvoiceSource) {
  const total = from.lines.reduce((sum, line) => sum + line.amount, 0);
  const due = total + from.customer.balance;
  return {
    amount_due: Math.max(0, due),
    amount_overpaid: 0,
    amount_paid: 0,
    amount_remaining: Math.max(0, due),
    amount_shipping: 0,
    ending_balance: Math.min(0, due),
    post_payment_credit_notes_amount: 0,
    pre_payment_credit_notes_amount: 0,
    starting_balance: from.customer.balance,
    subtotal: total,
    subtotal_excluding_tax: total,
    total,
    total_excluding_tax: total,
  } satisfies Partial<Stripe.Invoice>;
}

function billedTo(customer: Stripe.Customer) {
  return {
    customer: customer.id,
    customer_account: null,
    customer_address: null,
    customer_email: customer.email,
    customer_name: customer.name ?? null,
    customer_phone: customer.phone ?? null,
    customer_shipping: null,
    customer_tax_exempt: 'none',
    customer_tax_ids: [],
  } satisfies Partial<Stripe.Invoice>;
}

function parentOf(subscription: Stripe.Subscription): Stripe.Invoice.Parent {
  return {
    quote_details: null,
    subscription_details: { metadata: { ...subscription.metadata }, subscription: subscription.id },
    type: 'subscription_details',
  };
}

/** Everything of an invoice that our product has no call for. */
function whatIsNotUsed() {
  return {
    account_country: 'US',
    account_name: null,
    account_tax_ids: null,
    application: null,
    automatic_tax: { disabled_reason: null, enabled: false, liability: null, provider: null, status: null },
    automatically_finalizes_at: null,
    custom_fields: null,
    default_payment_method: null,
    default_source: null,
    default_tax_rates: [],
    description: null,
    discounts: [],
    due_date: null,
    footer: null,
    from_invoice: null,
    hosted_invoice_url: null,
    invoice_pdf: null,
    issuer: { type: 'self' },
    last_finalization_error: null,
    latest_revision: null,
    on_behalf_of: null,
    payment_settings: { default_mandate: null, payment_method_options: null, payment_method_types: null },
    receipt_number: null,
    rendering: null,
    shipping_cost: null,
    shipping_details: null,
    statement_descriptor: null,
    test_clock: null,
    total_discount_amounts: [],
    total_pretax_credit_amounts: [],
    total_taxes: [],
  } satisfies Partial<Stripe.Invoice>;
}
