import type Stripe from 'stripe';
import { PRICE, startRig, type Rig } from '../testing/rig.js';
import { inDays, openAccount, paymentParams } from '../testing/scenes.js';

describe('the checkout page', () => {
  let rig: Rig;
  let shop: { stripeAccount: string };

  beforeAll(async () => {
    rig = await startRig();
    shop = { stripeAccount: await openAccount(rig) };
  });
  afterAll(() => rig.close());

  const open = (
    change: Partial<Stripe.Checkout.SessionCreateParams> = {},
  ): Promise<Stripe.Checkout.Session> =>
    rig.stripe.checkout.sessions.create({ ...paymentParams(), ...change }, shop);
  const read = (session: Stripe.Checkout.Session): Promise<Stripe.Checkout.Session> =>
    rig.stripe.checkout.sessions.retrieve(session.id, { expand: ['payment_intent'] }, shop);
  const typesOf = async (session: Stripe.Checkout.Session): Promise<string[]> => {
    const { events } = (await rig.control('GET', '/events')) as { events: Stripe.Event[] };
    const { payment_intent: intent } = await read(session);
    const ids = [session.id, (intent as Stripe.PaymentIntent | null)?.id];
    const about = (event: Stripe.Event): (string | undefined)[] => {
      const object = event.data.object as { id?: string; payment_intent?: string };
      return [object.id, object.payment_intent];
    };
    return events
      .filter((event) => about(event).some((id) => id !== undefined && ids.includes(id)))
      .map((e) => e.type);
  };

  it('says that nothing is real, what is owed to whom, and needs no script', async () => {
    const answer = await fetch(String((await open()).url));
    const text = await answer.text();
    expect(answer.status).toBe(200);
    expect(text).toContain('Test payment page - no real card is charged');
    expect(text).toContain('Pay Walnut Row Cabinets');
    expect(text).toContain('$1,250.00');
    expect(text).toContain('customer@example.com');
    expect(text).toContain('href="http://shop.test/back"');
    expect(text).not.toMatch(/<script/i);
    expect(answer.headers.get('content-security-policy')).toContain("default-src 'none'");
  });

  it('shows stored markup as text', async () => {
    const product = { name: '<script>alert(1)</script>"' };
    const data = { currency: 'usd', unit_amount: 5000, product_data: product };
    const session = await open({ line_items: [{ quantity: 1, price_data: data }] });
    const text = await (await fetch(String(session.url))).text();
    expect(text).toContain('&lt;script&gt;alert(1)&lt;/script&gt;&quot;');
    expect(text).not.toContain('<script>');
  });

  it('pays: back to the shop with the id in place, all objects settled, then the events', async () => {
    const session = await open();
    const answer = await rig.submit(session.url, { action: 'pay', card: 'pays' });
    expect(answer.status).toBe(303);
    expect(answer.headers.get('location')).toBe(`http://shop.test/paid?session=${session.id}`);
    const paid = await read(session);
    expect(paid).toMatchObject({ status: 'complete', payment_status: 'paid', url: null });
    expect(paid.payment_intent).toMatchObject({ status: 'succeeded', amount_received: 125_000 });
    expect(await typesOf(session)).toEqual([
      'charge.succeeded',
      'payment_intent.succeeded',
      'checkout.session.completed',
    ]);
  });

  it('settles once when submitted twice at the same time, and again later', async () => {
    const session = await open();
    const form = { action: 'pay', card: 'pays' };
    const answers = await Promise.all([rig.submit(session.url, form), rig.submit(session.url, form)]);
    answers.push(await rig.submit(session.url, form));
    expect(answers.map((answer) => answer.status)).toEqual([303, 303, 303]);
    expect(new Set(answers.map((answer) => answer.headers.get('location'))).size).toBe(1);
    expect(await typesOf(session)).toHaveLength(3);
  });

  it('keeps a declined payer on the page, and lets the same payment be tried again', async () => {
    const session = await open();
    const declined = await rig.submit(session.url, { action: 'pay', card: 'insufficient-funds' });
    expect(declined.status).toBe(402);
    expect(await declined.text()).toContain('role="alert">Your card has insufficient funds.');
    const still = await read(session);
    expect(still).toMatchObject({ status: 'open', payment_status: 'unpaid' });
    const intent = still.payment_intent as Stripe.PaymentIntent;
    expect(intent.last_payment_error).toMatchObject({
      code: 'card_declined',
      decline_code: 'insufficient_funds',
    });
    await rig.submit(session.url, { action: 'pay', card: 'pays' });
    const paid = await read(session);
    expect(paid.payment_intent).toMatchObject({
      id: intent.id,
      status: 'succeeded',
      last_payment_error: null,
    });
    expect(await typesOf(session)).toEqual([
      'payment_intent.payment_failed',
      'charge.succeeded',
      'payment_intent.succeeded',
      'checkout.session.completed',
    ]);
  });

  it('asks for an email when the shop gave none, and keeps what was typed', async () => {
    const session = await open({ customer_email: undefined });
    const refused = await rig.submit(session.url, { action: 'pay', card: 'pays', email: 'nobody' });
    expect(refused.status).toBe(422);
    expect(await refused.text()).toContain('value="nobody"');
    const paid = await rig.submit(session.url, { action: 'pay', card: 'pays', email: 'late@example.com' });
    expect(paid.status).toBe(303);
    expect((await read(session)).customer_details?.email).toBe('late@example.com');
  });

  it('takes no card it did not offer', async () => {
    const session = await open();
    expect((await rig.submit(session.url, { action: 'pay', card: '4242424242424242' })).status).toBe(422);
    expect((await read(session)).payment_intent).toBeNull();
  });

  it('refuses an expired session and one it never had', async () => {
    const session = await open();
    await rig.stripe.checkout.sessions.expire(session.id, {}, shop);
    expect((await rig.submit(session.url, { action: 'pay', card: 'pays' })).status).toBe(410);
    expect(await typesOf(session)).toEqual(['checkout.session.expired']);
    expect((await fetch(`${rig.fake.url}/c/pay/cs_test_none`)).status).toBe(404);
  });

  it('expires a session when its time has come', async () => {
    const session = await open();
    await rig.control('POST', '/clock', { advanceSeconds: 24 * 60 * 60 });
    expect((await read(session)).status).toBe('expired');
    expect((await rig.submit(session.url, { action: 'pay', card: 'pays' })).status).toBe(410);
  });

  it('starts a trial without a charge, and makes the customer when there is none', async () => {
    const session = await rig.stripe.checkout.sessions.create({
      mode: 'subscription',
      line_items: [{ price: PRICE, quantity: 2 }],
      subscription_data: { trial_end: inDays(14) },
      success_url: 'http://app.test/done',
    });
    const text = await (await fetch(String(session.url))).text();
    expect(text).toContain('Start trial');
    expect(text).toContain('id="amount">$0.00');
    await rig.submit(session.url, { action: 'pay', card: 'pays', email: 'owner@example.com' });
    const done = await rig.stripe.checkout.sessions.retrieve(session.id, {
      expand: ['customer', 'subscription'],
    });
    expect(done).toMatchObject({ status: 'complete', payment_status: 'no_payment_required' });
    expect(done.customer).toMatchObject({ email: 'owner@example.com' });
    expect(done.subscription).toMatchObject({ status: 'trialing' });
  });

  it('starts no subscription on a declined card', async () => {
    const session = await rig.stripe.checkout.sessions.create({
      mode: 'subscription',
      line_items: [{ price: PRICE, quantity: 2 }],
      customer_email: 'owner@example.com',
      success_url: 'http://app.test/done',
    });
    expect((await rig.submit(session.url, { action: 'pay', card: 'declined' })).status).toBe(402);
    const still = await rig.stripe.checkout.sessions.retrieve(session.id);
    expect(still).toMatchObject({ status: 'open', subscription: null });
  });
});
