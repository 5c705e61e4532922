import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { payerDetails } from '../objects/checkout-session.js';

export function completeSession(
  desk: Desk,
  session: Stripe.Checkout.Session,
  email: string,
  paymentStatus: 'paid' | 'no_payment_required',
): void {
  session.status = 'complete';
  session.payment_status = paymentStatus;
  session.customer_details = payerDetails(email);
  session.url = null;
  desk.publish('checkout.session.completed', session);
}

/** Closes an open session that nobody paid. */
export function expireSession(desk: Desk, session: Stripe.Checkout.Session): void {
  session.status = 'expired';
  session.url = null;
  desk.publish('checkout.session.expired', session);
}
