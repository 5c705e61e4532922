import type Stripe from 'stripe';

/** The provider's list envelope. */
export function listOf<T>(data: T[], url: string, hasMore = false): Stripe.ApiList<T> {
  return { object: 'list', data, has_more: hasMore, url };
}
