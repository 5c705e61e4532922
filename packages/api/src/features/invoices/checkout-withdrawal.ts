import type { ShopScope } from '../../platform/database/scope.js';
import { enqueue } from '../../platform/outbox/outbox.js';
import { CardCheckout } from './card-checkout.entity.js';

export const CLOSE_CHECKOUT = 'close-checkout';
export type ClosingCheckout = { sessionId: string; accountId: string };

/**
 * Closes the payment pages that ask for an amount that is no longer owed. A customer who is paying at this very moment
 * may still get through; see `PaymentsService.receiveCard`.
 */
export async function withdrawCheckouts(scope: ShopScope, invoiceId: string): Promise<void> {
  const checkouts = scope.rows(CardCheckout);
  for (const checkout of await checkouts.findBy({ invoiceId, status: ['asked', 'open'] }, 'id', true))
    await withdraw(scope, checkout);
}

export async function withdraw(scope: ShopScope, checkout: CardCheckout): Promise<void> {
  await scope.rows(CardCheckout).update(checkout, { status: 'withdrawn' });
  const { sessionId, accountId } = checkout;
  if (sessionId) await enqueue(scope, CLOSE_CHECKOUT, { sessionId, accountId } satisfies ClosingCheckout);
}
