import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import { Books } from '../../../test/harness/books.js';
import { TestApi } from '../../../test/harness/test-api.js';

describe('credit notes', () => {
  let api: TestApi;
  let books: Books;
  beforeAll(async () => {
    api = await TestApi.open();
    books = new Books(api, await api.signUp());
  });
  afterAll(() => api.close());

  const taxed = (books: Books) =>
    books.issued({ taxRate: '0.0825' }, [{ unitPriceCents: 9999, taxable: true }]);
  const credit = (invoice: Invoice, fields: object) =>
    books.client.post(`/invoices/${invoice.id}/credit-notes`, fields, { version: invoice.version });

  it('take part of an invoice back with its tax, numbered by themselves, and give back the rest to the cent', async () => {
    const apart = new Books(api, await api.signUp());
    const issued = await taxed(apart);
    expect(issued).toMatchObject({ netCents: 9999, taxCents: 825, totalCents: 10_824 });
    const part = await apart.credit(issued, { amountCents: 1000, reason: 'A scratch.' });
    expect(part).toMatchObject({
      standing: 'due',
      creditedCents: 1000,
      balanceCents: 9824,
      creditNotes: [{ number: 501, netCents: 924, taxCents: 76, amountCents: 1000, reason: 'A scratch.' }],
    });
    const whole = await apart.credit(part);
    expect(whole).toMatchObject({ status: 'credited', standing: 'credited', balanceCents: 0 });
    const { creditNotes } = whole;
    expect(creditNotes.map(({ number }) => number)).toEqual([501, 502]);
    expect(creditNotes[0]!.taxCents + creditNotes[1]!.taxCents).toBe(825);
    expect(await apart.balances()).toEqual({ '4000': 9999, '4900': 9999 });
  });

  it('leave an invoice paid when money settled the rest', async () => {
    const part = await books.pay(await books.issued(), { amountCents: 6000 });
    expect(await books.credit(part)).toMatchObject({ status: 'paid', creditedCents: 4000, paidCents: 6000 });
  });

  it('are refused above what is owed, without a reason, and on drafts and paid invoices', async () => {
    const issued = await books.issued();
    const over = await credit(issued, { amountCents: 10_001, reason: 'x' });
    expect(over.body).toMatchObject({ fields: [{ path: 'amountCents' }] });
    expect((await credit(issued, { amountCents: 1, reason: ' ' })).status).toBe(422);
    expect((await credit(await books.draft(), { reason: 'x' })).status).toBe(409);
    expect((await credit(await books.pay(issued), { reason: 'x' })).status).toBe(409);
  });

  it('of the whole balance, 20 at once, go through exactly once', async () => {
    const issued = await books.issued();
    const answers = await Promise.all(Array.from({ length: 20 }, () => credit(issued, { reason: 'x' })));
    expect(answers.filter(({ status }) => status === 201)).toHaveLength(1);
    expect((await books.read(issued.id)).creditNotes).toHaveLength(1);
  });

  it('of a whole stage let the stage be billed again', async () => {
    const job = await books.job();
    await books.credit(await books.issue(await books.draftStage(job, 1)));
    const again = await books.issue(await books.draftStage(job, 1));
    expect(again).toMatchObject({ status: 'issued', billingStage: { name: 'Ready to finish' } });
  });

  it('and receipts and invoices come as PDF in the name of the shop, drafts included', async () => {
    const paid = await books.pay(await books.issued(), { amountCents: 4000 });
    const { creditNotes } = await books.credit(paid, { amountCents: 1000 });
    const draft = await books.draft();
    for (const path of [
      `/invoices/${paid.id}/pdf`,
      `/invoices/${draft.id}/pdf`,
      `/credit-notes/${creditNotes[0]!.id}/pdf`,
      `/payments/${paid.payments[0]!.id}/pdf`,
    ]) {
      const answer = await books.client.get(path);
      expect([path, answer.status, answer.headers['content-type']]).toEqual([path, 200, 'application/pdf']);
      expect((answer.body as Buffer).subarray(0, 5).toString()).toBe('%PDF-');
    }
  });
});
