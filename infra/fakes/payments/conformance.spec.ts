import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type Stripe from 'stripe';
import { differences } from './testing/conformance.js';
import { PRICE, startRig, type Rig } from './testing/rig.js';
import { inDays, openAccount, paymentParams, subscribe } from './testing/scenes.js';

const FOLDER = join(__dirname, 'fixtures');

function example(kind: string): Record<string, unknown> | undefined {
  const file = join(FOLDER, `${kind}.json`);
  return existsSync(file) ? (JSON.parse(readFileSync(file, 'utf8')) as Record<string, unknown>) : undefined;
}

/** As the wire carries it: the SDK turns decimals into objects of its own, which write themselves as text again. */
function wire(object: object): Record<string, unknown> {
  return JSON.parse(JSON.stringify(object)) as Record<string, unknown>;
}

function check(object: object): string[] {
  return differences(wire(object), example);
}

describe('objects against the published examples', () => {
  let rig: Rig;

  beforeAll(async () => {
    rig = await startRig();
  });
  afterAll(() => rig.close());

  it('notices a key too many, a key too few and another type', () => {
    const link = { object: 'account_link', created: 'today', expires_at: 1, surplus: true };
    expect(differences(link, example)).toEqual([
      'account_link: surplus is not in the example',
      'account_link: url is missing',
      'account_link: created is string, in the example number',
    ]);
  });

  it('accounts and their links', async () => {
    const { stripe } = rig;
    const account = await stripe.accounts.create({ type: 'standard', email: 'a@example.com' });
    const address = { refresh_url: 'http://s.test/a', return_url: 'http://s.test/b' };
    const link = await stripe.accountLinks.create({
      account: account.id,
      type: 'account_onboarding',
      ...address,
    });
    await rig.submit(link.url, { action: 'complete', business_name: 'Shop' });
    const done = await stripe.accounts.retrieve(account.id);
    expect([account, link, done].flatMap(check)).toEqual([]);
  });

  it('customers, prices with their product, portal sessions', async () => {
    const { stripe } = rig;
    const customer = await stripe.customers.create({ email: 'c@example.com' });
    const price = await stripe.prices.retrieve(PRICE, { expand: ['product'] });
    const portal = await stripe.billingPortal.sessions.create({ customer: customer.id });
    expect((price.product as Stripe.Product).object).toBe('product');
    expect([customer, price, portal].flatMap(check)).toEqual([]);
  });

  it('a payment: session, lines, intent, charge, balance entries, refund', async () => {
    const { stripe } = rig;
    const shop = { stripeAccount: await openAccount(rig) };
    const open = await stripe.checkout.sessions.create({ ...paymentParams(), expand: ['line_items'] }, shop);
    expect(open.line_items?.data[0]?.object).toBe('item');
    await rig.submit(open.url, { action: 'pay', card: 'declined' });
    const declined = await stripe.checkout.sessions.retrieve(open.id, { expand: ['payment_intent'] }, shop);
    expect((declined.payment_intent as Stripe.PaymentIntent).last_payment_error).not.toBeNull();
    await rig.submit(open.url, { action: 'pay', card: 'pays' });
    const paid = await stripe.checkout.sessions.retrieve(open.id, {}, shop);
    const expand = ['latest_charge.balance_transaction', 'payment_method'];
    const intent = await stripe.paymentIntents.retrieve(String(paid.payment_intent), { expand }, shop);
    expect((intent.latest_charge as Stripe.Charge).balance_transaction).toMatchObject({ type: 'charge' });
    expect((intent.payment_method as Stripe.PaymentMethod).object).toBe('payment_method');
    const whole = { payment_intent: intent.id, amount: 1000, expand: ['charge', 'balance_transaction'] };
    const refund = await stripe.refunds.create(whole, shop);
    expect((refund.charge as Stripe.Charge).refunds?.data[0]?.object).toBe('refund');
    expect([open, declined, paid, intent, refund].flatMap(check)).toEqual([]);
  });

  it('subscriptions with items, plan and invoices, in trial and after', async () => {
    const { stripe } = rig;
    const { subscription: id } = await subscribe(rig, 2, inDays(10));
    const expand = ['latest_invoice', 'default_payment_method', 'customer'];
    const trial = await stripe.subscriptions.retrieve(id, { expand });
    await rig.control('POST', `/subscriptions/${id}/advance`, { to: 'trial_end' });
    const itemId = String(trial.items.data[0]?.id);
    await stripe.subscriptions.update(id, { items: [{ id: itemId, quantity: 4 }] });
    await rig.control('POST', `/subscriptions/${id}/advance`, { to: 'past_due' });
    const overdue = await stripe.subscriptions.retrieve(id, { expand });
    expect((overdue.latest_invoice as Stripe.Invoice).lines.data).toHaveLength(3);
    const gone = await stripe.subscriptions.cancel(id);
    expect([trial, overdue, gone].flatMap(check)).toEqual([]);
  });

  it('every event that was sent, with the object it carries', async () => {
    const { events } = (await rig.control('GET', '/events')) as { events: Stripe.Event[] };
    expect(events.length).toBeGreaterThan(10);
    const carried = events.map((event) => event.data.object);
    expect([...events, ...carried].flatMap(check)).toEqual([]);
  });
});
