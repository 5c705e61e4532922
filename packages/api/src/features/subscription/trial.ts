import type { ShopScope } from '../../platform/database/scope.js';
import { Subscription } from './subscription.entity.js';

const TRIAL_DAYS = 14;
const DAY_MS = 86_400_000;

/** Every shop starts with a trial; nothing is asked of the payment provider until somebody subscribes. */
export async function startTrial(scope: ShopScope): Promise<void> {
  await scope.rows(Subscription).insert({
    id: scope.newId(),
    status: 'trialing',
    trialEndsAt: new Date(scope.now.getTime() + TRIAL_DAYS * DAY_MS),
    currentPeriodEnd: null,
    graceEndsAt: null,
    paidMembers: 0,
    providerCustomerId: null,
    providerSubscriptionId: null,
  });
}
