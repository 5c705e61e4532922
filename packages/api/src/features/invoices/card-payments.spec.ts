import Stripe from 'stripe';
import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import { Books, submit } from '../../../test/harness/books.js';
import { TestApi } from '../../../test/harness/test-api.js';

describe('card payments', () => {
  let api: TestApi;
  let books: Books;
  let account: string;
  beforeAll(async () => {
    api = await TestApi.open();
    books = new Books(api, await api.signUp());
    account = await books.takeCards();
  });
  afterEach(() => control('PUT', '/delivery', { mode: 'normal' }));
  afterAll(() => api.close());

  async function control(method: string, path: string, body?: object): Promise<unknown> {
    const answer = await fetch(`${api.payments.url}/_control${path}`, {
      method,
      headers: { 'content-type': 'application/json' },
      ...(body ? { body: JSON.stringify(body) } : {}),
    });
    if (!answer.ok) throw new Error(`${path}: ${answer.status} ${await answer.text()}`);
    return answer.json();
  }
  const start = async (invoice: Invoice) => {
    const page = await books.customerPage(invoice);
    const answer = await page.client.post('/card-payments');
    return { page, answer, url: (answer.body as { url: string }).url };
  };
  const payAt = async (url: string) => {
    const answer = await submit(url, { action: 'pay', card: 'pays' });
    expect(answer.status).toBe(303);
    return answer.headers.get('location') ?? '';
  };
  /** Waits for the provider's webhooks and carries out what they left in the outbox. */
  const settle = async (invoice: Invoice, until: (seen: Invoice) => boolean) => {
    for (let attempt = 0; attempt < 80; attempt += 1) {
      await api.product.outbox.drain();
      const seen = await books.read(invoice.id);
      if (until(seen)) return seen;
      await new Promise((resolve) => setTimeout(resolve, 50));
    }
    throw new Error('The payment did not settle.');
  };
  const isPaid = ({ status }: Invoice) => status === 'paid';
  const sessions = async () =>
    ((await control('GET', '/events?type=checkout.session.completed')) as { events: { id: string }[] })
      .events;
  const checkouts = (invoice: Invoice) =>
    api.platform.dataSource.query<{ id: string; status: string; session_id: string | null }[]>(
      'select id, status, session_id from card_checkout where invoice_id = ? order by id',
      [invoice.id],
    );

  it('pay the whole balance on the provider’s page and are settled by its webhook', async () => {
    const part = await books.pay(await books.issued(), { amountCents: 2500 });
    const { page, url } = await start(part);
    expect(await page.read()).toMatchObject({ balanceCents: 7500, canPayByCard: true });
    expect(await payAt(url)).toMatch(/\/c\/[\w-]{64}\?payment=made$/);
    const paid = await settle(part, isPaid);
    expect(paid.payments[1]).toMatchObject({
      method: 'card',
      amountCents: 7500,
      recordedBy: null,
      reference: expect.stringMatching(/^pi_/),
    });
    expect(await page.read()).toMatchObject({ standing: 'paid', canPayByCard: false });
    const [letter] = (await api.lettersTo('ines@customer.test')).slice(-1);
    expect(letter?.subject).toContain('Receipt for invoice');
    expect(letter?.attachments).toHaveLength(1);
  });

  it('take cards alone, whatever else the shop’s account could be paid by days later', async () => {
    const invoice = await books.issued();
    await start(invoice);
    const [checkout] = await checkouts(invoice);
    const session = await api.platform.payments.checkout.sessions.retrieve(
      checkout?.session_id ?? '',
      {},
      { stripeAccount: account },
    );
    expect(session.allowed_payment_method_types).toEqual(['card']);
  });

  it('go through card clearing in the books', async () => {
    const apart = new Books(api, await api.signUp());
    await apart.takeCards();
    const issued = await apart.issued();
    const page = await apart.customerPage(issued);
    const { url } = (await page.client.post('/card-payments')).body as { url: string };
    await payAt(url);
    for (let attempt = 0; (await apart.read(issued.id)).status !== 'paid' && attempt < 80; attempt += 1) {
      await new Promise((resolve) => setTimeout(resolve, 50));
      await api.product.outbox.drain();
    }
    expect(await apart.balances()).toEqual({ '1050': 10_000, '4000': 10_000 });
  });

  it('use one page an invoice: pressed twenty times, it is the same', async () => {
    const issued = await books.issued();
    const page = await books.customerPage(issued);
    const answers = await Promise.all(Array.from({ length: 20 }, () => page.client.post('/card-payments')));
    expect(answers.map(({ status }) => status)).toEqual(Array.from({ length: 20 }, () => 200));
    expect(new Set(answers.map(({ body }) => (body as { url: string }).url)).size).toBe(1);
    expect((await page.client.post('/card-payments')).body).toEqual(answers[0]?.body);
    expect(await checkouts(issued)).toHaveLength(1);
  });

  it('are settled once by an event that comes twenty times at the same moment', async () => {
    await control('PUT', '/delivery', { mode: 'drop' });
    const issued = await books.issued();
    const { url } = await start(issued);
    await payAt(url);
    const event = (await sessions()).at(-1);
    const sent = await control('POST', `/events/${event?.id}/resend`, { copies: 20, parallel: true });
    expect(sent).toEqual({ statuses: Array.from({ length: 20 }, () => 200) });
    const paid = await settle(issued, isPaid);
    expect(paid.payments).toHaveLength(1);
  });

  it('are settled once by two different events about one session', async () => {
    const issued = await books.issued();
    const { url } = await start(issued);
    await payAt(url);
    await settle(issued, isPaid);
    const [checkout] = await checkouts(issued);
    const { cards } = api.product.services.invoices;
    const again = { id: 'evt_other', account, created: 1, data: { object: { id: checkout?.session_id } } };
    await cards.onSession(again as never);
    expect((await books.read(issued.id)).payments).toHaveLength(1);
  });

  it('are found by the customer’s page when no webhook comes', async () => {
    await control('PUT', '/delivery', { mode: 'drop' });
    const issued = await books.issued();
    const { page, url } = await start(issued);
    expect((await page.client.post('/card-payments/check')).body).toMatchObject({ balanceCents: 10_000 });
    await payAt(url);
    expect(await page.read()).toMatchObject({ balanceCents: 10_000 });
    const checked = await page.client.post('/card-payments/check');
    expect(checked.body).toMatchObject({ standing: 'paid', balanceCents: 0, canPayByCard: false });
  });

  it('that come although a check was recorded meanwhile are kept, held for the customer and shown', async () => {
    await control('PUT', '/delivery', { mode: 'hold' });
    const apart = new Books(api, await api.signUp());
    await apart.takeCards();
    const issued = await apart.issued();
    const page = await apart.customerPage(issued);
    const { url } = (await page.client.post('/card-payments')).body as { url: string };
    await payAt(url);
    await apart.pay(issued, { amountCents: 6000 });
    await control('POST', '/flush', {});
    let seen = await apart.read(issued.id);
    for (let attempt = 0; seen.status !== 'paid' && attempt < 80; attempt += 1) {
      await api.product.outbox.drain();
      await new Promise((resolve) => setTimeout(resolve, 50));
      seen = await apart.read(issued.id);
    }
    expect(seen).toMatchObject({ paidCents: 10_000, balanceCents: 0, overpaidCents: 6000 });
    expect(seen.payments[1]).toMatchObject({ amountCents: 10_000, appliedCents: 4000 });
    expect(await apart.balances()).toEqual({ '1000': 6000, '1050': 10_000, '2350': 6000, '4000': 10_000 });
    expect(await page.read()).toMatchObject({
      balanceCents: 0,
      heldCents: 6000,
      payments: [{ amountCents: 6000 }, { amountCents: 4000 }],
    });
    const refund = (amountCents: number, version: number) =>
      apart.client.post(
        `/invoices/${seen.id}/refunds`,
        { method: 'card', amountCents, paidOn: '2026-06-01' },
        { version },
      );
    expect((await refund(6001, seen.version)).status).toBe(409);
    const back = (await refund(6000, seen.version)).body as Invoice;
    expect(back).toMatchObject({ overpaidCents: 0, paidCents: 10_000, status: 'paid' });
    expect(await apart.balances()).toEqual({ '1000': 6000, '1050': 4000, '4000': 10_000 });
    expect((await refund(1, back.version)).status).toBe(409);
  });

  it('cannot be started twice for different sums: what is not owed any more is closed at the provider', async () => {
    const issued = await books.issued();
    const first = await start(issued);
    const part = await books.pay(issued, { amountCents: 4000 });
    await api.product.outbox.drain();
    const closed = await submit(first.url, { action: 'pay', card: 'pays' });
    expect(closed.status).toBe(410);
    const second = await first.page.client.post('/card-payments');
    expect((second.body as { url: string }).url).not.toBe(first.url);
    expect((await checkouts(part)).map(({ status }) => status)).toEqual(['expired', 'open']);
    await payAt((second.body as { url: string }).url);
    expect(await settle(part, isPaid)).toMatchObject({ overpaidCents: 0 });
  });

  it('go on after the page has expired', async () => {
    const issued = await books.issued();
    const { page, url } = await start(issued);
    const [checkout] = await checkouts(issued);
    await api.platform.payments.checkout.sessions.expire(
      checkout?.session_id ?? '',
      {},
      { stripeAccount: account },
    );
    const again = await page.client.post('/card-payments');
    expect((again.body as { url: string }).url).not.toBe(url);
    expect((await checkouts(issued)).map(({ status }) => status)).toEqual(['expired', 'open']);
  });

  it('survive a provider that made the page and then could not say so', async () => {
    const issued = await books.issued();
    const page = await books.customerPage(issued);
    const made: string[] = [];
    const { sessions: calls } = api.platform.payments.checkout;
    const create = calls.create.bind(calls);
    const cutOff = jest.spyOn(calls, 'create').mockImplementationOnce(async (...call) => {
      made.push((await create(...call)).id);
      throw new Stripe.errors.StripeConnectionError({ message: 'cut off', type: 'api_error' });
    });
    const cut = await page.client.post('/card-payments');
    cutOff.mockRestore();
    expect(cut.status).toBe(503);
    expect(await checkouts(issued)).toMatchObject([{ status: 'asked', session_id: null }]);
    const again = await page.client.post('/card-payments');
    expect(again.status).toBe(200);
    // The key of the business act was the same both times: the page is the one that was made then.
    expect(await checkouts(issued)).toMatchObject([{ status: 'open', session_id: made[0] }]);
    await payAt((again.body as { url: string }).url);
    expect((await settle(issued, isPaid)).payments).toHaveLength(1);
  });

  it('are refused in plain words when the provider refuses, and can be tried again', async () => {
    const apart = new Books(api, await api.signUp());
    const closed = await apart.takeCards();
    const issued = await apart.issued();
    const page = await apart.customerPage(issued);
    const standing = (enabled: boolean) =>
      control('POST', `/accounts/${closed}/standing`, { detailsSubmitted: true, enabled });
    await standing(false);
    const refused = await page.client.post('/card-payments');
    expect(refused.status).toBe(409);
    expect(refused.body).toMatchObject({ detail: expect.stringContaining('could not be opened') });
    expect((await checkouts(issued)).map(({ status }) => status)).toEqual(['withdrawn']);
    await standing(true);
    expect((await page.client.post('/card-payments')).status).toBe(200);
  });

  it('are not offered by a shop without an account, nor below what a card takes, nor when nothing is owed', async () => {
    const plain = new Books(api, await api.signUp());
    const noCards = await plain.customerPage(await plain.issued());
    expect(await noCards.read()).toMatchObject({ canPayByCard: false });
    expect((await noCards.client.post('/card-payments')).status).toBe(409);
    const tiny = await start(await books.issued({}, [{ unitPriceCents: 49 }]));
    expect(tiny.answer.status).toBe(409);
    const settled = await start(await books.pay(await books.issued()));
    expect(settled.answer.status).toBe(409);
  });

  it('of an account no shop has, or that name another shop’s checkout, have no effect', async () => {
    const issued = await books.issued();
    await start(issued);
    const [checkout] = await checkouts(issued);
    const other = new Books(api, await api.signUp());
    const foreign = await other.takeCards();
    const { cards } = api.product.services.invoices;
    const event = (accountId: string) =>
      ({
        id: 'evt_x',
        account: accountId,
        created: 1,
        data: { object: { id: checkout?.session_id } },
      }) as never;
    await cards.onSession(event('acct_of_nobody'));
    // The session is none of that account's, so the provider itself does not know it there.
    await expect(cards.onSession(event(foreign))).rejects.toThrow(/No such/);
    expect((await books.read(issued.id)).payments).toEqual([]);
    // A session that another shop made with our checkout's id in it.
    const forged = await api.platform.payments.checkout.sessions.create(
      {
        mode: 'payment',
        line_items: [
          { quantity: 1, price_data: { currency: 'usd', unit_amount: 100, product_data: { name: 'x' } } },
        ],
        metadata: { checkoutId: checkout?.id ?? '' },
        success_url: 'http://shop.test/ok',
      },
      { stripeAccount: foreign },
    );
    await submit(forged.url ?? '', { action: 'pay', card: 'pays', email: 'a@b.test' });
    await cards.onSession({
      id: 'evt_y',
      account: foreign,
      created: 1,
      data: { object: { id: forged.id } },
    } as never);
    expect((await books.read(issued.id)).payments).toEqual([]);
    expect((await other.balances())['1050']).toBeUndefined();
  });

  it('need an invoice link: an amount, an invoice or a shop from outside is never taken', async () => {
    const issued = await books.issued();
    const page = await books.customerPage(issued);
    expect((await page.client.post('/card-payments', { amountCents: 1 })).status).toBe(422);
    const text = JSON.stringify((await page.client.get('')).body);
    for (const secret of [books.shop.id, issued.id, 'memberId', 'recordedBy', 'ledger', 'overpaid'])
      expect(text).not.toContain(secret);
    expect((await page.client.get('/invoice.pdf')).headers['content-type']).toBe('application/pdf');
    expect((await page.client.get('/estimate.pdf')).status).toBe(404);
    expect((await api.browser().post(`/links/${'x'.repeat(64)}/card-payments`)).status).toBe(404);
  });
});
