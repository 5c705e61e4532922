import type Stripe from 'stripe';
import { buildCustomer } from '../objects/customer.js';
import { onShelf } from '../state/book.js';
import { call, expandable, type Call } from '../wire/call.js';
import { noSuch } from '../wire/error.js';
import { mergeMetadata, metadata } from '../wire/metadata.js';
import { email, text } from '../wire/scalars.js';
import { fields, may, type Names } from '../wire/spec.js';

const create = call({
  method: 'post',
  path: '/v1/customers',
  params: fields({
    description: may(text()),
    email: may(email()),
    metadata: may(metadata()),
    name: may(text(256)),
    phone: may(text(20)),
    ...expandable,
  } satisfies Names<Stripe.CustomerCreateParams>),
  run(desk, params) {
    const customer = buildCustomer({
      description: params.description ?? null,
      email: params.email ?? null,
      metadata: mergeMetadata({}, params.metadata),
      name: params.name ?? null,
      phone: params.phone ?? null,
      now: desk.now(),
    });
    desk.book.customers[customer.id] = customer;
    return customer;
  },
});

const retrieve = call({
  method: 'get',
  path: '/v1/customers/:id',
  params: fields({ ...expandable } satisfies Names<Stripe.CustomerRetrieveParams>),
  run(desk, _params, id) {
    const customer = onShelf(desk.book.customers, id);
    if (customer === undefined) throw noSuch('customer', id, 'id', 404);
    return customer;
  },
});

export const customerCalls: Call[] = [create, retrieve];
