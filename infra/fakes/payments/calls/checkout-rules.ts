import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { onShelf } from '../state/book.js';
import { ApiError, invalid, noSuch } from '../wire/error.js';
import type { CheckoutCreate } from './checkout-params.js';

const LEAST_CENTS = 50;
const MOST_CENTS = 99_999_999;
const LEAST_LIFE_SECONDS = 30 * 60;
const MOST_LIFE_SECONDS = 24 * 60 * 60;
const LEAST_TRIAL_SECONDS = 48 * 60 * 60;

/** What the parameters must satisfy together. Errors: 400, and 403 from an account that may not charge. */
export function checkCheckout(desk: Desk, params: CheckoutCreate): void {
  mayCharge(desk);
  checkMode(params);
  checkCustomer(desk, params);
  checkTimes(desk, params);
}

function mayCharge(desk: Desk): void {
  const account = desk.account === null ? undefined : onShelf(desk.state.accounts, desk.account);
  if (account === undefined || account.charges_enabled) return;
  const message = `Account ${account.id} cannot take charges yet: its onboarding is not finished.`;
  throw new ApiError(403, { type: 'invalid_request_error', code: 'account_invalid', message });
}

function checkMode(params: CheckoutCreate): void {
  const stray = params.mode === 'payment' ? 'subscription_data' : 'payment_intent_data';
  if (params[stray] !== undefined) throw invalid(`You can not pass ${stray} in ${params.mode} mode.`, stray);
  if (params.line_items.length === 0) throw invalid('At least one line item is needed.', 'line_items');
}

function checkCustomer(desk: Desk, params: CheckoutCreate): void {
  const { customer } = params;
  if (customer === undefined) return;
  if (params.customer_email !== undefined) {
    throw invalid('Give one of these parameters: customer, customer_email.', 'customer_email');
  }
  if (onShelf(desk.book.customers, customer) === undefined)
    throw noSuch('customer', customer, 'customer', 400);
}

function checkTimes(desk: Desk, params: CheckoutCreate): void {
  const life = (params.expires_at ?? desk.now() + MOST_LIFE_SECONDS) - desk.now();
  if (life < LEAST_LIFE_SECONDS || life > MOST_LIFE_SECONDS) {
    throw invalid('expires_at must be between 30 minutes and 24 hours from now.', 'expires_at');
  }
  const trialEnd = params.subscription_data?.trial_end;
  if (trialEnd !== undefined && trialEnd - desk.now() < LEAST_TRIAL_SECONDS) {
    throw invalid('trial_end must be at least 2 days from now.', 'subscription_data[trial_end]');
  }
}

/** Errors: 400 `amount_too_small` or `amount_too_large` for what a card cannot be charged. */
export function checkTotal(lines: Stripe.LineItem[]): void {
  const total = lines.reduce((sum, line) => sum + line.amount_total, 0);
  if (total < LEAST_CENTS)
    throw invalid('The total must be at least $0.50.', 'line_items', 'amount_too_small');
  if (total > MOST_CENTS)
    throw invalid('The total must be below $1,000,000.00.', 'line_items', 'amount_too_large');
}
