import type Stripe from 'stripe';
import { newId } from '../ids.js';

export function buildCheckoutLine(from: {
  price: Stripe.Price;
  description: string;
  quantity: number;
}): Stripe.LineItem {
  const amount = (from.price.unit_amount ?? 0) * from.quantity;
  return {
    id: newId('li_'),
    object: 'item',
    adjustable_quantity: null,
    amount_discount: 0,
    amount_subtotal: amount,
    amount_tax: 0,
    amount_total: amount,
    currency: from.price.currency,
    description: from.description,
    metadata: {},
    price: from.price,
    quantity: from.quantity,
  };
}
