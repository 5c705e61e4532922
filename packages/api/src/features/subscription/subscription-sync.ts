import { subscriptionAfter } from '@bookmatch/common/subscription/transitions';
import type { GlobalScope, ShopScope } from '../../platform/database/scope.js';
import type { Stamp } from '../../platform/database/stamp.js';
import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import { enqueue } from '../../platform/outbox/outbox.js';
import { bringIn } from '../../platform/payments/bring-in.js';
import type { Payments } from '../../platform/payments/payments-client.js';
import { countMembers } from './owners.js';
import { isOver, readSubscription, type ProviderFacts } from './provider-subscription.js';
import { columnsOf, stateOf, subscriptionOf } from './subscription-facts.js';
import { Subscription } from './subscription.entity.js';

export const QUANTITY = 'subscription-quantity';
type Parts = { payments: Payments; work: UnitOfWork };

/** Keeps the shop's row what the provider's subscription is. */
export class SubscriptionSync {
  constructor(private readonly parts: Parts) {}

  /** Brings a subscription in, whatever set it off. One that belongs to no shop here is let go. */
  async bringIn(subscriptionId: string, stamp: Stamp): Promise<void> {
    const { payments, work } = this.parts;
    let surplus = false;
    await bringIn(
      async () => readSubscription(await payments.subscriptions.retrieve(subscriptionId)),
      async (facts) => {
        surplus = await work.transaction(stamp, (scope) => store(scope, facts));
      },
    );
    // Two payment pages finished at once: the shop keeps the first subscription and pays for no second.
    if (surplus)
      await payments.subscriptions.cancel(
        subscriptionId,
        {},
        { idempotencyKey: `surplus:${subscriptionId}` },
      );
  }

  /** The same by way of a payment page, once it is complete. Answers whether it was. */
  async bringInCheckout(sessionId: string, stamp: Stamp): Promise<boolean> {
    const { status, subscription } = await this.parts.payments.checkout.sessions.retrieve(sessionId);
    if (status !== 'complete' || !subscription) return false;
    await this.bringIn(typeof subscription === 'string' ? subscription : subscription.id, stamp);
    return true;
  }

  /**
   * Makes the quantity at the provider the number of active members. Asked for by every change of members; when two run
   * at once, each looks again after its own call, so that the last number stands.
   */
  async followMembers(shopId: string, stamp: Stamp, cause: string): Promise<void> {
    const { payments, work } = this.parts;
    const look = () =>
      work.read(stamp, async (scope) => {
        const inShop = scope.forShop(shopId);
        const { providerSubscriptionId } = await subscriptionOf(inShop);
        return { providerSubscriptionId, members: await countMembers(inShop) };
      });
    const { providerSubscriptionId } = await look();
    if (providerSubscriptionId === null) return;
    let round = 0;
    await bringIn(look, async ({ members }) => {
      round += 1;
      const facts = readSubscription(await payments.subscriptions.retrieve(providerSubscriptionId));
      if (isOver(facts) || facts.quantity === members) return;
      await payments.subscriptions.update(
        providerSubscriptionId,
        { items: [{ id: facts.itemId, quantity: members }], proration_behavior: 'create_prorations' },
        { idempotencyKey: `quantity:${cause}:${round}:${members}` },
      );
    });
    await this.bringIn(providerSubscriptionId, stamp);
  }
}

/** Leaves the quantity to be brought in line, in the transaction that changed the members. */
export const followMembersLater = (scope: ShopScope): Promise<void> => enqueue(scope, QUANTITY, {});

/** Stores what the provider says. Answers whether this is a second subscription beside one that runs. */
async function store(scope: GlobalScope, facts: ProviderFacts): Promise<boolean> {
  const [known] = await scope.acrossShops(Subscription, { providerCustomerId: facts.customerId });
  const shopId = known?.shopId ?? facts.shopId;
  if (!shopId) return false;
  const inShop = scope.forShop(shopId);
  const row = await inShop.rows(Subscription).findOneBy({}, true);
  if (!row) return false;
  if (row.providerSubscriptionId !== facts.id) {
    if (isOver(facts)) return false;
    if (row.providerSubscriptionId !== null && row.status !== 'canceled') return true;
  }
  await inShop.rows(Subscription).update(row, {
    ...columnsOf(subscriptionAfter(stateOf(row), facts, scope.now.toISOString())),
    providerCustomerId: facts.customerId,
    providerSubscriptionId: facts.id,
    checkoutSessionId: null,
  });
  if (!isOver(facts) && facts.quantity !== (await countMembers(inShop))) await followMembersLater(inShop);
  return false;
}
