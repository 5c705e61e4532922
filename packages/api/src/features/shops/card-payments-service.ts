import type { Redirect } from '@bookmatch/common/wire/fields';
import type { Shop as ShopView } from '@bookmatch/common/shops/shops-contract';
import type Stripe from 'stripe';
import type { GlobalScope, ShopScope } from '../../platform/database/scope.js';
import { systemStamp, type Stamp } from '../../platform/database/stamp.js';
import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import { conflict } from '../../platform/http/problem-error.js';
import { bringIn } from '../../platform/payments/bring-in.js';
import type { Payments } from '../../platform/payments/payments-client.js';
import type { PaymentEventHandler } from '../../platform/payments/webhook.js';
import { Shop } from './shop.entity.js';
import { viewShop } from './shop-settings-service.js';

type AccountFacts = { id: string; shopId: string | undefined; ready: boolean };
type Parts = { payments: Payments; work: UnitOfWork; origin: string; clock: () => Date };

/** The shop's own account at the payment provider, where what its customers pay by card settles. */
export class CardPaymentsService {
  constructor(private readonly parts: Parts) {}

  /**
   * Answers the provider's page on which the shop opens its account, making the account at the first call. The provider
   * is asked with one key a shop and nothing that could change between two calls, so that a double click or a process
   * killed in between never makes two.
   */
  async setUp(scope: ShopScope, stamp: Stamp): Promise<Redirect> {
    const { payments } = this.parts;
    const shop = await scope.global(Shop).get(scope.shopId);
    if (shop.cardPayments === 'ready') throw conflict('Card payments are set up already.');
    const account = shop.paymentAccountId ?? (await this.openAccount(shop.id, stamp));
    const screen = `${this.parts.origin}/s/${shop.slug}/settings/card-payments`;
    const { url } = await payments.accountLinks.create({
      account,
      type: 'account_onboarding',
      return_url: `${screen}?from=provider`,
      refresh_url: `${screen}?link=expired`,
    });
    return { url };
  }

  /** Asks the provider how the account stands: for the return from its page, which may be faster than the webhook. */
  async refresh(scope: ShopScope, stamp: Stamp): Promise<ShopView> {
    const shop = await scope.global(Shop).get(scope.shopId);
    if (shop.paymentAccountId) await this.bringIn(shop.paymentAccountId, stamp);
    return viewShop(await scope.global(Shop).get(scope.shopId));
  }

  /**
   * `account.updated`. What the event says may be old by now, so the account is read afresh; an account that is no
   * shop's is let go.
   */
  async accountChanged(accountId: string, eventId: string): Promise<void> {
    await this.bringIn(accountId, systemStamp(eventId, this.parts.clock()));
  }

  private async openAccount(shopId: string, stamp: Stamp): Promise<string> {
    const { payments, work } = this.parts;
    const account = await payments.accounts.create(
      {
        country: 'US',
        controller: {
          fees: { payer: 'account' },
          losses: { payments: 'stripe' },
          requirement_collection: 'stripe',
          stripe_dashboard: { type: 'full' },
        },
        metadata: { shopId },
      },
      { idempotencyKey: `shop-account:${shopId}` },
    );
    return work.transaction(stamp, async (scope) => {
      const shops = scope.forShop(shopId).global(Shop);
      const shop = await shops.get(shopId, true);
      if (shop.paymentAccountId) return shop.paymentAccountId;
      await shops.update(shop, { paymentAccountId: account.id, cardPayments: 'in-progress' });
      return account.id;
    });
  }

  private bringIn(accountId: string, stamp: Stamp): Promise<void> {
    const { payments, work } = this.parts;
    return bringIn(
      async (): Promise<AccountFacts> => {
        const { id, metadata, charges_enabled } = await payments.accounts.retrieve(accountId);
        return { id, shopId: metadata?.['shopId'], ready: charges_enabled };
      },
      (facts) => work.transaction(stamp, (scope) => store(scope, facts)),
    );
  }
}

async function store(scope: GlobalScope, { id, shopId, ready }: AccountFacts): Promise<void> {
  const owner = await scope.global(Shop).findOneBy({ paymentAccountId: id });
  // The account may be made and its id not yet written here: the process died in between.
  const ofShop = owner?.id ?? shopId;
  if (ofShop === undefined) return;
  const shops = scope.forShop(ofShop).global(Shop);
  const shop = await shops.findOneBy({ id: ofShop }, true);
  if (!shop || (shop.paymentAccountId ?? id) !== id) return;
  await shops.update(shop, { paymentAccountId: id, cardPayments: ready ? 'ready' : 'in-progress' });
}

/** The provider's events about shops' own accounts. */
export function cardPaymentsEvents(service: CardPaymentsService): Record<string, PaymentEventHandler> {
  return {
    'account.updated': (event) => service.accountChanged((event.data.object as Stripe.Account).id, event.id),
  };
}
