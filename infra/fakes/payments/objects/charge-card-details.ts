import type Stripe from 'stripe';
import type { TestCard } from '../cards.js';

/** The card as a charge shows it: brand and last four digits, never a number. */
export function cardDetails(card: TestCard, amountCents: number): Stripe.Charge.PaymentMethodDetails {
  return {
    type: 'card',
    card: {
      amount_authorized: card.declinesNow === null ? amountCents : null,
      authorization_code: null,
      brand: card.brand,
      checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: 'pass' },
      country: 'US',
      electronic_commerce_indicator: null,
      exp_month: card.expMonth,
      exp_year: card.expYear,
      extended_authorization: { status: 'disabled' },
      fingerprint: card.fingerprint,
      funding: 'credit',
      incremental_authorization: { status: 'unavailable' },
      installments: null,
      last4: card.last4,
      mandate: null,
      multicapture: { status: 'unavailable' },
      network: card.brand,
      network_token: { used: false },
      network_transaction_id: null,
      overcapture: { maximum_amount_capturable: amountCents, status: 'unavailable' },
      regulated_status: null,
      three_d_secure: null,
      transaction_link_id: null,
      wallet: null,
    },
  };
}
