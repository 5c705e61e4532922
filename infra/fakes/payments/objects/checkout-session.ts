import type Stripe from 'stripe';
import { emptyAddress } from './address.js';

export interface SessionSource {
  id: string;
  mode: 'payment' | 'subscription';
  /** What is due now, integer cents. */
  amountCents: number;
  currency: string;
  customer: string | null;
  customerEmail: string | null;
  allowedMethods: string[] | null;
  clientReferenceId: string | null;
  metadata: Stripe.Metadata;
  successUrl: string;
  cancelUrl: string | null;
  locale: Stripe.Checkout.Session.Locale | null;
  expiresAt: number;
  url: string;
  now: number;
}

export function buildCheckoutSession(from: SessionSource): Stripe.Checkout.Session {
  return {
    id: from.id,
    object: 'checkout.session',
    ...whatIsSold(from),
    ...whoPays(from),
    ...whatIsNotOffered(),
    client_reference_id: from.clientReferenceId,
    cancel_url: from.cancelUrl,
    created: from.now,
    expires_at: from.expiresAt,
    invoice: null,
    livemode: false,
    locale: from.locale,
    metadata: from.metadata,
    payment_intent: null,
    payment_status: 'unpaid',
    status: 'open',
    subscription: null,
    success_url: from.successUrl,
    ui_mode: 'hosted_page',
    url: from.url,
  };
}

function whatIsSold(from: SessionSource) {
  return {
    amount_subtotal: from.amountCents,
    amount_total: from.amountCents,
    currency: from.currency,
    mode: from.mode,
    total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
  } satisfies Partial<Stripe.Checkout.Session>;
}

function whoPays(from: SessionSource) {
  return {
    allowed_payment_method_types: from.allowedMethods,
    collected_information: null,
    customer: from.customer,
    customer_account: null,
    customer_creation: customerCreation(from),
    customer_details: from.customerEmail === null ? null : payerDetails(from.customerEmail),
    customer_email: from.customer === null ? from.customerEmail : null,
    payment_method_collection: from.mode === 'subscription' ? 'always' : 'if_required',
    payment_method_options: {},
    payment_method_types: ['card'],
  } satisfies Partial<Stripe.Checkout.Session>;
}

function customerCreation(from: SessionSource): Stripe.Checkout.Session.CustomerCreation | null {
  if (from.customer !== null) return null;
  return from.mode === 'subscription' ? 'always' : 'if_required';
}

export function payerDetails(email: string): Stripe.Checkout.Session.CustomerDetails {
  return {
    address: emptyAddress(),
    business_name: null,
    email,
    individual_name: null,
    name: null,
    phone: null,
    tax_exempt: 'none',
    tax_ids: null,
  };
}

/** Everything of a session that our product has no call for. */
function whatIsNotOffered() {
  return {
    adaptive_pricing: null,
    after_expiration: null,
    allow_promotion_codes: null,
    automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    billing_address_collection: null,
    client_secret: null,
    consent: null,
    consent_collection: null,
    currency_conversion: null,
    custom_fields: [],
    custom_text: {
      after_submit: null,
      shipping_address: null,
      submit: null,
      terms_of_service_acceptance: null,
    },
    discounts: [],
    integration_identifier: null,
    invoice_creation: null,
    managed_payments: null,
    origin_context: null,
    payment_link: null,
    payment_method_configuration_details: null,
    permissions: null,
    phone_number_collection: { enabled: false },
    recovered_from: null,
    saved_payment_method_options: null,
    setup_intent: null,
    shipping_address_collection: null,
    shipping_cost: null,
    shipping_options: [],
    submit_type: null,
    wallet_options: null,
  } satisfies Partial<Stripe.Checkout.Session>;
}
