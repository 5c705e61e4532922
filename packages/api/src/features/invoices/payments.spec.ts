import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import { Books } from '../../../test/harness/books.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

describe('payments', () => {
  let api: TestApi;
  let shop: TestShop;
  let books: Books;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    books = new Books(api, shop);
  });
  afterAll(() => api.close());

  const check = (invoice: Invoice, fields: object = {}) =>
    books.client.post(
      `/invoices/${invoice.id}/payments`,
      { method: 'check', amountCents: invoice.balanceCents, receivedOn: '2026-06-01', ...fields },
      { version: invoice.version },
    );

  it('are recorded in part, then in whole, and move the standing and the books', async () => {
    const apart = new Books(api, await api.signUp());
    const issued = await apart.issued();
    const part = await apart.pay(issued, { amountCents: 2500, reference: '1041', receivedOn: '2026-05-30' });
    expect(part).toMatchObject({
      standing: 'part-paid',
      paidCents: 2500,
      balanceCents: 7500,
      payments: [
        { kind: 'payment', method: 'check', amountCents: 2500, reference: '1041', recordedBy: 'Owner 2' },
      ],
    });
    const paid = await apart.pay(part, { method: 'cash' });
    expect(paid).toMatchObject({ status: 'paid', standing: 'paid', balanceCents: 0 });
    expect(await apart.balances()).toEqual({ '1000': 10_000, '4000': 10_000 });
    const { body } = await apart.client.get('/ledger/entries', { kind: 'payment', sort: 'number' });
    expect((body as { rows: { on: string }[] }).rows.map(({ on }) => on)).toEqual([
      '2026-05-30',
      '2026-06-01',
    ]);
  });

  it('above the balance, in the future, of a draft and of a paid invoice are refused at their field', async () => {
    const issued = await books.issued();
    const over = await check(issued, { amountCents: 10_001 });
    expect(over.status).toBe(409);
    expect(over.body).toMatchObject({
      detail: 'This payment is more than the $100.00 that is owed.',
      fields: [{ path: 'amountCents' }],
    });
    const tomorrow = await check(issued, { receivedOn: '2026-06-02' });
    expect(tomorrow.body).toMatchObject({ fields: [{ path: 'receivedOn' }] });
    const draft = await books.draft();
    expect((await check(draft, { amountCents: 1 })).status).toBe(409);
    const paid = await books.pay(issued);
    expect((await check(paid, { amountCents: 1 })).status).toBe(409);
    for (const fields of [
      { amountCents: 0 },
      { amountCents: 10.5 },
      { amountCents: '100' },
      { method: 'card' },
      { receivedOn: '2026-02-30' },
      { id: issued.id },
    ])
      expect((await check(await books.issued(), fields)).status).toBe(422);
  });

  it('of the whole balance, 50 at once, go through exactly once', async () => {
    const issued = await books.issued();
    const answers = await Promise.all(Array.from({ length: 50 }, () => check(issued)));
    expect(answers.filter(({ status }) => status === 201)).toHaveLength(1);
    const after = await books.read(issued.id);
    expect(after).toMatchObject({ paidCents: 10_000, balanceCents: 0 });
    expect(after.payments).toHaveLength(1);
  });

  it('of half the balance, from people who each saw the latest version, never come to more than is owed', async () => {
    const issued = await books.issued();
    const one = async () => {
      const seen = await books.read(issued.id);
      return check(seen, { amountCents: 5000 });
    };
    const answers = await Promise.all(Array.from({ length: 20 }, one));
    const through = answers.filter(({ status }) => status === 201).length;
    const after = await books.read(issued.id);
    expect(after.paidCents).toBe(through * 5000);
    expect(after.balanceCents).toBe(10_000 - through * 5000);
    expect(through).toBeLessThanOrEqual(2);
  });

  it('sent twice with one key are one payment', async () => {
    const issued = await books.issued();
    const body = { method: 'check', amountCents: 4000, receivedOn: '2026-06-01' };
    const send = () =>
      books.client.post(`/invoices/${issued.id}/payments`, body, {
        version: issued.version,
        key: 'one-press-of-the-button',
      });
    const answers = await Promise.all([send(), send(), send()]);
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201]);
    expect((await books.read(issued.id)).paidCents).toBe(4000);
  });

  describe('taken back', () => {
    const reverse = (id: string, reason = 'Typed on the wrong invoice.') =>
      books.client.post(`/payments/${id}/reverse`, { reason });

    it('leave both records, owe the money again and can be recorded anew', async () => {
      const apart = new Books(api, await api.signUp());
      const paid = await apart.pay(await apart.issued());
      const answer = await apart.client.post(`/payments/${paid.payments[0]!.id}/reverse`, {
        reason: 'Bounced.',
      });
      expect(answer.status).toBe(201);
      const after = answer.body as Invoice;
      expect(after).toMatchObject({ status: 'issued', standing: 'due', paidCents: 0, balanceCents: 10_000 });
      const [wrong, reversal] = after.payments;
      expect(wrong).toMatchObject({ amountCents: 10_000, reversedById: reversal!.id });
      expect(reversal).toMatchObject({
        kind: 'reversal',
        amountCents: -10_000,
        reversesId: wrong!.id,
        reason: 'Bounced.',
      });
      expect(await apart.balances()).toEqual({ '1200': 10_000, '4000': 10_000 });
      expect((await apart.pay(after)).status).toBe('paid');
    });

    it('once only, also when it is pressed by many', async () => {
      const paid = await books.pay(await books.issued());
      const [payment] = paid.payments;
      const answers = await Promise.all(Array.from({ length: 10 }, () => reverse(payment!.id)));
      expect(answers.filter(({ status }) => status === 201)).toHaveLength(1);
      expect((await books.read(paid.id)).paidCents).toBe(0);
    });

    it('need a reason, and cannot be taken back themselves', async () => {
      const paid = await books.pay(await books.issued());
      const [payment] = paid.payments;
      expect((await reverse(payment!.id, ' ')).status).toBe(422);
      const after = (await reverse(payment!.id)).body as Invoice;
      expect((await reverse(after.payments[1]!.id)).status).toBe(409);
    });
  });

  it('cannot be changed or removed even in the database', async () => {
    await books.pay(await books.issued());
    const { dataSource } = api.platform;
    for (const table of ['payment', 'credit_note', 'ledger_entry', 'ledger_line', 'invoice_letter']) {
      await expect(dataSource.query(`delete from ${table}`)).rejects.toThrow(/denied/);
      await expect(dataSource.query(`update ${table} set created_at = now()`)).rejects.toThrow(/denied/);
    }
  });

  it('are listed newest first, with what was taken back, and exported with money in and out apart', async () => {
    const apart = new Books(api, await api.signUp());
    const first = await apart.pay(await apart.issued(), { receivedOn: '2026-05-01', reference: '=1+1' });
    await apart.client.post(`/payments/${first.payments[0]!.id}/reverse`, { reason: 'Wrong.' });
    const { body } = await apart.client.get('/payments');
    expect(body).toMatchObject({
      total: 2,
      rows: [
        { kind: 'reversal', receivedOn: '2026-06-01' },
        { kind: 'payment', receivedOn: '2026-05-01', invoiceNumber: 2001, customerName: 'Ines Calder' },
      ],
    });
    expect((await apart.client.get('/payments', { method: 'cash' })).body).toMatchObject({ total: 0 });
    expect((await apart.client.get('/payments', { from: '2026-05-02' })).body).toMatchObject({ total: 1 });
    const { text } = await apart.client.get('/payments/export');
    expect(text).toContain("2026-05-01,Payment,Check,2001,Ines Calder,100.00,,'=1+1");
    expect(text).toContain('2026-06-01,Taken back,Check,2001,Ines Calder,,100.00');
  });

  it('of another shop do not exist', async () => {
    const paid = await books.pay(await books.issued());
    const stranger = await api.signUp();
    const answer = await stranger.owner.post(`/payments/${paid.payments[0]!.id}/reverse`, { reason: 'x' });
    expect(answer.status).toBe(404);
    const { id, version } = await books.issued();
    const body = { method: 'cash', amountCents: 1, receivedOn: '2026-06-01' };
    expect((await stranger.owner.post(`/invoices/${id}/payments`, body, { version })).status).toBe(404);
  });
});
