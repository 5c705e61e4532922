import { PLAN } from '@bookmatch/common/subscription/plan';
import { trialEnd } from '@bookmatch/common/subscription/standing';
import type { ShopScope } from '../../platform/database/scope.js';
import { enqueue } from '../../platform/outbox/outbox.js';
import { Subscription } from './subscription.entity.js';

export const TRIAL_LETTER = 'subscription-trial-letter';
export type TrialLetter = { which: 'ending' | 'ended' };
const DAY_MS = 86_400_000;

/**
 * Every shop starts with a trial; nothing is asked of the payment provider until somebody subscribes. The letters about
 * its end wait in the outbox until their day.
 */
export async function startTrial(scope: ShopScope): Promise<void> {
  const trialEndsAt = new Date(trialEnd(scope.now.toISOString()));
  await scope.rows(Subscription).insert({
    id: scope.newId(),
    status: 'trialing',
    trialEndsAt,
    currentPeriodEnd: null,
    graceEndsAt: null,
    cancelAtPeriodEnd: false,
    paidMembers: 0,
    providerCustomerId: null,
    providerSubscriptionId: null,
    checkoutSessionId: null,
    failedInvoiceId: null,
    trialLetter: null,
  });
  const remind = ({ which }: TrialLetter, dueAt: Date) => enqueue(scope, TRIAL_LETTER, { which }, dueAt);
  await remind({ which: 'ending' }, new Date(trialEndsAt.getTime() - PLAN.trialEndingDays * DAY_MS));
  await remind({ which: 'ended' }, trialEndsAt);
}
