import type Stripe from 'stripe';
import type { TestCard } from '../cards.js';
import { newId } from '../ids.js';
import { emptyAddress } from './address.js';

export function buildPaymentMethod(from: {
  card: TestCard;
  email: string | null;
  customer: string | null;
  now: number;
}): Stripe.PaymentMethod {
  return {
    id: newId('pm_'),
    object: 'payment_method',
    allow_redisplay: 'limited',
    billing_details: { address: emptyAddress(), email: from.email, name: null, phone: null, tax_id: null },
    card: cardOf(from.card),
    created: from.now,
    customer: from.customer,
    customer_account: null,
    livemode: false,
    metadata: {},
    type: 'card',
  };
}

function cardOf(card: TestCard): Stripe.PaymentMethod.Card {
  return {
    brand: card.brand,
    checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: 'pass' },
    country: 'US',
    display_brand: card.brand,
    exp_month: card.expMonth,
    exp_year: card.expYear,
    fingerprint: card.fingerprint,
    funding: 'credit',
    generated_from: null,
    last4: card.last4,
    networks: { available: [card.brand], preferred: null },
    regulated_status: null,
    three_d_secure_usage: { supported: true },
    wallet: null,
  };
}
