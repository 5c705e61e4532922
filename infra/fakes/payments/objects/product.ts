import type Stripe from 'stripe';

export function buildProduct(from: {
  id: string;
  name: string;
  description: string | null;
  now: number;
}): Stripe.Product {
  return {
    id: from.id,
    object: 'product',
    active: true,
    created: from.now,
    default_price: null,
    description: from.description,
    images: [],
    livemode: false,
    marketing_features: [],
    metadata: {},
    name: from.name,
    package_dimensions: null,
    shippable: null,
    statement_descriptor: null,
    tax_code: null,
    tax_details: null,
    type: 'service',
    unit_label: null,
    updated: from.now,
    url: null,
  };
}
