import Stripe from 'stripe';
import type { Cause, EventType } from '../desk.js';
import { newId } from '../ids.js';

export interface EventSource {
  type: EventType;
  object: object;
  /** Old values of what changed, for `updated` events. */
  previous: object | undefined;
  /** The connected account it happened on, null for the platform. */
  account: string | null;
  cause: Cause;
  /** How many receivers still have to take it. */
  pendingWebhooks: number;
  now: number;
}

export function buildEvent(from: EventSource): Stripe.EventBase {
  return {
    id: newId('evt_'),
    object: 'event',
    ...(from.account === null ? {} : { account: from.account }),
    api_version: Stripe.API_VERSION,
    created: from.now,
    data: {
      object: structuredCopy(from.object),
      ...(from.previous === undefined ? {} : { previous_attributes: structuredCopy(from.previous) }),
    },
    livemode: false,
    pending_webhooks: from.pendingWebhooks,
    request: { id: from.cause.requestId, idempotency_key: from.cause.idempotencyKey },
    type: from.type,
  };
}

/** The object as the wire shows it now, so that later changes do not reach into an event already sent. */
function structuredCopy(value: object): object {
  return JSON.parse(JSON.stringify(value)) as object;
}
