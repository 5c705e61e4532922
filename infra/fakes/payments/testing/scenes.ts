import type Stripe from 'stripe';
import { PRICE, type Rig } from './rig.js';

/** A connected account that has been through its onboarding page. */
export async function openAccount(rig: Rig): Promise<string> {
  const account = await rig.stripe.accounts.create({
    country: 'US',
    email: 'shop@example.com',
    type: 'standard',
  });
  const link = await rig.stripe.accountLinks.create({
    account: account.id,
    type: 'account_onboarding',
    refresh_url: 'http://shop.test/refresh',
    return_url: 'http://shop.test/return',
  });
  await rig.submit(link.url, { action: 'complete', business_name: 'Walnut Row Cabinets' });
  return account.id;
}

/** What a shop asks a customer to pay for an invoice: $1,250.00 unless given in cents. */
export function paymentParams(unitAmountCents = 125_000): Stripe.Checkout.SessionCreateParams {
  return {
    mode: 'payment',
    line_items: [
      {
        quantity: 1,
        price_data: { currency: 'usd', unit_amount: unitAmountCents, product_data: { name: 'Invoice 1042' } },
      },
    ],
    customer_email: 'customer@example.com',
    client_reference_id: 'invoice-1042',
    metadata: { invoice: '1042' },
    payment_intent_data: { metadata: { invoice: '1042' } },
    success_url: 'http://shop.test/paid?session={CHECKOUT_SESSION_ID}',
    cancel_url: 'http://shop.test/back',
  };
}

export interface Started {
  customer: string;
  subscription: string;
}

/** A shop's subscription, started through the checkout page with a test card. */
export async function subscribe(rig: Rig, quantity = 3, trialEnd?: number, card = 'pays'): Promise<Started> {
  const customer = await rig.stripe.customers.create({ email: 'owner@example.com', name: 'Walnut Row' });
  const session = await rig.stripe.checkout.sessions.create({
    mode: 'subscription',
    customer: customer.id,
    client_reference_id: 'shop-1',
    line_items: [{ price: PRICE, quantity }],
    subscription_data: {
      metadata: { shop: 'shop-1' },
      ...(trialEnd === undefined ? {} : { trial_end: trialEnd }),
    },
    success_url: 'http://app.test/done?session={CHECKOUT_SESSION_ID}',
    cancel_url: 'http://app.test/plan',
  });
  await rig.submit(session.url, { action: 'pay', card });
  const { subscription } = await rig.stripe.checkout.sessions.retrieve(session.id);
  return { customer: customer.id, subscription: String(subscription) };
}

export function inDays(days: number): number {
  return Math.floor(Date.now() / 1000) + days * 24 * 60 * 60;
}
