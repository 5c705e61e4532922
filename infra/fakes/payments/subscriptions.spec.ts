import type Stripe from 'stripe';
import { startRig, type Rig } from './testing/rig.js';
import { inDays, subscribe } from './testing/scenes.js';

const DAY = 24 * 60 * 60;

describe('the life of a subscription', () => {
  let rig: Rig;

  beforeEach(async () => {
    rig = await startRig();
  });
  afterEach(() => rig.close());

  const read = (id: string): Promise<Stripe.Subscription> =>
    rig.stripe.subscriptions.retrieve(id, { expand: ['latest_invoice'] });
  const advance = (id: string, to: string): Promise<unknown> =>
    rig.control('POST', `/subscriptions/${id}/advance`, { to });
  const types = async (): Promise<string[]> => {
    const { events } = (await rig.control('GET', '/events')) as { events: Stripe.Event[] };
    return events.map((event) => event.type);
  };

  it('tells of its start, in the order things happen', async () => {
    await subscribe(rig);
    expect(await types()).toEqual([
      'customer.subscription.created',
      'charge.succeeded',
      'payment_intent.succeeded',
      'invoice.paid',
      'checkout.session.completed',
    ]);
  });

  it('goes from trial to paid when its time has come, warned three days before', async () => {
    const { subscription: id } = await subscribe(rig, 2, inDays(10));
    const created = await types();
    await rig.control('POST', '/clock', { advanceSeconds: 8 * DAY });
    expect((await types()).slice(created.length)).toEqual(['customer.subscription.trial_will_end']);
    await rig.control('POST', '/clock', { advanceSeconds: 3 * DAY });
    const paid = await read(id);
    expect(paid).toMatchObject({ status: 'active', latest_invoice: { amount_paid: 5800, status: 'paid' } });
    expect((await types()).slice(created.length + 1)).toEqual([
      'charge.succeeded',
      'payment_intent.succeeded',
      'invoice.paid',
      'customer.subscription.updated',
    ]);
  });

  it('becomes overdue, then unpaid, then is paid and active again', async () => {
    const { subscription: id } = await subscribe(rig);
    const before = (await types()).length;
    await advance(id, 'past_due');
    const overdue = await read(id);
    expect(overdue).toMatchObject({
      status: 'past_due',
      latest_invoice: { status: 'open', attempt_count: 1 },
    });
    expect((await types()).slice(before)).toEqual([
      'payment_intent.payment_failed',
      'invoice.payment_failed',
      'customer.subscription.updated',
    ]);
    await advance(id, 'unpaid');
    expect(await read(id)).toMatchObject({
      status: 'unpaid',
      latest_invoice: { next_payment_attempt: null },
    });
    await advance(id, 'recovered');
    expect(await read(id)).toMatchObject({ status: 'active', latest_invoice: { status: 'paid' } });
  });

  it('pauses, resumes and ends on demand, each with its event', async () => {
    const { subscription: id } = await subscribe(rig);
    for (const [step, status, event] of [
      ['paused', 'paused', 'customer.subscription.paused'],
      ['resumed', 'active', 'customer.subscription.resumed'],
      ['canceled', 'canceled', 'customer.subscription.deleted'],
    ] as const) {
      await advance(id, step);
      expect((await read(id)).status).toBe(status);
      expect((await types()).at(-1)).toBe(event);
    }
    await expect(advance(id, 'renew')).rejects.toThrow('400');
  });

  it('puts old values into an update, of just what changed', async () => {
    const { subscription: id } = await subscribe(rig);
    await rig.stripe.subscriptions.update(id, { metadata: { note: 'x' } });
    const { events } = (await rig.control('GET', '/events?type=customer.subscription.updated')) as {
      events: Stripe.Event[];
    };
    expect(events.at(-1)?.data.previous_attributes).toEqual({ metadata: { shop: 'shop-1' } });
  });

  it('prorates a change of quantity on the next invoice, by the time left', async () => {
    const { subscription: id } = await subscribe(rig, 2);
    const item = (await read(id)).items.data[0];
    const length = Number(item?.current_period_end) - Number(item?.current_period_start);
    await rig.control('POST', '/clock', { advanceSeconds: Math.floor(length / 2) });
    await rig.stripe.subscriptions.update(id, { items: [{ id: String(item?.id), quantity: 3 }] });
    await advance(id, 'renew');
    const invoice = (await read(id)).latest_invoice as Stripe.Invoice;
    const [credit, charge, period] = invoice.lines.data;
    expect(period?.amount).toBe(3 * 2900);
    expect(Math.abs(Number(credit?.amount) + 2900)).toBeLessThanOrEqual(1);
    expect(Math.abs(Number(charge?.amount) - 4350)).toBeLessThanOrEqual(1);
    const sum = invoice.lines.data.reduce((total, line) => total + line.amount, 0);
    expect([invoice.total, invoice.amount_paid]).toEqual([sum, sum]);
  });

  it('charges nothing for a change within the trial or without proration', async () => {
    const { subscription: id } = await subscribe(rig, 2, inDays(10));
    const item = String((await read(id)).items.data[0]?.id);
    await rig.stripe.subscriptions.update(id, { items: [{ id: item, quantity: 4 }] });
    await advance(id, 'trial_end');
    await rig.stripe.subscriptions.update(id, {
      items: [{ id: item, quantity: 5 }],
      proration_behavior: 'none',
    });
    await advance(id, 'renew');
    expect((await read(id)).latest_invoice).toMatchObject({ amount_paid: 5 * 2900 });
  });

  it('invoices a change at once when asked, and takes a credit off the next invoice', async () => {
    const { subscription: id, customer } = await subscribe(rig, 4);
    const item = String((await read(id)).items.data[0]?.id);
    const items = [{ id: item, quantity: 1 }];
    await rig.stripe.subscriptions.update(id, { items, proration_behavior: 'always_invoice' });
    const credit = await rig.stripe.customers.retrieve(customer);
    expect(credit).toMatchObject({ balance: expect.any(Number) });
    const { balance } = credit as Stripe.Customer;
    expect(balance).toBeLessThan(-8600);
    await advance(id, 'renew');
    const invoice = (await read(id)).latest_invoice as Stripe.Invoice;
    expect(invoice).toMatchObject({ total: 2900, amount_due: 0, starting_balance: balance });
    expect(invoice.ending_balance).toBe(balance + 2900);
  });

  it('is overdue after a card that only fails later', async () => {
    const { subscription: id } = await subscribe(rig, 1, undefined, 'fails-later');
    expect((await read(id)).status).toBe('active');
    await advance(id, 'renew');
    expect((await read(id)).status).toBe('past_due');
  });
});
