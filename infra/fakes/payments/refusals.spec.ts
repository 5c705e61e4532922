import Stripe from 'stripe';
import { clientFor, KEY, PRICE, startRig, type Rig } from './testing/rig.js';
import { inDays, paymentParams } from './testing/scenes.js';

type Params = Stripe.Checkout.SessionCreateParams;

/** What a mistaken caller would send: the SDK's types would stop it. */
function mistaken<T>(params: object): T {
  return params as T;
}

describe('what is refused', () => {
  let rig: Rig;
  let stripe: Stripe;

  beforeAll(async () => {
    rig = await startRig();
    stripe = rig.stripe;
  });
  afterAll(() => rig.close());

  const refusals: [string, object, object][] = [
    ['an unknown parameter', { surplus: 1 }, { code: 'parameter_unknown', param: 'surplus' }],
    [
      'an unknown parameter deep inside',
      { payment_intent_data: { surplus: 'x' } },
      { code: 'parameter_unknown', param: 'payment_intent_data[surplus]' },
    ],
    [
      'a parameter the provider knows and our product never sends',
      { allow_promotion_codes: true },
      { code: 'parameter_unknown', param: 'allow_promotion_codes' },
    ],
    ['a missing parameter', { success_url: undefined }, { code: 'parameter_missing', param: 'success_url' }],
    ['a parameter emptied', { client_reference_id: '' }, { code: 'parameter_invalid_empty' }],
    ['text for a number', { expires_at: 'soon' }, { code: 'parameter_invalid_integer', param: 'expires_at' }],
    ['text for an object', { metadata: 'x' }, { param: 'metadata' }],
    ['text for a list', { line_items: 'x' }, { param: 'line_items' }],
    ['a list for text', { success_url: ['a', 'b'] }, { param: 'success_url' }],
    ['an unknown mode', { mode: 'gift' }, { param: 'mode' }],
    [
      'an address that is none',
      { cancel_url: 'javascript:alert(1)' },
      { code: 'url_invalid', param: 'cancel_url' },
    ],
    [
      'an email that is none',
      { customer_email: 'nobody' },
      { code: 'email_invalid', param: 'customer_email' },
    ],
    ['no lines', { line_items: [] }, { code: 'parameter_missing', param: 'line_items' }],
    [
      'a customer that is not there',
      { customer: 'cus_x', customer_email: undefined },
      { code: 'resource_missing' },
    ],
    ['both customer and email', { customer: 'cus_x' }, { param: 'customer_email' }],
    ['an expiry too near', { expires_at: Math.floor(Date.now() / 1000) + 60 }, { param: 'expires_at' }],
    [
      'subscription data for a payment',
      { subscription_data: { metadata: { a: 'b' } } },
      { param: 'subscription_data' },
    ],
    ['too much metadata', { metadata: { key: 'x'.repeat(501) } }, { param: 'metadata[key]' }],
  ];

  it.each(refusals)('%s', async (_name, change, expected) => {
    const params = mistaken<Params>({ ...paymentParams(), ...change });
    await expect(stripe.checkout.sessions.create(params)).rejects.toMatchObject({
      type: 'StripeInvalidRequestError',
      rawType: 'invalid_request_error',
      statusCode: 400,
      ...expected,
    });
  });

  const lines: [string, object, object][] = [
    ['an amount too small to charge', { unit_amount: 49 }, { code: 'amount_too_small' }],
    [
      'an amount too large to charge',
      { unit_amount: 100_000_000 },
      { param: 'line_items[0][price_data][unit_amount]' },
    ],
    ['half a cent', { unit_amount: 100.5 }, { code: 'parameter_invalid_integer' }],
    ['a product without a name', { product_data: { description: 'x' } }, { code: 'parameter_missing' }],
  ];

  it.each(lines)('%s', async (_name, change, expected) => {
    const data = { currency: 'usd', unit_amount: 1000, product_data: { name: 'Invoice' }, ...change };
    const params = { ...paymentParams(), line_items: [{ quantity: 1, price_data: data }] };
    await expect(stripe.checkout.sessions.create(params)).rejects.toMatchObject({
      statusCode: 400,
      ...expected,
    });
  });

  it('a price of the wrong kind, or none, for the mode', async () => {
    const once = { ...paymentParams(), line_items: [{ price: PRICE, quantity: 1 }] };
    await expect(stripe.checkout.sessions.create(once)).rejects.toMatchObject({
      param: 'line_items[0][price]',
    });
    const none = { ...paymentParams(), line_items: [{ price: 'price_none', quantity: 1 }] };
    await expect(stripe.checkout.sessions.create(none)).rejects.toMatchObject({ code: 'resource_missing' });
  });

  it('a trial that ends within two days', async () => {
    const params: Params = {
      mode: 'subscription',
      line_items: [{ price: PRICE, quantity: 1 }],
      subscription_data: { trial_end: inDays(1) },
      success_url: 'http://app.test/done',
    };
    await expect(stripe.checkout.sessions.create(params)).rejects.toMatchObject({
      param: 'subscription_data[trial_end]',
    });
  });

  it('unknown parameters of every other call', async () => {
    const surplus = mistaken<never>({ surplus: '1' });
    const calls = [
      stripe.customers.create(surplus),
      stripe.customers.retrieve('cus_x', surplus),
      stripe.checkout.sessions.retrieve('cs_x', surplus),
      stripe.checkout.sessions.expire('cs_x', surplus),
      stripe.billingPortal.sessions.create(surplus),
      stripe.subscriptions.retrieve('sub_x', surplus),
      stripe.subscriptions.update('sub_x', surplus),
      stripe.subscriptions.cancel('sub_x', surplus),
      stripe.prices.retrieve('price_x', surplus),
      stripe.prices.list(surplus),
      stripe.events.retrieve('evt_x', surplus),
      stripe.accounts.create(surplus),
      stripe.accounts.retrieve('acct_x', surplus),
      stripe.accountLinks.create(surplus),
      stripe.paymentIntents.retrieve('pi_x', surplus),
      stripe.refunds.create(surplus),
    ];
    for (const outcome of await Promise.allSettled(calls)) {
      expect(outcome).toMatchObject({
        status: 'rejected',
        reason: { code: 'parameter_unknown', param: 'surplus' },
      });
    }
  });

  it('ids that are not there, those of the language included', async () => {
    for (const id of ['cus_nobody', '__proto__', 'constructor']) {
      await expect(stripe.customers.retrieve(id)).rejects.toMatchObject({
        statusCode: 404,
        code: 'resource_missing',
      });
      await expect(stripe.prices.retrieve(id)).rejects.toMatchObject({ statusCode: 404 });
      await expect(stripe.subscriptions.retrieve(id)).rejects.toMatchObject({ statusCode: 404 });
      await expect(stripe.paymentIntents.retrieve(id)).rejects.toMatchObject({ statusCode: 404 });
      await expect(stripe.events.retrieve(id)).rejects.toMatchObject({ statusCode: 404 });
      await expect(stripe.accounts.retrieve(id)).rejects.toMatchObject({ statusCode: 404 });
    }
  });

  it('a property that cannot be expanded', async () => {
    const customer = await stripe.customers.create({});
    const wrong = stripe.customers.retrieve(customer.id, { expand: ['email'] });
    await expect(wrong).rejects.toMatchObject({ statusCode: 400, param: 'expand' });
  });

  it('a wrong key, and never shows it whole', async () => {
    const other = new Stripe('sk_test_of_somebody_else', {
      host: '127.0.0.1',
      port: rig.fake.port,
      protocol: 'http',
      maxNetworkRetries: 0,
    });
    const failure: unknown = await other.customers.create({}).catch((error: unknown) => error);
    expect(failure).toMatchObject({ type: 'StripeAuthenticationError', statusCode: 401 });
    expect((failure as Error).message).not.toContain('sk_test_of_somebody_else');
  });

  it('another version of the API', async () => {
    const old = clientFor(rig.fake).customers.create({}, { apiVersion: '2020-08-27' });
    await expect(old).rejects.toMatchObject({ statusCode: 400 });
  });

  it('calls our product never makes', async () => {
    await expect(stripe.coupons.list()).rejects.toMatchObject({
      statusCode: 404,
      type: 'StripeInvalidRequestError',
    });
  });

  it('malformed, repeated, too deep and too large bodies', async () => {
    const post = (body: string): Promise<Response> =>
      fetch(`${rig.fake.url}/v1/customers`, {
        method: 'POST',
        headers: { authorization: `Bearer ${KEY}` },
        body,
      });
    const deep = `metadata${'[a]'.repeat(20)}=1`;
    for (const body of ['name=a&name=b', 'name[=1', 'name=a&name[b]=c', deep, '{"name":"a"}']) {
      const answer = await post(body);
      expect(answer.status).toBe(400);
      expect(await answer.json()).toMatchObject({ error: { type: 'invalid_request_error' } });
    }
    expect((await post(`name=${'x'.repeat(300_000)}`)).status).toBe(413);
  });
});
