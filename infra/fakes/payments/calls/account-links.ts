import type Stripe from 'stripe';
import { newId } from '../ids.js';
import { buildAccountLink } from '../objects/account-link.js';
import { onShelf } from '../state/book.js';
import { call, expandable, type Call } from '../wire/call.js';
import { noSuch } from '../wire/error.js';
import { oneOf, text, url } from '../wire/scalars.js';
import { fields, may, must, type Names } from '../wire/spec.js';
import { platformOnly } from './accounts.js';

const VALID_SECONDS = 5 * 60;

const collectionOptions = fields({
  fields: may(oneOf('currently_due', 'eventually_due')),
  future_requirements: may(oneOf('include', 'omit')),
} satisfies Names<Stripe.AccountLinkCreateParams.CollectionOptions>);

const create = call({
  method: 'post',
  path: '/v1/account_links',
  params: fields({
    account: must(text()),
    collection_options: may(collectionOptions),
    refresh_url: must(url()),
    return_url: must(url()),
    type: must(oneOf('account_onboarding', 'account_update')),
    ...expandable,
  } satisfies Names<Stripe.AccountLinkCreateParams>),
  run(desk, params) {
    platformOnly(desk);
    if (onShelf(desk.state.accounts, params.account) === undefined) {
      throw noSuch('account', params.account, 'account', 400);
    }
    const token = newId('', 32);
    const expiresAt = desk.now() + VALID_SECONDS;
    desk.state.links[token] = {
      account: params.account,
      refreshUrl: params.refresh_url,
      returnUrl: params.return_url,
      expiresAt,
      used: false,
    };
    return buildAccountLink({ url: desk.url(`/setup/s/${token}`), expiresAt, now: desk.now() });
  },
});

export const accountLinkCalls: Call[] = [create];
