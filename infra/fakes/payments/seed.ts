import { newId } from './ids.js';
import { buildAccount, buildRequirements } from './objects/account.js';
import { buildPrice } from './objects/price.js';
import { buildProduct } from './objects/product.js';
import type { PriceSeed } from './options.js';
import { onShelf, type Book } from './state/book.js';
import type { State } from './state/state.js';

/** Puts up the prices that are not there yet; one that is keeps what it was. */
export function seedPrices(book: Book, seeds: readonly PriceSeed[], now: number): void {
  for (const seed of seeds) {
    if (onShelf(book.prices, seed.id) === undefined) putUpPrice(book, seed, now);
  }
}

function putUpPrice(book: Book, seed: PriceSeed, now: number): void {
  const product = buildProduct({ id: newId('prod_', 14), name: seed.productName, description: null, now });
  book.products[product.id] = product;
  book.prices[seed.id] = buildPrice({ ...seed, product: product.id, now });
}

/** The platform's own account, which has nothing left to do. */
export function seedPlatform(state: State, now: number): void {
  if (onShelf(state.accounts, state.platformId) !== undefined) return;
  const account = buildAccount({
    id: state.platformId,
    wish: {},
    country: 'US',
    email: 'platform@example.com',
    businessType: 'company',
    businessName: 'Bookmatch',
    businessUrl: null,
    metadata: {},
    now,
  });
  account.charges_enabled = true;
  account.payouts_enabled = true;
  account.details_submitted = true;
  account.capabilities = { card_payments: 'active', transfers: 'active' };
  account.requirements = buildRequirements([], null);
  account.controller = { type: 'account' };
  state.accounts[account.id] = account;
}
