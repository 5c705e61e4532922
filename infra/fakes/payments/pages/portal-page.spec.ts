import type Stripe from 'stripe';
import { startRig, type Rig } from '../testing/rig.js';
import { subscribe, type Started } from '../testing/scenes.js';

describe('the portal page', () => {
  let rig: Rig;
  let started: Started;
  let url: string;

  beforeAll(async () => {
    rig = await startRig();
  });
  afterAll(() => rig.close());
  beforeEach(async () => {
    started = await subscribe(rig);
    const { customer } = started;
    const portal = await rig.stripe.billingPortal.sessions.create({
      customer,
      return_url: 'http://app.test/plan',
    });
    url = portal.url;
  });

  const act = (action: string, more: Record<string, string> = {}): Promise<Response> =>
    rig.submit(url, { action, subscription: started.subscription, ...more });
  const read = (): Promise<Stripe.Subscription> => rig.stripe.subscriptions.retrieve(started.subscription);

  it('shows the subscription, says it is a test and marks the test controls', async () => {
    const text = await (await fetch(url)).text();
    expect(text).toContain('Test payment page - no real card is charged');
    expect(text).toContain('id="status">active');
    expect(text).toContain('3 at $29.00');
    expect(text).toContain('ending in 4242');
    expect(text).toContain('<legend>Test controls, not on a real page</legend>');
    expect(text).toContain('href="http://app.test/plan"');
  });

  it('cancels at the end of the period, takes it back, and ends when the period does', async () => {
    expect((await act('cancel')).status).toBe(303);
    const ending = await read();
    expect(ending).toMatchObject({ cancel_at_period_end: true, status: 'active' });
    expect(ending.cancel_at).toBe(ending.items.data[0]?.current_period_end);
    await act('resume');
    expect(await read()).toMatchObject({ cancel_at_period_end: false, cancel_at: null });
    await act('cancel');
    await act('advance');
    expect(await read()).toMatchObject({ status: 'canceled' });
    expect((await act('resume')).status).toBe(422);
  });

  it('fails the next renewal and recovers when the open invoice is paid', async () => {
    await act('fail-next');
    await act('advance');
    expect((await read()).status).toBe('past_due');
    expect(await (await fetch(url)).text()).toContain('Pay the open invoice now');
    await act('pay');
    expect((await read()).status).toBe('active');
    await act('advance');
    expect((await read()).status).toBe('active');
  });

  it('changes the card, and keeps the old one when the new one is declined', async () => {
    const before = await read();
    expect((await act('card', { card: 'declined' })).status).toBe(402);
    expect((await read()).default_payment_method).toBe(before.default_payment_method);
    await act('card', { card: 'fails-later' });
    expect((await read()).default_payment_method).not.toBe(before.default_payment_method);
    await act('advance');
    expect((await read()).status).toBe('past_due');
  });

  it('renews for a month and bills the quantity', async () => {
    const before = await read();
    await act('advance');
    const after = await rig.stripe.subscriptions.retrieve(started.subscription, {
      expand: ['latest_invoice'],
    });
    expect(after.items.data[0]?.current_period_start).toBe(before.items.data[0]?.current_period_end);
    expect(after.latest_invoice).toMatchObject({
      amount_paid: 3 * 2900,
      billing_reason: 'subscription_cycle',
    });
  });

  it('does nothing to a stranger’s subscription, nor what it does not offer', async () => {
    const other = await subscribe(rig);
    expect((await act('cancel', { subscription: other.subscription })).status).toBe(422);
    expect((await act('constructor')).status).toBe(422);
    expect(await rig.stripe.subscriptions.retrieve(other.subscription)).toMatchObject({
      cancel_at_period_end: false,
    });
  });
});
