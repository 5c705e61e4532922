import Stripe from 'stripe';
import { newId } from '../ids.js';

export interface InvoiceLineSource {
  /** Integer cents, negative for a credit. */
  amountCents: number;
  description: string;
  item: Stripe.SubscriptionItem;
  quantity: number;
  periodStart: number;
  periodEnd: number;
  proration: boolean;
}

/** A line of a subscription's invoice. Its invoice is written in once that is known. */
export function buildInvoiceLine(from: InvoiceLineSource): Stripe.InvoiceLineItem {
  const { item } = from;
  return {
    id: newId('il_'),
    object: 'line_item',
    amount: from.amountCents,
    currency: item.price.currency,
    description: from.description,
    discount_amounts: [],
    discountable: !from.proration,
    discounts: [],
    invoice: null,
    livemode: false,
    metadata: {},
    parent: parentOf(from),
    period: { start: from.periodStart, end: from.periodEnd },
    pretax_credit_amounts: [],
    pricing: pricingOf(item.price),
    quantity: from.quantity,
    quantity_decimal: Stripe.Decimal.from(from.quantity),
    subscription: item.subscription,
    subtotal: from.amountCents,
    taxes: [],
  };
}

function parentOf(from: InvoiceLineSource): Stripe.InvoiceLineItem.Parent {
  return {
    invoice_item_details: null,
    subscription_item_details: {
      invoice_item: null,
      proration: from.proration,
      proration_details: { credited_items: null },
      subscription: from.item.subscription,
      subscription_item: from.item.id,
    },
    type: 'subscription_item_details',
  };
}

function pricingOf(price: Stripe.Price): Stripe.InvoiceLineItem.Pricing {
  const product = typeof price.product === 'string' ? price.product : price.product.id;
  return {
    price_details: { price: price.id, product },
    type: 'price_details',
    unit_amount_decimal: price.unit_amount_decimal,
  };
}
