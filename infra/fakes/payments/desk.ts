import type Stripe from 'stripe';
import type { Book } from './state/book.js';
import type { State } from './state/state.js';

/** What made a change: an API request, or nothing for hosted pages and the passing of time. */
export interface Cause {
  requestId: string | null;
  idempotencyKey: string | null;
}

export const NO_CAUSE: Cause = { requestId: null, idempotencyKey: null };

/** The event types this provider sends: those our product listens to. */
export const EVENT_TYPES = [
  'account.updated',
  'charge.refunded',
  'charge.succeeded',
  'checkout.session.completed',
  'checkout.session.expired',
  'customer.subscription.created',
  'customer.subscription.deleted',
  'customer.subscription.paused',
  'customer.subscription.resumed',
  'customer.subscription.trial_will_end',
  'customer.subscription.updated',
  'invoice.paid',
  'invoice.payment_failed',
  'payment_intent.payment_failed',
  'payment_intent.succeeded',
] as const satisfies readonly Stripe.Event['type'][];

export type EventType = (typeof EVENT_TYPES)[number];

/** One account's books, open for one piece of work. */
export interface Desk {
  state: State;
  book: Book;
  /** The connected account, or null for the platform. */
  account: string | null;
  /** Unix seconds by the provider's clock. */
  now(): number;
  /** Address of a hosted page. */
  url(path: string): string;
  /** Sends an event about the object as it is now; `previous` holds the old values of what changed. */
  publish(type: EventType, object: object, previous?: object): void;
}
