import Stripe from 'stripe';
import { conflict, ProblemError } from '../../platform/http/problem-error.js';
import type { Payments } from '../../platform/payments/payments-client.js';
import type { CardCheckout } from './card-checkout.entity.js';
import type { Invoice } from './invoice.entity.js';

/** Where the provider's page sends the customer's browser back to. */
export type ReturnAddress = { paid: string; canceled: string };

/**
 * Makes the payment page in the shop's connected account. The checkout's id is the idempotency key, and everything sent
 * is kept with the checkout or the issued invoice, so that a repeated call is the same call.
 *
 * @throws conflict when the provider refuses, not-ready when it cannot be reached
 */
export async function createSession(
  payments: Payments,
  checkout: CardCheckout,
  invoice: Invoice,
  back: ReturnAddress,
): Promise<Stripe.Checkout.Session> {
  const options = { stripeAccount: checkout.accountId, idempotencyKey: `card-checkout-${checkout.id}` };
  try {
    return await payments.checkout.sessions.create(sessionOf(checkout, invoice, back), options);
  } catch (error) {
    throw problemOf(error);
  }
}

/** Whether the provider answered at all; a call that got no answer is repeated with the same key. */
export const wasRefused = (error: unknown): boolean =>
  error instanceof ProblemError && error.code === 'conflict';

function sessionOf(
  checkout: CardCheckout,
  invoice: Invoice,
  back: ReturnAddress,
): Stripe.Checkout.SessionCreateParams {
  const metadata = { shopId: invoice.shopId, invoiceId: invoice.id, checkoutId: checkout.id };
  return {
    mode: 'payment',
    // What is paid by bank debit settles days later, or fails after the page is over: neither is a card payment.
    allowed_payment_method_types: ['card'],
    line_items: [
      {
        quantity: 1,
        price_data: {
          currency: (invoice.frame?.currency ?? 'USD').toLowerCase(),
          unit_amount: checkout.amountCents,
          product_data: { name: `Invoice ${invoice.number}` },
        },
      },
    ],
    client_reference_id: checkout.id,
    ...(checkout.payerEmail ? { customer_email: checkout.payerEmail } : {}),
    metadata,
    payment_intent_data: { metadata, description: `Invoice ${invoice.number}` },
    success_url: back.paid,
    cancel_url: back.canceled,
  };
}

function problemOf(error: unknown): unknown {
  if (error instanceof Stripe.errors.StripeConnectionError)
    return new ProblemError('not-ready', 'The card payment page cannot be reached. Try again in a minute.');
  if (error instanceof Stripe.errors.StripeError)
    return conflict('The card payment page could not be opened. Try again, or ask the shop how to pay.');
  return error;
}
