import type Stripe from 'stripe';
import type { TestCard } from '../cards.js';
import type { Desk } from '../desk.js';
import { buildPaymentMethod } from '../objects/payment-method.js';
import { changeSubscription } from './change-subscription.js';
import { customerOf } from './invoicing.js';

/** Puts another card on file. Gives false, and keeps the old one, when the new one is declined at once. */
export function changeCard(desk: Desk, subscription: Stripe.Subscription, card: TestCard): boolean {
  if (card.declinesNow !== null) return false;
  const customer = customerOf(desk, subscription);
  const fresh = buildPaymentMethod({ card, email: customer.email, customer: customer.id, now: desk.now() });
  desk.book.paymentMethods[fresh.id] = fresh;
  changeSubscription(desk, subscription, () => {
    subscription.default_payment_method = fresh.id;
  });
  return true;
}
