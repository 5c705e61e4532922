import type { RequestHandler } from 'express';
import type Stripe from 'stripe';
import { isDuplicateKey } from '../database/retry.js';
import { insertRows } from '../database/statements.js';
import type { UnitOfWork } from '../database/unit-of-work.js';
import { ProblemError } from '../http/problem-error.js';
import { enqueue } from '../outbox/outbox.js';
import type { Payments } from './payments-client.js';
import { WebhookEvent } from './webhook-event.entity.js';

export const PAYMENT_EVENT = 'payment-event';
/** What a slice does about one type of event. Runs from the outbox, possibly more than once, in any order. */
export type PaymentEventHandler = (event: Stripe.Event) => Promise<void>;

const TOLERANCE_SECONDS = 300;
type Options = { payments: Payments; secret: string; work: UnitOfWork; clock: () => Date };

/**
 * Takes the provider's events in: checks the signature and its time on both sides (the SDK lets stamps from the future
 * pass), keeps the event once, and answers before any heavy work, which the outbox does.
 */
export function paymentsWebhook({ payments, secret, work, clock }: Options): RequestHandler {
  return async (request, response) => {
    const signature = request.get('stripe-signature') ?? '';
    const event = readEvent(payments, request.body as Buffer, signature, secret);
    await work
      .transaction(
        { author: { kind: 'system' }, requestId: String(request.id), now: clock() },
        async (scope) => {
          await insertRows(scope.manager, WebhookEvent, [
            { id: event.id, type: event.type, receivedAt: scope.now },
          ]);
          await enqueue(scope, PAYMENT_EVENT, event);
        },
      )
      .catch((error: unknown) => {
        if (!isDuplicateKey(error)) throw error;
      });
    response.json({ received: true });
  };
}

/**
 * Measures the stamp by the machine's own clock, not by the one the product was given: it says when the bytes crossed the
 * wire, and a demo or a test that lives in another year still talks to a provider of today.
 */
function readEvent(payments: Payments, body: Buffer, signature: string, secret: string): Stripe.Event {
  const stamp = Number(/(?:^|,)t=(\d{1,12})(?:,|$)/.exec(signature)?.[1] ?? 0);
  if (!Buffer.isBuffer(body) || Math.abs(Date.now() / 1000 - stamp) > TOLERANCE_SECONDS) throw forged();
  try {
    return payments.webhooks.constructEvent(body, signature, secret, TOLERANCE_SECONDS);
  } catch {
    throw forged();
  }
}

const forged = () => new ProblemError('malformed-request', 'The signature does not fit.');
