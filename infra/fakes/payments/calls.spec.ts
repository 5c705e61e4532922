import type Stripe from 'stripe';
import { PRICE, startRig, type Rig } from './testing/rig.js';
import { inDays, openAccount, paymentParams, subscribe } from './testing/scenes.js';

describe('the calls, through the SDK', () => {
  let rig: Rig;
  let stripe: Stripe;

  beforeAll(async () => {
    rig = await startRig();
    stripe = rig.stripe;
  });
  afterAll(() => rig.close());

  it('makes and finds a customer', async () => {
    const made = await stripe.customers.create({ email: 'a@example.com', metadata: { shop: '7' } });
    const found = await stripe.customers.retrieve(made.id);
    expect(made.id).toMatch(/^cus_[A-Za-z0-9]{14}$/);
    expect(found).toMatchObject({ id: made.id, email: 'a@example.com', metadata: { shop: '7' } });
    expect(found.lastResponse.requestId).toMatch(/^req_/);
  });

  it('has the seeded price, with decimals the SDK reads, and lists it', async () => {
    const price = await stripe.prices.retrieve(PRICE);
    expect(price).toMatchObject({ unit_amount: 2900, currency: 'usd', recurring: { interval: 'month' } });
    expect(price.unit_amount_decimal?.toString()).toBe('2900');
    const all = await stripe.prices.list({ active: true, type: 'recurring', expand: ['data.product'] });
    expect(all.data.map((one) => one.id)).toEqual([PRICE]);
    expect(all.data[0]?.product).toMatchObject({ object: 'product' });
  });

  it('pages through prices', async () => {
    for (const id of ['price_test_a', 'price_test_b']) {
      await rig.control('POST', '/prices', { id, unitAmountCents: 100, currency: 'eur' });
    }
    const first = await stripe.prices.list({ currency: 'eur', limit: 1 });
    expect(first).toMatchObject({ has_more: true, data: [{ id: 'price_test_b' }] });
    const next = await stripe.prices.list({ currency: 'eur', limit: 1, starting_after: 'price_test_b' });
    expect(next).toMatchObject({ has_more: false, data: [{ id: 'price_test_a' }] });
  });

  it('opens a connected account by type or by controller, never by both', async () => {
    const standard = await stripe.accounts.create({ type: 'standard' });
    expect(standard).toMatchObject({ type: 'standard', charges_enabled: false, details_submitted: false });
    const controller = {
      fees: { payer: 'application' },
      losses: { payments: 'application' },
      stripe_dashboard: { type: 'express' },
    } as const;
    const express = await stripe.accounts.create({
      controller,
      capabilities: { transfers: { requested: true } },
    });
    expect(express).toMatchObject({ type: 'express', controller: { fees: { payer: 'application' } } });
    await expect(stripe.accounts.create({ type: 'custom', controller })).rejects.toMatchObject({
      statusCode: 400,
      param: 'controller',
    });
  });

  it('gives the account a request acts for, or the platform', async () => {
    const account = await openAccount(rig);
    const own = await stripe.accounts.retrieve(null, {}, { stripeAccount: account });
    const platform = await stripe.accounts.retrieveCurrent();
    expect(own.id).toBe(account);
    expect(platform.id).not.toBe(account);
    expect(platform.charges_enabled).toBe(true);
  });

  it('keeps the books of accounts apart', async () => {
    const [one, other] = [await openAccount(rig), await openAccount(rig)];
    const session = await stripe.checkout.sessions.create(paymentParams(), { stripeAccount: one });
    const missing = { statusCode: 404, code: 'resource_missing', param: 'session' };
    await expect(stripe.checkout.sessions.retrieve(session.id)).rejects.toMatchObject(missing);
    const elsewhere = stripe.checkout.sessions.retrieve(session.id, {}, { stripeAccount: other });
    await expect(elsewhere).rejects.toMatchObject(missing);
    const at = await stripe.checkout.sessions.retrieve(session.id, {}, { stripeAccount: one });
    expect(at.id).toBe(session.id);
  });

  it('refuses an account that is not connected, and a charge before onboarding is done', async () => {
    const stranger = stripe.customers.create({}, { stripeAccount: 'acct_stranger' });
    await expect(stranger).rejects.toMatchObject({ statusCode: 403, code: 'account_invalid' });
    const account = await stripe.accounts.create({ type: 'standard' });
    const early = stripe.checkout.sessions.create(paymentParams(), { stripeAccount: account.id });
    await expect(early).rejects.toMatchObject({ statusCode: 403, code: 'account_invalid' });
  });

  it('makes, finds and expires a payment session', async () => {
    const shop = { stripeAccount: await openAccount(rig) };
    const expiresAt = Math.floor(Date.now() / 1000) + 3600;
    const made = await stripe.checkout.sessions.create({ ...paymentParams(), expires_at: expiresAt }, shop);
    expect(made).toMatchObject({
      status: 'open',
      payment_status: 'unpaid',
      amount_total: 125_000,
      currency: 'usd',
      customer_email: 'customer@example.com',
      client_reference_id: 'invoice-1042',
      metadata: { invoice: '1042' },
      expires_at: expiresAt,
      payment_intent: null,
    });
    expect(made.id).toMatch(/^cs_test_/);
    const expired = await stripe.checkout.sessions.expire(made.id, {}, shop);
    expect(expired).toMatchObject({ status: 'expired', url: null });
    await expect(stripe.checkout.sessions.expire(made.id, {}, shop)).rejects.toMatchObject({
      statusCode: 400,
    });
  });

  it('refunds in part, then the rest, and never more', async () => {
    const shop = { stripeAccount: await openAccount(rig) };
    const session = await stripe.checkout.sessions.create(paymentParams(10_000), shop);
    await rig.submit(session.url, { action: 'pay', card: 'pays' });
    const expand = ['payment_intent'];
    const paid = await stripe.checkout.sessions.retrieve(session.id, { expand }, shop);
    const intent = paid.payment_intent as Stripe.PaymentIntent;
    expect(intent).toMatchObject({
      status: 'succeeded',
      amount_received: 10_000,
      metadata: { invoice: '1042' },
    });
    const part = await stripe.refunds.create({ payment_intent: intent.id, amount: 4000 }, shop);
    expect(part).toMatchObject({ amount: 4000, status: 'succeeded', charge: intent.latest_charge });
    const tooMuch = stripe.refunds.create({ payment_intent: intent.id, amount: 6001 }, shop);
    await expect(tooMuch).rejects.toMatchObject({ statusCode: 400, param: 'amount' });
    const rest = await stripe.refunds.create({ charge: String(intent.latest_charge) }, shop);
    expect(rest.amount).toBe(6000);
    const again = stripe.refunds.create({ payment_intent: intent.id }, shop);
    await expect(again).rejects.toMatchObject({ code: 'charge_already_refunded' });
    const after = await stripe.paymentIntents.retrieve(intent.id, { expand: ['latest_charge'] }, shop);
    expect(after.latest_charge).toMatchObject({ refunded: true, amount_refunded: 10_000 });
  });

  it('takes the fee off a charge and nothing off a refund', async () => {
    const shop = { stripeAccount: await openAccount(rig) };
    const session = await stripe.checkout.sessions.create(paymentParams(10_000), shop);
    await rig.submit(session.url, { action: 'pay', card: 'pays' });
    const paid = await stripe.checkout.sessions.retrieve(session.id, {}, shop);
    const expand = ['latest_charge.balance_transaction'];
    const intent = await stripe.paymentIntents.retrieve(String(paid.payment_intent), { expand }, shop);
    const entry = (intent.latest_charge as Stripe.Charge).balance_transaction;
    expect(entry).toMatchObject({ amount: 10_000, fee: 320, net: 9680 });
  });

  it('changes the quantity of a subscription and cancels it once', async () => {
    const { subscription: id } = await subscribe(rig, 3);
    const before = await stripe.subscriptions.retrieve(id);
    expect(before).toMatchObject({ status: 'active', metadata: { shop: 'shop-1' } });
    const items = [{ id: String(before.items.data[0]?.id), quantity: 5 }];
    const after = await stripe.subscriptions.update(id, { items, proration_behavior: 'none' });
    expect(after.items.data[0]?.quantity).toBe(5);
    const gone = await stripe.subscriptions.cancel(id);
    expect(gone.status).toBe('canceled');
    await expect(stripe.subscriptions.cancel(id)).rejects.toMatchObject({ code: 'resource_missing' });
    await expect(stripe.subscriptions.update(id, { metadata: { a: 'b' } })).rejects.toMatchObject({
      statusCode: 400,
    });
  });

  it('starts a trial that costs nothing now', async () => {
    const end = inDays(9);
    const { subscription: id } = await subscribe(rig, 2, end);
    const trial = await stripe.subscriptions.retrieve(id, { expand: ['latest_invoice'] });
    expect(trial).toMatchObject({ status: 'trialing', trial_end: end });
    expect(trial.latest_invoice).toMatchObject({ amount_due: 0, status: 'paid' });
    expect(trial.items.data[0]?.current_period_end).toBe(end);
  });

  it('opens the portal for a customer it knows', async () => {
    const customer = await stripe.customers.create({});
    const portal = await stripe.billingPortal.sessions.create({
      customer: customer.id,
      return_url: 'http://app.test/plan',
    });
    expect(portal).toMatchObject({ customer: customer.id, return_url: 'http://app.test/plan' });
    const page = await fetch(portal.url);
    expect(page.status).toBe(200);
    const stranger = stripe.billingPortal.sessions.create({ customer: 'cus_nobody' });
    await expect(stranger).rejects.toMatchObject({
      statusCode: 400,
      code: 'resource_missing',
      param: 'customer',
    });
  });

  it('finds an event in the account it happened on', async () => {
    const account = await openAccount(rig);
    const answer = await rig.control('GET', `/events?type=account.updated&object=${account}`);
    const { events } = answer as { events: Stripe.Event[] };
    const id = String(events[0]?.id);
    const found = await stripe.events.retrieve(id, {}, { stripeAccount: account });
    expect(found).toMatchObject({ id, type: 'account.updated', account });
    await expect(stripe.events.retrieve(id)).rejects.toMatchObject({ statusCode: 404 });
  });
});
