import { letterTo } from '../../../test/harness/letters.js';
import { Provider } from '../../../test/harness/provider.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

type View = {
  status: string;
  standing: { access: string; banner: string; daysLeft: number | null };
  members: number;
  pricePerMemberCents: number;
  monthlyTotalCents: number;
  cancelAtPeriodEnd: boolean;
  graceEndsAt: string | null;
};
const CUSTOMER = { kind: 'homeowner', name: 'Ines Calder' };

describe("the shop's own subscription", () => {
  let api: TestApi;
  let provider: Provider;
  let shop: TestShop;
  let email: string;
  let count = 0;
  beforeAll(async () => {
    api = await TestApi.open({ now: new Date().toISOString() });
    provider = new Provider(api);
  });
  afterAll(() => api.close());
  beforeEach(async () => {
    await provider.control('PUT', '/delivery', { mode: 'normal' });
    await provider.control('DELETE', '/faults');
    shop = await api.signUp();
    email = `owner${(count += 1)}@shop.test`;
  });

  const read = async () => (await shop.owner.get('/subscription')).body as View;
  const checkout = (key?: string) =>
    shop.owner.post('/subscription/checkout', {}, key === undefined ? {} : { key });
  const checkoutUrl = async () => ((await checkout()).body as { url: string }).url;
  const portalUrl = async () => ((await shop.owner.post('/subscription/portal')).body as { url: string }).url;
  const subscribe = async (card = 'pays') => {
    const back = await provider.submit(await checkoutUrl(), { action: 'pay', card });
    await provider.settle();
    return back;
  };
  const stored = async () => {
    const rows: { customer: string | null; subscription: string | null; members: number }[] =
      await api.platform.dataSource.query(
        `select provider_customer_id as customer, provider_subscription_id as subscription, paid_members as members
         from subscription where shop_id = ?`,
        [shop.id],
      );
    const row = rows[0];
    if (!row) throw new Error('The shop has no subscription row.');
    return row;
  };
  const atProvider = async () =>
    api.platform.payments.subscriptions.retrieve((await stored()).subscription ?? '');
  const advance = async (to: string) => {
    await provider.control('POST', `/subscriptions/${(await stored()).subscription ?? ''}/advance`, { to });
    await provider.settle();
  };
  /** The session ends after fourteen days without a visit, as it should. */
  const signInAgain = async () => {
    shop = { ...shop, owner: (await api.signIn(email)).below(`/api/shops/${shop.id}`) };
  };
  const writes = async () => (await shop.owner.post('/customers', CUSTOMER)).status;
  /** The provider's events about this shop's subscription, oldest first. */
  const events = async (type: string) => {
    const { subscription } = await stored();
    const all = (await provider.control('GET', `/events?type=${type}`)) as { events: { id: string }[] };
    return all.events.filter((event) => JSON.stringify(event).includes(subscription ?? 'none'));
  };
  const resend = (eventId: string | undefined, how: object = {}) =>
    provider.control('POST', `/events/${eventId ?? ''}/resend`, how);
  const subject = async (words: string) => (await letterTo(api, email, words))?.subject;

  describe('in its trial', () => {
    it('is open for fourteen days, with what it will cost said', async () => {
      await shop.join('crew');
      expect(await read()).toMatchObject({
        status: 'trialing',
        standing: { access: 'full', banner: 'none', daysLeft: 14 },
        members: 2,
        pricePerMemberCents: 2_900,
        monthlyTotalCents: 5_800,
      });
      expect(await writes()).toBe(201);
    });

    it('says when it is about to end, once, on the screen and by letter', async () => {
      await provider.forward(10.5);
      expect((await read()).standing).toMatchObject({ banner: 'trial-ending', daysLeft: 4 });
      expect(await subject('The trial of')).toMatch(/^The trial of Test shop \d+ ends on \w+day, \w+ \d+$/);
      await provider.forward(1);
      const letters = (await api.lettersTo(email)).filter((one) => one.subject.includes('ends on'));
      expect(letters).toHaveLength(1);
    });

    it('ends by the clock: everything can be read, nothing written but the subscription', async () => {
      const customer = (await shop.owner.post('/customers', CUSTOMER)).body as { id: string };
      await provider.forward(14.1);
      await signInAgain();
      expect(await read()).toMatchObject({ status: 'trial-ended', standing: { access: 'read-only' } });
      expect(await subject('has ended')).toMatch(/^The trial of Test shop \d+ has ended$/);
      const refused = await shop.owner.post('/customers', CUSTOMER);
      expect([refused.status, (refused.body as { code: string }).code]).toEqual([402, 'subscription-lapsed']);
      expect((await shop.owner.patch(`/customers/${customer.id}`, CUSTOMER, 1)).status).toBe(402);
      expect((await shop.owner.get(`/customers/${customer.id}`)).status).toBe(200);
      expect((await shop.owner.get('/customers')).status).toBe(200);
      await subscribe();
      expect(await read()).toMatchObject({ status: 'active', standing: { access: 'full', banner: 'none' } });
      expect(await writes()).toBe(201);
    });

    it('sends no letter about its end to a shop that has subscribed', async () => {
      await subscribe();
      await provider.forward(11);
      expect(await subject('The trial of')).toBeUndefined();
    });
  });

  describe('being started', () => {
    it('counts the members itself, costs nothing before the trial is over, and comes back to the shop', async () => {
      await shop.join('crew');
      await shop.join('bookkeeper');
      const back = await subscribe();
      expect(back).toBe(`${api.platform.config.origin}/s/${shop.slug}/settings/subscription?from=provider`);
      expect(await read()).toMatchObject({ status: 'trialing', members: 3, monthlyTotalCents: 8_700 });
      expect(await atProvider()).toMatchObject({ status: 'trialing', items: { data: [{ quantity: 3 }] } });
      await provider.forward(15);
      await provider.settle();
      await signInAgain();
      expect(await read()).toMatchObject({ status: 'active', standing: { access: 'full' } });
    });

    it('takes neither quantity nor price from the browser', async () => {
      const answer = await shop.owner.post('/subscription/checkout', { quantity: 1, price: 'price_of_mine' });
      expect(answer.status).toBe(422);
    });

    it('answers a double click with the same page', async () => {
      const answers = await Promise.all([1, 2, 3].map(() => checkout('double-click')));
      expect(new Set(answers.map(({ body }) => (body as { url: string }).url)).size).toBe(1);
    });

    it('ends the page of another tab when it is started over', async () => {
      const first = await checkoutUrl();
      const second = await checkoutUrl();
      expect(first).not.toBe(second);
      const { status } = await fetch(first);
      expect(status).toBe(410);
      await provider.submit(second, { action: 'pay', card: 'pays' });
      await provider.settle();
      expect((await read()).status).toBe('trialing');
      expect((await checkout()).status).toBe(409);
    });

    it('makes the customer at the provider once', async () => {
      await Promise.all([checkout(), checkout(), checkout()]);
      const { customer } = await stored();
      await checkout();
      expect((await stored()).customer).toBe(customer);
    });

    it('does not let a shop pay twice while the word of the provider is still on its way', async () => {
      await provider.control('PUT', '/delivery', { mode: 'drop' });
      await provider.submit(await checkoutUrl(), { action: 'pay', card: 'pays' });
      expect((await checkout()).status).toBe(409);
      expect((await stored()).subscription).not.toBeNull();
    });

    it('is asked for afresh on the way back from the provider', async () => {
      await provider.control('PUT', '/delivery', { mode: 'drop' });
      await provider.submit(await checkoutUrl(), { action: 'pay', card: 'pays' });
      expect((await shop.owner.post('/subscription/refresh')).body).toMatchObject({ status: 'trialing' });
      expect((await stored()).subscription).not.toBeNull();
    });

    it('ends a second subscription that came about all the same', async () => {
      await subscribe();
      const { customer, subscription } = await stored();
      const session = await api.platform.payments.checkout.sessions.create({
        mode: 'subscription',
        customer: customer ?? '',
        line_items: [{ price: 'price_bookmatch_member_month', quantity: 1 }],
        subscription_data: { metadata: { shopId: shop.id } },
        success_url: 'http://127.0.0.1/done',
      });
      await provider.submit(session.url ?? '', { action: 'pay', card: 'pays' });
      await provider.settle();
      expect((await stored()).subscription).toBe(subscription);
      const finished = await api.platform.payments.checkout.sessions.retrieve(session.id);
      const surplus = await api.platform.payments.subscriptions.retrieve(String(finished.subscription));
      expect(surplus.status).toBe('canceled');
      expect((await read()).status).toBe('trialing');
    });

    it('stays unsubscribed when the card is declined', async () => {
      await provider.forward(13);
      const url = await checkoutUrl();
      const answer = await fetch(url, { method: 'POST', body: new URLSearchParams({ card: 'declined' }) });
      expect(answer.status).toBe(402);
      await provider.settle();
      expect(await read()).toMatchObject({ status: 'trialing' });
      expect((await stored()).subscription).toBeNull();
    });
  });

  describe('when a payment fails', () => {
    beforeEach(async () => {
      await subscribe();
      await provider.forward(15);
      await provider.settle();
      await signInAgain();
    });

    it('leaves seven days with a banner, writes to the owners once, and then closes', async () => {
      await advance('past_due');
      expect(await read()).toMatchObject({
        status: 'past_due',
        standing: { access: 'full', banner: 'past-due-grace', daysLeft: 7 },
      });
      expect(await writes()).toBe(201);
      expect(await subject('did not go through')).toBeDefined();
      const [failed] = await events('invoice.payment_failed');
      await resend(failed?.id, { copies: 20, parallel: true });
      await provider.settle();
      const letters = (await api.lettersTo(email)).filter((one) => one.subject.includes('did not go'));
      expect(letters).toHaveLength(1);
      await provider.forward(6.9);
      expect(await writes()).toBe(201);
      await provider.forward(0.2);
      expect(await writes()).toBe(402);
      expect((await shop.owner.get('/customers')).status).toBe(200);
      expect((await read()).standing).toMatchObject({ access: 'read-only', banner: 'read-only' });
    });

    it('opens again when it is paid on the page of the provider', async () => {
      await advance('past_due');
      await provider.forward(8);
      expect(await writes()).toBe(402);
      const { subscription } = await stored();
      await provider.submit(await portalUrl(), { action: 'pay', subscription: subscription ?? '' });
      await provider.settle();
      expect(await read()).toMatchObject({ status: 'active', graceEndsAt: null });
      expect(await writes()).toBe(201);
    });

    it('closes at once when the provider gives up, and when it is paused', async () => {
      await advance('unpaid');
      expect(await read()).toMatchObject({ status: 'unpaid', standing: { access: 'read-only' } });
      await advance('recovered');
      expect(await writes()).toBe(201);
      await advance('paused');
      expect(await writes()).toBe(402);
      await advance('resumed');
      expect(await writes()).toBe(201);
    });

    it('does not renew the days of grace with every word about it', async () => {
      await advance('past_due');
      const { graceEndsAt } = await read();
      await provider.forward(3);
      const words = (await events('customer.subscription.updated')).slice(-2);
      expect(words).toHaveLength(2);
      for (const { id } of words) await resend(id);
      await api.platform.dataSource.query('delete from webhook_event');
      for (const { id } of words) await resend(id);
      await provider.settle();
      expect((await read()).graceEndsAt).toBe(graceEndsAt);
    });
  });

  describe('being ended', () => {
    it('runs to the end of what was paid, says so, and can be started anew', async () => {
      await subscribe();
      await provider.forward(15);
      await provider.settle();
      await signInAgain();
      const { subscription } = await stored();
      await provider.submit(await portalUrl(), { action: 'cancel', subscription: subscription ?? '' });
      await provider.settle();
      expect(await read()).toMatchObject({ status: 'active', cancelAtPeriodEnd: true });
      expect(await writes()).toBe(201);
      await provider.submit(await portalUrl(), { action: 'advance', subscription: subscription ?? '' });
      await provider.settle();
      expect(await read()).toMatchObject({ status: 'canceled', standing: { access: 'read-only' } });
      expect(await writes()).toBe(402);
      await subscribe();
      expect(await read()).toMatchObject({ status: 'active', cancelAtPeriodEnd: false });
      expect((await stored()).subscription).not.toBe(subscription);
      expect(await writes()).toBe(201);
    });

    it('is not undone by late words about the subscription before', async () => {
      await subscribe();
      const first = (await stored()).subscription ?? '';
      await advance('canceled');
      await subscribe();
      const late = (await provider.control('GET', `/events?object=${first}`)) as { events: { id: string }[] };
      expect(late.events.length).toBeGreaterThan(1);
      await api.platform.dataSource.query('delete from webhook_event');
      for (const { id } of late.events) await resend(id);
      await provider.settle();
      expect((await stored()).subscription).not.toBe(first);
      expect((await read()).standing.access).toBe('full');
    });
  });

  it('ends with the last word when everything arrives in reverse, twice', async () => {
    await provider.control('PUT', '/delivery', { mode: 'duplicate', copies: 2 });
    await provider.submit(await checkoutUrl(), { action: 'pay', card: 'pays' });
    await provider.control('PUT', '/delivery', { mode: 'hold' });
    await provider.settle('reverse');
    for (const to of ['trial_end', 'past_due', 'recovered', 'renew'])
      await provider.control('POST', `/subscriptions/${(await stored()).subscription ?? ''}/advance`, { to });
    await provider.settle('reverse');
    expect(await read()).toMatchObject({ status: 'active', standing: { access: 'full' } });
  });

  it('of a shop that does not exist, or of somebody else, changes nothing', async () => {
    const customer = await api.platform.payments.customers.create({ email: 'stray@mail.test' });
    const session = await api.platform.payments.checkout.sessions.create({
      mode: 'subscription',
      customer: customer.id,
      line_items: [{ price: 'price_bookmatch_member_month', quantity: 1 }],
      subscription_data: { metadata: { shopId: '0193e000-0000-7000-8000-00000000abcd' } },
      success_url: 'http://127.0.0.1/done',
    });
    await provider.submit(session.url ?? '', { action: 'pay', card: 'pays' });
    await provider.settle();
    expect((await stored()).subscription).toBeNull();
    const waiting: unknown[] = await api.platform.dataSource.query(
      "select id from outbox_message where kind = 'payment-event' and finished_at is null",
    );
    expect(waiting).toEqual([]);
  });

  describe('as members come and go', () => {
    it('follows their number', async () => {
      await subscribe();
      const invited = 'newhand@mail.test';
      await shop.owner.post('/invitations', { email: invited, role: 'crew' });
      const token = /token=([\w-]+)/.exec((await letterTo(api, invited, 'invites'))?.text ?? '')?.[1];
      const answer = await api
        .browser()
        .post('/account/accept-invitation', { token, name: 'New Hand', password: 'plenty of sawdust' });
      const [{ memberId }] = (answer.body as { memberships: [{ memberId: string }] }).memberships;
      await provider.settle();
      expect((await atProvider()).items.data[0]?.quantity).toBe(2);
      expect(await read()).toMatchObject({ members: 2, monthlyTotalCents: 5_800 });
      await shop.owner.delete(`/members/${memberId}`, 1);
      await provider.settle();
      expect((await atProvider()).items.data[0]?.quantity).toBe(1);
    });

    it('makes good for those who came while the payment page was open', async () => {
      const url = await checkoutUrl();
      await shop.join('crew');
      await provider.submit(url, { action: 'pay', card: 'pays' });
      await provider.settle();
      expect((await atProvider()).items.data[0]?.quantity).toBe(2);
    });

    it('comes right though the provider was away for a while', async () => {
      await subscribe();
      const { memberId } = await shop.join('crew');
      const { memberId: other } = await shop.join('crew');
      await provider.control('POST', '/faults', {
        kind: 'error-before',
        calls: 30,
        path: '/v1/subscriptions',
      });
      await shop.owner.delete(`/members/${memberId}`, 1);
      await api.product.outbox.drain();
      await provider.control('DELETE', '/faults');
      await shop.owner.delete(`/members/${other}`, 1);
      await provider.forward(0.1);
      await provider.settle();
      expect((await atProvider()).items.data[0]?.quantity).toBe(1);
    });

    it('lets a lapsed shop remove somebody, and take nobody in', async () => {
      const { memberId } = await shop.join('crew');
      const invited = 'toolate@mail.test';
      await shop.owner.post('/invitations', { email: invited, role: 'crew' });
      const token = /token=([\w-]+)/.exec((await letterTo(api, invited, 'invites'))?.text ?? '')?.[1];
      await api.platform.dataSource.query("update subscription set status = 'canceled' where shop_id = ?", [
        shop.id,
      ]);
      const late = { token, name: 'Too Late', password: 'plenty of sawdust' };
      const answer = await api.browser().post('/account/accept-invitation', late);
      expect([answer.status, (answer.body as { code: string }).code]).toEqual([402, 'subscription-lapsed']);
      expect((await shop.owner.post('/invitations', { email: 'x@mail.test', role: 'crew' })).status).toBe(
        402,
      );
      expect((await shop.owner.delete(`/members/${memberId}`, 1)).status).toBe(204);
    });
  });

  it('is minded by an owner alone, and known to every member only as far as it stands', async () => {
    for (const role of ['bookkeeper', 'lead-hand', 'crew'] as const) {
      const { client } = await shop.join(role);
      const answers = [
        await client.get('/subscription'),
        await client.post('/subscription/checkout'),
        await client.post('/subscription/portal'),
        await client.post('/subscription/refresh'),
      ];
      expect(answers.map(({ status }) => status)).toEqual([403, 403, 403, 403]);
      const { body } = await client.get('/api/account/session');
      expect(body).toMatchObject({ memberships: [{ subscription: { access: 'full' } }] });
    }
    expect((await shop.owner.post('/subscription/portal')).status).toBe(409);
  });
});
