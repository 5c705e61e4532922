import type Stripe from 'stripe';

export function buildPortalSession(from: {
  id: string;
  customer: string;
  configuration: string;
  returnUrl: string | null;
  url: string;
  now: number;
}): Stripe.BillingPortal.Session {
  return {
    id: from.id,
    object: 'billing_portal.session',
    configuration: from.configuration,
    created: from.now,
    customer: from.customer,
    customer_account: null,
    flow: null,
    livemode: false,
    locale: null,
    on_behalf_of: null,
    return_url: from.returnUrl,
    url: from.url,
  };
}
