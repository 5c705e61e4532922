import type Stripe from 'stripe';
import { listOf } from '../objects/list.js';
import { onShelf } from '../state/book.js';
import { call, expandable, type Call } from '../wire/call.js';
import { noSuch } from '../wire/error.js';
import { flag, integer, oneOf, text } from '../wire/scalars.js';
import { fields, may, type Names } from '../wire/spec.js';

const retrieve = call({
  method: 'get',
  path: '/v1/prices/:id',
  params: fields({ ...expandable } satisfies Names<Stripe.PriceRetrieveParams>),
  run(desk, _params, id) {
    const price = onShelf(desk.book.prices, id);
    if (price === undefined) throw noSuch('price', id, 'price', 404);
    return price;
  },
});

const listParams = fields({
  active: may(flag()),
  currency: may(text(3)),
  limit: may(integer(1, 100)),
  product: may(text()),
  starting_after: may(text()),
  type: may(oneOf('one_time', 'recurring')),
  ...expandable,
} satisfies Names<Stripe.PriceListParams>);

type ListParams = ReturnType<typeof listParams.read>;

function fits(price: Stripe.Price, params: ListParams): boolean {
  if (params.active !== undefined && price.active !== params.active) return false;
  if (params.currency !== undefined && price.currency !== params.currency) return false;
  if (params.product !== undefined && price.product !== params.product) return false;
  return params.type === undefined || price.type === params.type;
}

/** Newest first, as every list of the provider. */
const listAll = call({
  method: 'get',
  path: '/v1/prices',
  params: listParams,
  run(desk, params) {
    const all = Object.values(desk.book.prices).reverse();
    const from = startOf(all, params.starting_after);
    const rest = all.slice(from).filter((price) => fits(price, params));
    const limit = params.limit ?? 10;
    return listOf(rest.slice(0, limit), '/v1/prices', rest.length > limit);
  },
});

function startOf(all: Stripe.Price[], after: string | undefined): number {
  if (after === undefined) return 0;
  const position = all.findIndex((price) => price.id === after);
  if (position === -1) throw noSuch('price', after, 'starting_after', 400);
  return position + 1;
}

export const priceCalls: Call[] = [retrieve, listAll];
