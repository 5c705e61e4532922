import type Stripe from 'stripe';

/** Every part there, none known. */
export function emptyAddress(): Stripe.Address {
  return { city: null, country: null, line1: null, line2: null, postal_code: null, state: null };
}
