import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { newId } from '../ids.js';
import { buildCheckoutLine } from '../objects/checkout-line.js';
import { buildPrice } from '../objects/price.js';
import { buildProduct } from '../objects/product.js';
import { onShelf } from '../state/book.js';
import { invalid, noSuch } from '../wire/error.js';
import type { CheckoutCreate } from './checkout-params.js';

type Line = CheckoutCreate['line_items'][number];

/** The lines of a session. Errors: 400 for a price that is absent, retired or of the wrong kind for the mode. */
export function checkoutLines(desk: Desk, params: CheckoutCreate): Stripe.LineItem[] {
  return params.line_items.map((line, position) => {
    const path = `line_items[${position}]`;
    const price = priceOf(desk, line, path);
    const wanted = params.mode === 'payment' ? 'one_time' : 'recurring';
    if (price.type !== wanted)
      throw invalid(`Mode ${params.mode} takes ${wanted} prices only.`, `${path}[price]`);
    return buildCheckoutLine({ price, description: productName(desk, price), quantity: line.quantity });
  });
}

function priceOf(desk: Desk, line: Line, path: string): Stripe.Price {
  if ((line.price === undefined) === (line.price_data === undefined)) {
    throw invalid('Give one of these parameters: price, price_data.', path);
  }
  if (line.price_data !== undefined) return priceFor(desk, line.price_data);
  const id = line.price ?? '';
  const price = onShelf(desk.book.prices, id);
  if (price === undefined) throw noSuch('price', id, `${path}[price]`, 400);
  if (!price.active) throw invalid(`Price ${id} is no longer active.`, `${path}[price]`);
  return price;
}

/** A price made for one sale only: kept, but not offered again. */
function priceFor(desk: Desk, data: NonNullable<Line['price_data']>): Stripe.Price {
  const now = desk.now();
  const { name, description } = data.product_data;
  const product = buildProduct({ id: newId('prod_', 14), name, description: description ?? null, now });
  desk.book.products[product.id] = product;
  const price = buildPrice({
    id: newId('price_'),
    product: product.id,
    unitAmountCents: data.unit_amount,
    currency: data.currency,
    interval: null,
    active: false,
    now,
  });
  desk.book.prices[price.id] = price;
  return price;
}

function productName(desk: Desk, price: Stripe.Price): string {
  const product =
    typeof price.product === 'string' ? onShelf(desk.book.products, price.product) : price.product;
  return product !== undefined && 'name' in product ? product.name : price.id;
}
