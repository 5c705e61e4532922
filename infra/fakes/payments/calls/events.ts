import type Stripe from 'stripe';
import { call, expandable, type Call } from '../wire/call.js';
import { noSuch } from '../wire/error.js';
import { fields, type Names } from '../wire/spec.js';

/** An account sees its own events only; the platform asks for a connected account's in that account's name. */
const retrieve = call({
  method: 'get',
  path: '/v1/events/:id',
  params: fields({ ...expandable } satisfies Names<Stripe.EventRetrieveParams>),
  run(desk, _params, id) {
    const event = desk.state.events.find((one) => one.id === id && (one.account ?? null) === desk.account);
    if (event === undefined) throw noSuch('event', id, 'id', 404);
    return event;
  },
});

export const eventCalls: Call[] = [retrieve];
