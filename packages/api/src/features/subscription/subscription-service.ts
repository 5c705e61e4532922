import { shownStatus } from '@bookmatch/common/subscription/standing';
import type { Subscription as SubscriptionView } from '@bookmatch/common/subscription/subscription-contract';
import type { Redirect } from '@bookmatch/common/wire/fields';
import type { ShopScope } from '../../platform/database/scope.js';
import type { Stamp } from '../../platform/database/stamp.js';
import { conflict } from '../../platform/http/problem-error.js';
import { Shop } from '../shops/shops-public.js';
import { CheckoutPage } from './checkout-page.js';
import { countMembers } from './owners.js';
import { factsOf, standingOf, subscriptionOf } from './subscription-facts.js';
import type { SubscriptionParts } from './subscription-parts.js';
import type { Subscription } from './subscription.entity.js';

/** The shop's own subscription: how it stands, starting it, minding it. Money and card stay with the provider. */
export class SubscriptionService {
  private readonly page: CheckoutPage;

  constructor(private readonly parts: SubscriptionParts) {
    this.page = new CheckoutPage(parts);
  }

  async get(scope: ShopScope): Promise<SubscriptionView> {
    const row = await subscriptionOf(scope);
    const facts = factsOf(row);
    const members = isRunning(row) ? row.paidMembers : await countMembers(scope);
    const pricePerMemberCents = await this.parts.prices.perMemberCents();
    return {
      status: shownStatus(facts, scope.now.toISOString()),
      standing: standingOf(row, scope.now),
      trialEndsAt: facts.trialEndsAt,
      currentPeriodEnd: row.currentPeriodEnd?.toISOString() ?? null,
      graceEndsAt: facts.graceEndsAt,
      cancelAtPeriodEnd: row.cancelAtPeriodEnd,
      members,
      pricePerMemberCents,
      monthlyTotalCents: members * pricePerMemberCents,
    };
  }

  /**
   * Answers the provider's page on which the shop subscribes. Plan, price and number of members come from here. A repeat
   * with the same key gets the same page; starting over ends the page before, so that nobody pays twice.
   */
  async startCheckout(scope: ShopScope, stamp: Stamp, key: string): Promise<Redirect> {
    const before = await subscriptionOf(scope);
    // It may be paid already, and the webhook still on its way.
    if (before.checkoutSessionId) await this.parts.sync.bringInCheckout(before.checkoutSessionId, stamp);
    const row = await subscriptionOf(scope);
    if (isRunning(row))
      throw conflict('The shop is subscribed already. Open the payment page to pay or change the card.');
    return this.page.open(scope, stamp, row, key);
  }

  /** Answers the provider's page on which a card is changed, an invoice paid, or the subscription ended. */
  async openPortal(scope: ShopScope): Promise<Redirect> {
    const { providerCustomerId } = await subscriptionOf(scope);
    if (!providerCustomerId) throw conflict('The shop has not subscribed yet.');
    const { slug } = await scope.global(Shop).get(scope.shopId);
    const { url } = await this.parts.payments.billingPortal.sessions.create({
      customer: providerCustomerId,
      return_url: `${this.parts.origin}/s/${slug}/settings/subscription?from=provider`,
    });
    return { url };
  }

  /** Asks the provider how it stands: for the return from its pages, which may be faster than the webhook. */
  async refresh(scope: ShopScope, stamp: Stamp): Promise<SubscriptionView> {
    const row = await subscriptionOf(scope);
    if (row.providerSubscriptionId) await this.parts.sync.bringIn(row.providerSubscriptionId, stamp);
    if (row.checkoutSessionId) await this.parts.sync.bringInCheckout(row.checkoutSessionId, stamp);
    return this.get(scope);
  }
}

/** The provider has a subscription of this shop, paid or not. */
function isRunning({ status, providerSubscriptionId }: Subscription): boolean {
  return providerSubscriptionId !== null && status !== 'canceled';
}
