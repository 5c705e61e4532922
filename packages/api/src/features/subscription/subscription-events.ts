import type Stripe from 'stripe';
import { systemStamp } from '../../platform/database/stamp.js';
import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import type { OutboxHandler } from '../../platform/outbox/outbox.js';
import type { PaymentEventHandler } from '../../platform/payments/webhook.js';
import { idOf } from './provider-subscription.js';
import type { SubscriptionServices } from './subscription-services.js';
import { QUANTITY } from './subscription-sync.js';
import { Subscription } from './subscription.entity.js';
import { TRIAL_LETTER, type TrialLetter } from './trial.js';

type Parts = SubscriptionServices & { work: UnitOfWork; clock: () => Date };

/** The provider's events about our own account. What they say is not believed but looked up, in whatever order they come. */
export function subscriptionEvents({
  sync,
  subscriptionMail: mail,
  work,
  clock,
}: Parts): Record<string, PaymentEventHandler> {
  const stampOf = (event: Stripe.Event) => systemStamp(event.id, clock());
  const bringIn: PaymentEventHandler = async (event) => {
    const { id } = event.data.object as Stripe.Subscription;
    await sync.bringIn(id, stampOf(event));
  };
  return {
    'customer.subscription.created': bringIn,
    'customer.subscription.updated': bringIn,
    'customer.subscription.deleted': bringIn,
    'customer.subscription.paused': bringIn,
    'customer.subscription.resumed': bringIn,
    async 'checkout.session.completed'(event) {
      const { subscription } = event.data.object as Stripe.Checkout.Session;
      if (subscription) await sync.bringIn(idOf(subscription), stampOf(event));
    },
    async 'invoice.payment_failed'(event) {
      const invoice = event.data.object as Stripe.Invoice;
      const subscription = invoice.parent?.subscription_details?.subscription;
      if (!subscription) return;
      await sync.bringIn(idOf(subscription), stampOf(event));
      await work.transaction(stampOf(event), async (scope) => {
        const where = { providerSubscriptionId: idOf(subscription) };
        const [row] = await scope.acrossShops(Subscription, where);
        if (row) await mail.aboutFailedPayment(scope.forShop(row.shopId), invoice.id ?? '');
      });
    },
  };
}

/** What the slice left in the outbox for itself. */
export function subscriptionOutbox({
  sync,
  subscriptionMail: mail,
  work,
  clock,
}: Parts): Record<string, OutboxHandler> {
  return {
    [QUANTITY]: (_: unknown, { id, shopId }: { id: string; shopId: string | null }) =>
      sync.followMembers(shopId ?? '', systemStamp(id, clock()), id),
    [TRIAL_LETTER]: (letter: TrialLetter, { id, shopId }: { id: string; shopId: string | null }) =>
      work.transaction(systemStamp(id, clock()), (scope) =>
        mail.aboutTrial(scope.forShop(shopId ?? ''), letter),
      ),
  };
}
