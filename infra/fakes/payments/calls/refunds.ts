import type Stripe from 'stripe';
import { refundCharge } from '../acts/refund-charge.js';
import type { Desk } from '../desk.js';
import { onShelf } from '../state/book.js';
import { call, expandable, type Call } from '../wire/call.js';
import { invalid, noSuch } from '../wire/error.js';
import { mergeMetadata, metadata } from '../wire/metadata.js';
import { integer, oneOf, text } from '../wire/scalars.js';
import { fields, may, type Names } from '../wire/spec.js';

const create = call({
  method: 'post',
  path: '/v1/refunds',
  params: fields({
    amount: may(integer(1, 99_999_999)),
    charge: may(text()),
    metadata: may(metadata()),
    payment_intent: may(text()),
    reason: may(oneOf('duplicate', 'fraudulent', 'requested_by_customer')),
    ...expandable,
  } satisfies Names<Stripe.RefundCreateParams>),
  run(desk, params) {
    const charge = chargeOf(desk, params.charge, params.payment_intent);
    return refundCharge(desk, {
      charge,
      amountCents: params.amount,
      reason: params.reason ?? null,
      metadata: mergeMetadata({}, params.metadata),
    });
  },
});

function chargeOf(desk: Desk, charge: string | undefined, intent: string | undefined): Stripe.Charge {
  if ((charge === undefined) === (intent === undefined)) {
    throw invalid('Give one of these parameters: charge, payment_intent.', 'charge', 'parameter_missing');
  }
  const id = charge ?? chargeIdOf(desk, intent ?? '');
  const found = onShelf(desk.book.charges, id);
  if (found === undefined) throw noSuch('charge', id, 'charge', 404);
  return found;
}

function chargeIdOf(desk: Desk, intentId: string): string {
  const intent = onShelf(desk.book.paymentIntents, intentId);
  if (intent === undefined) throw noSuch('payment_intent', intentId, 'payment_intent', 404);
  if (intent.status !== 'succeeded' || typeof intent.latest_charge !== 'string') {
    throw invalid(`Payment ${intentId} has no successful charge to refund.`, 'payment_intent');
  }
  return intent.latest_charge;
}

export const refundCalls: Call[] = [create];
