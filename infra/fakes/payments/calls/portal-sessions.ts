import type Stripe from 'stripe';
import { newId } from '../ids.js';
import { buildPortalSession } from '../objects/portal-session.js';
import { onShelf } from '../state/book.js';
import { call, expandable, type Call } from '../wire/call.js';
import { noSuch } from '../wire/error.js';
import { text, url } from '../wire/scalars.js';
import { fields, may, must, type Names } from '../wire/spec.js';

/** The one set of portal rules this provider has. */
const CONFIGURATION = 'bpc_test_default';

const create = call({
  method: 'post',
  path: '/v1/billing_portal/sessions',
  params: fields({
    customer: must(text()),
    return_url: may(url()),
    ...expandable,
  } satisfies Names<Stripe.BillingPortal.SessionCreateParams>),
  run(desk, params) {
    if (onShelf(desk.book.customers, params.customer) === undefined) {
      throw noSuch('customer', params.customer, 'customer', 400);
    }
    const id = newId('bps_');
    const session = buildPortalSession({
      id,
      customer: params.customer,
      configuration: CONFIGURATION,
      returnUrl: params.return_url ?? null,
      url: desk.url(`/p/session/${id}`),
      now: desk.now(),
    });
    desk.book.portalSessions[id] = session;
    return session;
  },
});

export const portalSessionCalls: Call[] = [create];
