import type Stripe from 'stripe';
import type { Endpoint } from '../webhooks/endpoint.js';
import type { Delivery } from '../webhooks/delivery.js';
import { emptyBook, type Book } from './book.js';

/** An onboarding page that was handed out for a connected account. */
export interface LinkRecord {
  account: string;
  refreshUrl: string;
  returnUrl: string;
  expiresAt: number;
  used: boolean;
}

/** What was answered to an idempotency key; `answer` is null while the first request still runs. */
export interface KeyRecord {
  fingerprint: string;
  createdAt: number;
  answer: { status: number; body: string; requestId: string } | null;
}

/** All that the provider knows, in plain JSON so that one file can keep it. */
export interface State {
  platformId: string;
  /** Seconds the provider's clock runs ahead of the real one; tests move it. */
  clockAheadSeconds: number;
  /** By connected account id, or `platform`. */
  books: Record<string, Book>;
  accounts: Record<string, Stripe.Account>;
  links: Record<string, LinkRecord>;
  events: Stripe.EventBase[];
  deliveries: Delivery[];
  endpoints: Endpoint[];
  keys: Record<string, KeyRecord>;
}

export function emptyState(platformId: string, endpoints: Endpoint[]): State {
  return {
    platformId,
    clockAheadSeconds: 0,
    books: { platform: emptyBook() },
    accounts: {},
    links: {},
    events: [],
    deliveries: [],
    endpoints,
    keys: {},
  };
}
