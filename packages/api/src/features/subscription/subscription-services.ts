import type { Platform } from '../../platform/platform.js';
import { PriceList } from './price-list.js';
import { SubscriptionMail } from './subscription-mail.js';
import { SubscriptionService } from './subscription-service.js';
import { SubscriptionSync } from './subscription-sync.js';

export type SubscriptionServices = {
  subscription: SubscriptionService;
  sync: SubscriptionSync;
  subscriptionMail: SubscriptionMail;
};

/** The slice's own objects, for `compose.ts`. */
export function createSubscriptionServices({
  config,
  payments,
  work,
  clock,
}: Platform): SubscriptionServices {
  const { origin } = config;
  const prices = new PriceList(payments, config.payments.price, clock);
  const sync = new SubscriptionSync({ payments, work });
  return {
    sync,
    subscription: new SubscriptionService({ payments, work, origin, prices, sync }),
    subscriptionMail: new SubscriptionMail(origin),
  };
}
