import type Stripe from 'stripe';

export function buildAccountLink(from: { url: string; expiresAt: number; now: number }): Stripe.AccountLink {
  return { object: 'account_link', created: from.now, expires_at: from.expiresAt, url: from.url };
}
