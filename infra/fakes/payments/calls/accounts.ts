import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { newId } from '../ids.js';
import { buildAccount } from '../objects/account.js';
import { onShelf } from '../state/book.js';
import { call, expandable, type Call } from '../wire/call.js';
import { ApiError, invalid, noSuch } from '../wire/error.js';
import { mergeMetadata, metadata } from '../wire/metadata.js';
import { email, flag, oneOf, text, url } from '../wire/scalars.js';
import { fields, may, must, type Names } from '../wire/spec.js';

const requested = may(fields({ requested: must(flag()) }));

const controller = fields({
  fees: may(fields({ payer: must(oneOf('account', 'application')) })),
  losses: may(fields({ payments: must(oneOf('application', 'stripe')) })),
  requirement_collection: may(oneOf('application', 'stripe')),
  stripe_dashboard: may(fields({ type: must(oneOf('express', 'full', 'none')) })),
} satisfies Names<Stripe.AccountCreateParams.Controller>);

const createParams = fields({
  business_profile: may(
    fields({
      name: may(text()),
      url: may(url()),
    } satisfies Names<Stripe.AccountCreateParams.BusinessProfile>),
  ),
  business_type: may(oneOf('company', 'government_entity', 'individual', 'non_profit')),
  capabilities: may(
    fields({
      card_payments: requested,
      transfers: requested,
    } satisfies Names<Stripe.AccountCreateParams.Capabilities>),
  ),
  controller: may(controller),
  country: may(oneOf('US')),
  email: may(email()),
  metadata: may(metadata()),
  type: may(oneOf('custom', 'express', 'standard')),
  ...expandable,
} satisfies Names<Stripe.AccountCreateParams>);

type CreateParams = ReturnType<typeof createParams.read>;

const create = call({
  method: 'post',
  path: '/v1/accounts',
  params: createParams,
  run(desk, params) {
    platformOnly(desk);
    if (params.type !== undefined && params.controller !== undefined) {
      throw invalid('Give one of these parameters: type, controller.', 'controller');
    }
    const account = accountFrom(desk, params);
    desk.state.accounts[account.id] = account;
    return account;
  },
});

function accountFrom(desk: Desk, params: CreateParams): Stripe.Account {
  return buildAccount({
    id: newId('acct_', 16),
    wish: {
      type: params.type,
      feesPayer: params.controller?.fees?.payer,
      lossesPayments: params.controller?.losses?.payments,
      requirementCollection: params.controller?.requirement_collection,
      dashboard: params.controller?.stripe_dashboard?.type,
    },
    country: params.country ?? 'US',
    email: params.email ?? null,
    businessType: params.business_type ?? null,
    businessName: params.business_profile?.name ?? null,
    businessUrl: params.business_profile?.url ?? null,
    metadata: mergeMetadata({}, params.metadata),
    now: desk.now(),
  });
}

/** Errors: 403 when asked in a connected account's name. */
export function platformOnly(desk: Desk): void {
  if (desk.account === null) return;
  const message = 'Only the platform itself can do this.';
  throw new ApiError(403, { type: 'invalid_request_error', code: 'account_invalid', message });
}

const retrieveParams = fields({ ...expandable } satisfies Names<Stripe.AccountRetrieveParams>);

const retrieve = call({
  method: 'get',
  path: '/v1/accounts/:id',
  params: retrieveParams,
  run(desk, _params, id) {
    const account = onShelf(desk.state.accounts, id);
    const foreign = desk.account !== null && desk.account !== id;
    if (account === undefined || foreign) throw noSuch('account', id, 'id', 404);
    return account;
  },
});

/** The account the request acts for: the connected one, or the platform's own. */
const retrieveCurrent = call({
  method: 'get',
  path: '/v1/account',
  params: retrieveParams,
  run(desk) {
    const id = desk.account ?? desk.state.platformId;
    const account = onShelf(desk.state.accounts, id);
    if (account === undefined) throw noSuch('account', id, 'id', 404);
    return account;
  },
});

export const accountCalls: Call[] = [create, retrieve, retrieveCurrent];
