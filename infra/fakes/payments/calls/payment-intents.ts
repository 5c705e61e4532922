import type Stripe from 'stripe';
import { onShelf } from '../state/book.js';
import { call, expandable, type Call } from '../wire/call.js';
import { noSuch } from '../wire/error.js';
import { fields, type Names } from '../wire/spec.js';

const retrieve = call({
  method: 'get',
  path: '/v1/payment_intents/:id',
  params: fields({ ...expandable } satisfies Names<Stripe.PaymentIntentRetrieveParams>),
  run(desk, _params, id) {
    const intent = onShelf(desk.book.paymentIntents, id);
    if (intent === undefined) throw noSuch('payment_intent', id, 'intent', 404);
    return intent;
  },
});

export const paymentIntentCalls: Call[] = [retrieve];
