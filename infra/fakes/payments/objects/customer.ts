import type Stripe from 'stripe';
import { newId } from '../ids.js';

export interface CustomerSource {
  email: string | null;
  name: string | null;
  phone: string | null;
  description: string | null;
  metadata: Stripe.Metadata;
  now: number;
}

export function buildCustomer(from: CustomerSource): Stripe.Customer {
  return {
    id: newId('cus_', 14),
    object: 'customer',
    address: null,
    balance: 0,
    created: from.now,
    currency: null,
    default_source: null,
    delinquent: false,
    description: from.description,
    discount: null,
    email: from.email,
    invoice_prefix: newId('', 8).toUpperCase(),
    invoice_settings: noInvoiceSettings(),
    livemode: false,
    metadata: from.metadata,
    name: from.name,
    next_invoice_sequence: 1,
    phone: from.phone,
    preferred_locales: [],
    shipping: null,
    tax_exempt: 'none',
    test_clock: null,
  };
}

function noInvoiceSettings(): Stripe.Customer.InvoiceSettings {
  return { custom_fields: null, default_payment_method: null, footer: null, rendering_options: null };
}
