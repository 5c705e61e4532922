import type { PriceSeed } from '../options.js';
import { needed, Reader } from './read.js';

/** Reads a price to put up. Errors: 400 for what is missing, of the wrong kind or unknown. */
export function priceSeedFrom(value: unknown): PriceSeed {
  const reader = new Reader(value);
  const seed = {
    id: needed(reader.text('id'), 'id'),
    productName: reader.text('productName') ?? 'Test product',
    unitAmountCents: needed(reader.integer('unitAmountCents'), 'unitAmountCents'),
    currency: reader.text('currency') ?? 'usd',
    interval: reader.oneOf('interval', ['month', 'year']) ?? 'month',
  };
  reader.end();
  return seed;
}
