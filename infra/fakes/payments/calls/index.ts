import type { Call } from '../wire/call.js';
import { accountLinkCalls } from './account-links.js';
import { accountCalls } from './accounts.js';
import { checkoutSessionCalls } from './checkout-sessions.js';
import { customerCalls } from './customers.js';
import { eventCalls } from './events.js';
import { paymentIntentCalls } from './payment-intents.js';
import { portalSessionCalls } from './portal-sessions.js';
import { priceCalls } from './prices.js';
import { refundCalls } from './refunds.js';
import { subscriptionCalls } from './subscriptions.js';

/** Every call our product makes. Any other address is 404. */
export const CALLS: readonly Call[] = [
  ...accountCalls,
  ...accountLinkCalls,
  ...checkoutSessionCalls,
  ...customerCalls,
  ...eventCalls,
  ...paymentIntentCalls,
  ...portalSessionCalls,
  ...priceCalls,
  ...refundCalls,
  ...subscriptionCalls,
];
