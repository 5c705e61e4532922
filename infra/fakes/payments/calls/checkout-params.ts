import type Stripe from 'stripe';
import { expandable } from '../wire/call.js';
import { metadata } from '../wire/metadata.js';
import { email, integer, oneOf, text, url } from '../wire/scalars.js';
import { fields, list, may, must, type Names } from '../wire/spec.js';

type Create = Stripe.Checkout.SessionCreateParams;

const MOST_CENTS = 99_999_999;

const productData = fields({
  description: may(text()),
  name: must(text()),
} satisfies Names<Stripe.Checkout.SessionCreateParams.LineItem.PriceData.ProductData>);

const priceData = fields({
  currency: must(oneOf('usd')),
  product_data: must(productData),
  unit_amount: must(integer(0, MOST_CENTS)),
} satisfies Names<Stripe.Checkout.SessionCreateParams.LineItem.PriceData>);

const lineItem = fields({
  price: may(text()),
  price_data: may(priceData),
  quantity: must(integer(1, 1_000_000)),
} satisfies Names<Stripe.Checkout.SessionCreateParams.LineItem>);

const paymentIntentData = fields({
  description: may(text()),
  metadata: may(metadata()),
} satisfies Names<Stripe.Checkout.SessionCreateParams.PaymentIntentData>);

const subscriptionData = fields({
  metadata: may(metadata()),
  trial_end: may(integer()),
} satisfies Names<Stripe.Checkout.SessionCreateParams.SubscriptionData>);

/** Every parameter our product sends when it asks for a checkout page. */
export const checkoutCreateParams = fields({
  allowed_payment_method_types: may(list(oneOf('card'))),
  cancel_url: may(url()),
  client_reference_id: may(text(200)),
  customer: may(text()),
  customer_email: may(email()),
  expires_at: may(integer()),
  line_items: must(list(lineItem)),
  locale: may(oneOf('auto', 'en')),
  metadata: may(metadata()),
  mode: must(oneOf('payment', 'subscription')),
  payment_intent_data: may(paymentIntentData),
  subscription_data: may(subscriptionData),
  success_url: must(url()),
  ...expandable,
} satisfies Names<Create>);

export type CheckoutCreate = ReturnType<typeof checkoutCreateParams.read>;
