import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { buildRequirements, ONBOARDING_NEEDS } from '../objects/account.js';

export interface Standing {
  detailsSubmitted: boolean;
  /** May charge cards and be paid out. */
  enabled: boolean;
  businessName?: string;
}

/** Puts a connected account into a standing, as its onboarding or a later review would, and says so. */
export function setStanding(desk: Desk, account: Stripe.Account, standing: Standing): void {
  const previous = viewOf(account);
  const capability = capabilityOf(standing);
  account.details_submitted = standing.detailsSubmitted;
  account.charges_enabled = standing.enabled;
  account.payouts_enabled = standing.enabled;
  account.capabilities = { card_payments: capability, transfers: capability };
  account.requirements = requirementsOf(standing);
  if (account.business_profile && standing.businessName !== undefined) {
    account.business_profile.name = standing.businessName;
  }
  desk.publish('account.updated', account, previous);
}

function viewOf(account: Stripe.Account): object {
  const { details_submitted, charges_enabled, payouts_enabled, capabilities, requirements } = account;
  return { details_submitted, charges_enabled, payouts_enabled, capabilities, requirements };
}

function capabilityOf(standing: Standing): 'active' | 'pending' | 'inactive' {
  if (standing.enabled) return 'active';
  return standing.detailsSubmitted ? 'pending' : 'inactive';
}

function requirementsOf(standing: Standing): Stripe.Account.Requirements {
  if (standing.enabled) return buildRequirements([], null);
  if (standing.detailsSubmitted) return buildRequirements([], 'under_review');
  return buildRequirements(ONBOARDING_NEEDS, 'requirements.past_due');
}
