import type { Subscription } from '@bookmatch/common/subscription/subscription-contract';
import type { Tone } from '../ui/status-chip/status-chip';

type Words = { chip: string; tone: Tone; text: string };
/** What the screen shows dates by, such as `Thu, Jan 14`. */
type DateText = (instant: string | null) => string;

/** How the subscription stands, in a word and in a sentence. */
export function wordsOf(subscription: Subscription, date: DateText): Words {
  const { status, standing, trialEndsAt, currentPeriodEnd, graceEndsAt, cancelAtPeriodEnd } = subscription;
  if (cancelAtPeriodEnd && standing.access === 'full')
    return {
      chip: 'Ends soon',
      tone: 'over',
      text: `The subscription was ended and runs until ${date(currentPeriodEnd)}. After that the shop is read-only.`,
    };
  switch (status) {
    case 'trialing':
      return isSubscribed(subscription)
        ? {
            chip: 'Subscribed',
            tone: 'good',
            text: `The trial runs until ${date(currentPeriodEnd)}. The first payment is due then.`,
          }
        : {
            chip: 'Trial',
            tone: 'planned',
            text: `The trial runs until ${date(trialEndsAt)}. Nothing is charged for it.`,
          };
    case 'active':
      return { chip: 'Active', tone: 'good', text: `Paid until ${date(currentPeriodEnd)}, then renewed.` };
    case 'past_due':
      return {
        chip: 'Payment failed',
        tone: 'over',
        text:
          standing.access === 'full'
            ? `The last payment did not go through. The shop works until ${date(graceEndsAt)}, then it is read-only.`
            : 'The last payment did not go through, and the shop is read-only until it is paid.',
      };
    case 'unpaid':
      return {
        chip: 'Unpaid',
        tone: 'over',
        text: 'The last payment did not go through after several tries.',
      };
    case 'paused':
      return { chip: 'Paused', tone: 'over', text: 'The subscription is paused at the payment provider.' };
    case 'trial-ended':
      return { chip: 'Trial over', tone: 'over', text: `The trial ended on ${date(trialEndsAt)}.` };
    case 'canceled':
      return { chip: 'Ended', tone: 'over', text: 'The subscription has ended.' };
  }
}

/** Whether the payment provider has a subscription of this shop, paid or not: then it is managed, not started. */
export function isSubscribed({ status, currentPeriodEnd }: Subscription): boolean {
  if (status === 'trialing') return currentPeriodEnd !== null;
  return status !== 'trial-ended' && status !== 'canceled';
}
