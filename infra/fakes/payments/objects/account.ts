import type Stripe from 'stripe';
import { emptyAddress } from './address.js';
import { accountTypeOf, buildController, type ControllerWish } from './account-controller.js';
import { buildAccountSettings } from './account-settings.js';
import { listOf } from './list.js';

/** What a new connected account still owes before it may take payments. */
export const ONBOARDING_NEEDS = ['business_profile.url', 'external_account', 'tos_acceptance.date'];

export interface AccountSource {
  id: string;
  wish: ControllerWish;
  country: string;
  email: string | null;
  businessType: Stripe.Account.BusinessType | null;
  businessName: string | null;
  businessUrl: string | null;
  metadata: Stripe.Metadata;
  now: number;
}

/** A connected account that has not been through onboarding: it can neither charge nor be paid out. */
export function buildAccount(from: AccountSource): Stripe.Account {
  return {
    id: from.id,
    object: 'account',
    business_profile: businessProfile(from.businessName, from.businessUrl),
    business_type: from.businessType,
    capabilities: { card_payments: 'inactive', transfers: 'inactive' },
    charges_enabled: false,
    controller: buildController(from.wish),
    country: from.country,
    created: from.now,
    default_currency: 'usd',
    details_submitted: false,
    email: from.email,
    external_accounts: listOf<Stripe.ExternalAccount>([], `/v1/accounts/${from.id}/external_accounts`),
    future_requirements: buildRequirements([], null),
    metadata: from.metadata,
    payouts_enabled: false,
    requirements: buildRequirements(ONBOARDING_NEEDS, 'requirements.past_due'),
    settings: buildAccountSettings(from.businessName),
    tos_acceptance: { date: null, ip: null, user_agent: null },
    type: accountTypeOf(from.wish),
  };
}

export function buildRequirements(
  due: string[],
  disabledReason: Stripe.Account.Requirements.DisabledReason | null,
): Stripe.Account.Requirements & Stripe.Account.FutureRequirements {
  return {
    alternatives: [],
    current_deadline: null,
    currently_due: [...due],
    disabled_reason: disabledReason,
    errors: [],
    eventually_due: [...due],
    past_due: [...due],
    pending_verification: [],
  };
}

function businessProfile(name: string | null, url: string | null): Stripe.Account.BusinessProfile {
  return {
    annual_revenue: null,
    estimated_worker_count: null,
    mcc: null,
    minority_owned_business_designation: null,
    name,
    product_description: null,
    specified_commercial_transactions_act_url: null,
    support_address: emptyAddress(),
    support_email: null,
    support_phone: null,
    support_url: null,
    url,
  };
}
