import type { ShopScope } from '../../platform/database/scope.js';
import { ShopCounter } from './shop-counter.entity.js';

/** What a new shop's numbers begin with: a first invoice numbered 1 tells the customer more than it should. */
export const COUNTER_STARTS = {
  estimate: 101,
  job: 1001,
  invoice: 2001,
  'credit-note': 501,
  'ledger-entry': 1,
} as const;
export type CounterKind = keyof typeof COUNTER_STARTS;

/** Made once, at sign-up. */
export async function createCounters(scope: ShopScope): Promise<void> {
  const kinds = Object.entries(COUNTER_STARTS);
  await scope
    .rows(ShopCounter)
    .insertMany(kinds.map(([kind, nextNumber]) => ({ id: scope.newId(), kind, nextNumber })));
}

/**
 * Takes the next number of a kind. The counter's row stays locked until the transaction ends, so take it last: others
 * that need a number wait for it.
 */
export async function takeNumber(scope: ShopScope, kind: CounterKind): Promise<number> {
  const counter = await lockCounter(scope, kind);
  await scope.rows(ShopCounter).update(counter, { nextNumber: counter.nextNumber + 1 });
  return counter.nextNumber;
}

/**
 * Waits until nobody else holds the counter, and holds it until the transaction ends. As the first statement of a
 * transaction it makes the acts that need the counter queue up, where taking the number last would make all but one of
 * them find their snapshot overtaken and start again.
 */
export async function lockCounter(scope: ShopScope, kind: CounterKind): Promise<ShopCounter> {
  const counter = await scope.rows(ShopCounter).findOneBy({ kind }, true);
  if (!counter) throw new TypeError(`The shop has no counter for ${kind}.`);
  return counter;
}
