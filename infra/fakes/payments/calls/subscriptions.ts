import type Stripe from 'stripe';
import { endSubscription } from '../acts/change-subscription.js';
import { updateSubscription } from '../acts/update-subscription.js';
import type { Desk } from '../desk.js';
import { onShelf } from '../state/book.js';
import { call, expandable, type Call } from '../wire/call.js';
import { invalid, noSuch } from '../wire/error.js';
import { metadata } from '../wire/metadata.js';
import { flag, integer, oneOf, text } from '../wire/scalars.js';
import { fields, list, may, must, type Names } from '../wire/spec.js';

const PATH = '/v1/subscriptions/:id';

function subscriptionOf(desk: Desk, id: string): Stripe.Subscription {
  const subscription = onShelf(desk.book.subscriptions, id);
  if (subscription === undefined) throw noSuch('subscription', id, 'id', 404);
  return subscription;
}

const retrieve = call({
  method: 'get',
  path: PATH,
  params: fields({ ...expandable } satisfies Names<Stripe.SubscriptionRetrieveParams>),
  run: (desk, _params, id) => subscriptionOf(desk, id),
});

const item = fields({
  id: must(text()),
  quantity: must(integer(0, 1_000_000)),
} satisfies Names<Stripe.SubscriptionUpdateParams.Item>);

const update = call({
  method: 'post',
  path: PATH,
  params: fields({
    cancel_at_period_end: may(flag()),
    items: may(list(item, 20)),
    metadata: may(metadata()),
    proration_behavior: may(oneOf('always_invoice', 'create_prorations', 'none')),
    ...expandable,
  } satisfies Names<Stripe.SubscriptionUpdateParams>),
  run(desk, params, id) {
    const subscription = subscriptionOf(desk, id);
    if (subscription.status === 'canceled') {
      throw invalid('A canceled subscription can no longer be changed.', undefined);
    }
    updateSubscription(desk, subscription, {
      cancelAtPeriodEnd: params.cancel_at_period_end,
      items: params.items ?? [],
      metadata: params.metadata,
      proration: params.proration_behavior ?? 'create_prorations',
    });
    return subscription;
  },
});

/** The provider's own answer to a second cancellation is 404. */
const cancel = call({
  method: 'delete',
  path: PATH,
  params: fields({ ...expandable } satisfies Names<Stripe.SubscriptionCancelParams>),
  run(desk, _params, id) {
    const subscription = subscriptionOf(desk, id);
    if (subscription.status === 'canceled') throw noSuch('subscription', id, 'id', 404);
    endSubscription(desk, subscription, 'cancellation_requested');
    return subscription;
  },
});

export const subscriptionCalls: Call[] = [retrieve, update, cancel];
