import type { ShopScope } from '../../platform/database/scope.js';
import { sendMail, type Letter } from '../../platform/mail/mail.js';
import { Shop } from '../shops/shops-public.js';
import { ownersOf } from './owners.js';
import { paymentFailedLetter, trialEndedLetter, trialEndingLetter } from './subscription-letters.js';
import { factsOf, subscriptionOf } from './subscription-facts.js';
import { Subscription } from './subscription.entity.js';
import type { TrialLetter } from './trial.js';

const ORDER = { ending: 1, ended: 2 } as const;

/** Writes to the owners, once about each thing: the row remembers what they were told. */
export class SubscriptionMail {
  constructor(private readonly origin: string) {}

  /** Says that the trial is about to end, or has; nothing once somebody subscribed. */
  async aboutTrial(scope: ShopScope, { which }: TrialLetter): Promise<void> {
    const row = await subscriptionOf(scope, true);
    if (row.status !== 'trialing' || factsOf(row).subscribed) return;
    if (row.trialLetter !== null && ORDER[row.trialLetter] >= ORDER[which]) return;
    await scope.rows(Subscription).update(row, { trialLetter: which });
    const shop = await scope.global(Shop).get(scope.shopId);
    const lastDay = dayText(shop.timeZone, row.trialEndsAt);
    await this.toOwners(scope, shop, (about) =>
      which === 'ending' ? trialEndingLetter(about, lastDay) : trialEndedLetter(about),
    );
  }

  /** Says that a payment failed, unless it was made good meanwhile. */
  async aboutFailedPayment(scope: ShopScope, invoiceId: string): Promise<void> {
    const row = await subscriptionOf(scope, true);
    const isOwed = row.status === 'past_due' || row.status === 'unpaid';
    if (!isOwed || row.failedInvoiceId === invoiceId) return;
    await scope.rows(Subscription).update(row, { failedInvoiceId: invoiceId });
    const shop = await scope.global(Shop).get(scope.shopId);
    await this.toOwners(scope, shop, paymentFailedLetter);
  }

  private async toOwners(
    scope: ShopScope,
    shop: Shop,
    write: (about: { email: string; name: string; shopName: string; url: string }) => Letter,
  ): Promise<void> {
    const url = `${this.origin}/s/${shop.slug}/settings/subscription`;
    for (const { email, name } of await ownersOf(scope))
      await sendMail(scope, write({ email, name, shopName: shop.name, url }));
  }
}

/** `Monday, June 15` on the wall of the shop. */
function dayText(zone: string, instant: Date): string {
  const options = { timeZone: zone, weekday: 'long', month: 'long', day: 'numeric' } as const;
  return new Intl.DateTimeFormat('en-US', options).format(instant);
}
