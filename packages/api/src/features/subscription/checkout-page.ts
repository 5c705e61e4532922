import { createHash } from 'node:crypto';
import type { Redirect } from '@bookmatch/common/wire/fields';
import type { ShopScope } from '../../platform/database/scope.js';
import type { Stamp } from '../../platform/database/stamp.js';
import { conflict } from '../../platform/http/problem-error.js';
import { Person } from '../accounts/accounts-public.js';
import { Member, Shop } from '../shops/shops-public.js';
import { countMembers } from './owners.js';
import { subscriptionOf } from './subscription-facts.js';
import type { SubscriptionParts } from './subscription-parts.js';
import { Subscription } from './subscription.entity.js';

/** The provider takes no shorter trial. */
const SHORTEST_TRIAL_MS = 48 * 3_600_000;
/** Between asking here and reading there. */
const LEEWAY_MS = 5 * 60_000;

/** The provider's page on which a shop subscribes. */
export class CheckoutPage {
  constructor(private readonly parts: Pick<SubscriptionParts, 'payments' | 'work' | 'origin' | 'prices'>) {}

  async open(scope: ShopScope, stamp: Stamp, row: Subscription, key: string): Promise<Redirect> {
    const { payments, origin, prices } = this.parts;
    const { shopId } = scope;
    const customer = row.providerCustomerId ?? (await this.openCustomer(scope, stamp));
    const members = await countMembers(scope);
    const { slug } = await scope.global(Shop).get(shopId);
    const screen = `${origin}/s/${slug}/settings/subscription`;
    const session = await payments.checkout.sessions.create(
      {
        mode: 'subscription',
        customer,
        client_reference_id: shopId,
        line_items: [{ price: prices.priceId, quantity: members }],
        subscription_data: { metadata: { shopId }, ...trialOf(row, scope.now) },
        metadata: { shopId },
        success_url: `${screen}?from=provider`,
        cancel_url: screen,
      },
      { idempotencyKey: `subscribe:${shopId}:${key}:${members}` },
    );
    await this.keepOnly(shopId, stamp, session.id);
    if (!session.url) throw conflict('This payment page is over. Start again.');
    return { url: session.url };
  }

  /** One customer a shop: of two made at once, both sides keep the one that was stored first. */
  private async openCustomer(scope: ShopScope, stamp: Stamp): Promise<string> {
    const { payments, work } = this.parts;
    const { name } = await scope.global(Shop).get(scope.shopId);
    const { personId } = await scope.rows(Member).get(scope.memberId);
    const { email } = await scope.global(Person).get(personId);
    const given = { name, email, metadata: { shopId: scope.shopId } };
    const fingerprint = createHash('sha256').update(JSON.stringify(given)).digest('hex').slice(0, 16);
    const idempotencyKey = `subscriber:${scope.shopId}:${fingerprint}`;
    const customer = await payments.customers.create(given, { idempotencyKey });
    return work.transaction(stamp, async (fresh) => {
      const inShop = fresh.forShop(scope.shopId);
      const row = await subscriptionOf(inShop, true);
      if (row.providerCustomerId) return row.providerCustomerId;
      await inShop.rows(Subscription).update(row, { providerCustomerId: customer.id });
      return customer.id;
    });
  }

  /** Remembers the page and ends the one before, which another tab may still show. */
  private async keepOnly(shopId: string, stamp: Stamp, sessionId: string): Promise<void> {
    const { payments, work } = this.parts;
    const earlier = await work.transaction(stamp, async (fresh) => {
      const inShop = fresh.forShop(shopId);
      const row = await subscriptionOf(inShop, true);
      await inShop.rows(Subscription).update(row, { checkoutSessionId: sessionId });
      return row.checkoutSessionId;
    });
    if (earlier === null || earlier === sessionId) return;
    const { status } = await payments.checkout.sessions.retrieve(earlier);
    if (status === 'open') await payments.checkout.sessions.expire(earlier);
  }
}

/** Days of the trial that are left are not lost: the first payment is due when it ends. */
function trialOf({ trialEndsAt }: Subscription, now: Date): { trial_end?: number } {
  const leftMs = trialEndsAt.getTime() - now.getTime();
  if (leftMs < SHORTEST_TRIAL_MS + LEEWAY_MS) return {};
  return { trial_end: Math.floor(trialEndsAt.getTime() / 1000) };
}
