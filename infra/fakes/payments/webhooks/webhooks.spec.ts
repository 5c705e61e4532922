import type Stripe from 'stripe';
import { Receiver } from '../testing/receiver.js';
import { SECRET, startRig, type Rig } from '../testing/rig.js';
import { openAccount, paymentParams, subscribe } from '../testing/scenes.js';

interface Listed {
  deliveries: { eventType: string; status: string; attempts: number; lastStatus: number | null }[];
}

describe('webhooks', () => {
  let rig: Rig;

  beforeEach(async () => {
    rig = await startRig();
  });
  afterEach(() => rig.close());

  const customerAndExpiry = async (): Promise<Stripe.Checkout.Session> => {
    const session = await rig.stripe.checkout.sessions.create(paymentParams());
    return rig.stripe.checkout.sessions.expire(session.id, {}, { idempotencyKey: `expire-${session.id}` });
  };

  it('are signed as the SDK checks, and carry what caused them', async () => {
    const session = await customerAndExpiry();
    await rig.receiver.waitFor(1);
    const [got] = rig.receiver.received;
    const event = rig.stripe.webhooks.constructEvent(String(got?.payload), String(got?.signature), SECRET);
    expect(event).toMatchObject({
      type: 'checkout.session.expired',
      data: { object: { id: session.id, status: 'expired' } },
      pending_webhooks: 1,
      request: { idempotency_key: `expire-${session.id}` },
    });
    expect(event.account).toBeUndefined();
    const wrong = (): unknown =>
      rig.stripe.webhooks.constructEvent(String(got?.payload), String(got?.signature), 'whsec_other');
    expect(wrong).toThrow('No signatures found matching');
    const found = await rig.stripe.events.retrieve(event.id);
    expect(found).toMatchObject({ id: event.id, pending_webhooks: 0 });
  });

  it('name the connected account, and keep the object as it was', async () => {
    const account = await openAccount(rig);
    const session = await rig.stripe.checkout.sessions.create(paymentParams(), { stripeAccount: account });
    await rig.control('PUT', '/delivery', { mode: 'hold' });
    await rig.submit(session.url, { action: 'pay', card: 'pays' });
    const paid = await rig.stripe.checkout.sessions.retrieve(session.id, {}, { stripeAccount: account });
    const refund = { payment_intent: String(paid.payment_intent) };
    await rig.stripe.refunds.create(refund, { stripeAccount: account });
    await rig.control('POST', '/flush');
    const charges = rig.receiver.received.filter((one) => one.type.startsWith('charge.'));
    const events = charges.map((one) => JSON.parse(one.payload) as Stripe.Event);
    expect(events.map((event) => [event.type, event.account])).toEqual([
      ['charge.succeeded', account],
      ['charge.refunded', account],
    ]);
    expect(events.map((event) => (event.data.object as Stripe.Charge).refunded)).toEqual([false, true]);
  });

  it('are tried again, with a fresh signature, until taken', async () => {
    rig.receiver.statuses = [500, 302];
    await customerAndExpiry();
    await rig.receiver.waitFor(3);
    expect(new Set(rig.receiver.received.map((one) => one.id)).size).toBe(1);
    await new Promise((resolve) => setTimeout(resolve, 100));
    const { deliveries } = (await rig.control('GET', '/deliveries')) as Listed;
    expect(deliveries).toMatchObject([{ status: 'delivered', attempts: 3, lastStatus: 200 }]);
    expect(rig.receiver.received).toHaveLength(3);
  });

  it('are given up after eight tries', async () => {
    await rig.close();
    rig = await startRig({ retryBaseMs: 1 });
    rig.receiver.status = 503;
    await customerAndExpiry();
    await rig.receiver.waitFor(8);
    await new Promise((resolve) => setTimeout(resolve, 300));
    const { deliveries } = (await rig.control('GET', '/deliveries')) as Listed;
    expect(deliveries).toMatchObject([{ status: 'failed', attempts: 8, lastStatus: 503 }]);
  });

  it('come twice on demand, and only those of the named types', async () => {
    const mode = { mode: 'duplicate', copies: 3, types: ['invoice.paid'] };
    await rig.control('PUT', '/delivery', mode);
    await subscribe(rig);
    await rig.receiver.waitFor(7);
    const paid = rig.receiver.received.filter((one) => one.type === 'invoice.paid');
    expect(paid).toHaveLength(3);
    expect(new Set(paid.map((one) => one.id)).size).toBe(1);
  });

  it('come in reverse on demand', async () => {
    await rig.control('PUT', '/delivery', { mode: 'reverse', delayMs: 100 });
    await subscribe(rig);
    await rig.receiver.waitFor(5);
    expect(rig.receiver.types()[0]).toBe('checkout.session.completed');
    expect(rig.receiver.types()[4]).toBe('customer.subscription.created');
  });

  it('come late on demand', async () => {
    await rig.control('PUT', '/delivery', { mode: 'delay', delayMs: 300 });
    const begun = Date.now();
    await customerAndExpiry();
    await rig.receiver.waitFor(1);
    expect(Date.now() - begun).toBeGreaterThanOrEqual(290);
  });

  it('are held until flushed, in either order', async () => {
    await rig.control('PUT', '/delivery', { mode: 'hold' });
    await subscribe(rig);
    await new Promise((resolve) => setTimeout(resolve, 100));
    expect(rig.receiver.received).toHaveLength(0);
    const { deliveries } = (await rig.control('POST', '/flush', { order: 'reverse' })) as Listed;
    expect(deliveries.map((one) => one.status)).toEqual(Array(5).fill('delivered'));
    expect(rig.receiver.types().at(-1)).toBe('customer.subscription.created');
  });

  it('are lost on demand, and can be sent again, many at once', async () => {
    await rig.control('PUT', '/delivery', { mode: 'drop' });
    await customerAndExpiry();
    await new Promise((resolve) => setTimeout(resolve, 100));
    expect(rig.receiver.received).toHaveLength(0);
    const { events } = (await rig.control('GET', '/events')) as { events: Stripe.Event[] };
    const path = `/events/${String(events[0]?.id)}/resend`;
    const { statuses } = (await rig.control('POST', path, { copies: 20, parallel: true })) as {
      statuses: number[];
    };
    expect(statuses).toEqual(Array(20).fill(200));
    expect(rig.receiver.received).toHaveLength(20);
  });

  it('can be forged: old stamp, other secret, changed text, none of which the SDK takes', async () => {
    await customerAndExpiry();
    await rig.receiver.waitFor(1);
    const path = `/events/${String(rig.receiver.received[0]?.id)}/resend`;
    await rig.control('POST', path, { signedSecondsAgo: 600 });
    await rig.control('POST', path, { secret: 'whsec_thief' });
    await rig.control('POST', path, { tampered: true });
    const reasons = rig.receiver.received.slice(1).map((got) => {
      try {
        return rig.stripe.webhooks.constructEvent(got.payload, got.signature, SECRET).id;
      } catch (error) {
        return String((error as Error).message).split('.')[0];
      }
    });
    const unsigned = 'No signatures found matching the expected signature for payload';
    expect(reasons).toEqual(['Timestamp outside the tolerance zone', unsigned, unsigned]);
  });

  it('go to the receivers set by control, each with its share', async () => {
    const connected = await Receiver.start();
    const endpoints = [
      { url: rig.receiver.url, secret: SECRET, sends: 'platform' },
      { url: connected.url, secret: 'whsec_connect', sends: 'connected' },
    ];
    await rig.control('PUT', '/webhooks', { endpoints });
    await openAccount(rig);
    await customerAndExpiry();
    await Promise.all([connected.waitFor(1), rig.receiver.waitFor(1)]);
    expect(connected.types()).toEqual(['account.updated']);
    expect(rig.receiver.types()).toEqual(['checkout.session.expired']);
    await connected.close();
  });
});
