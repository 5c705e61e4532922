import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import { Books } from '../../../test/harness/books.js';
import { TestApi } from '../../../test/harness/test-api.js';

describe('letters about invoices', () => {
  let api: TestApi;
  let books: Books;
  beforeAll(async () => {
    api = await TestApi.open();
    books = new Books(api, await api.signUp({ shopName: 'Alder Court Cabinets' }));
  });
  afterAll(() => api.close());

  const send = (path: string, body: object, version?: number) =>
    books.client.post(path, body, version === undefined ? {} : { version });

  it('carry the PDF, the amount, and a link that opens the customer’s page', async () => {
    const issued = await books.issued();
    const body = { to: 'letter@customer.test', message: 'Thank you for the work.' };
    const answer = await send(`/invoices/${issued.id}/send`, body, issued.version);
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({ sends: [{ document: 'invoice', to: 'letter@customer.test' }] });
    const [letter] = await api.lettersTo('letter@customer.test');
    expect(letter?.subject).toBe(`Invoice ${issued.number} from Alder Court Cabinets`);
    expect(letter?.text).toContain('Thank you for the work.');
    expect(letter?.text).toContain('$100.00 is due on Mon, Jun 15, 2026.');
    expect(letter?.attachments).toMatchObject([
      { name: `Invoice ${issued.number}.pdf`, contentType: 'application/pdf' },
    ]);
    const token = /\/c\/([\w-]+)/.exec(letter?.text ?? '')?.[1];
    const page = await api.browser().get(`/links/${token}`);
    expect(page.body).toMatchObject({ subject: 'invoice', invoice: { number: issued.number } });
  });

  it('remind when the invoice is late', async () => {
    const draft = await books.draft();
    const early = await books.client.patch(`/invoices/${draft.id}`, { dueOn: '2026-06-02' }, draft.version);
    const issued = await books.issue(early.body as Invoice);
    api.clock.forward({ days: 10 });
    // The owner's session has ended by then.
    const { client: later } = await books.shop.join('bookkeeper');
    const { version } = issued;
    await later.post(`/invoices/${issued.id}/send`, { to: 'late@customer.test' }, { version });
    const [letter] = await api.lettersTo('late@customer.test');
    expect(letter?.subject).toContain('Reminder: invoice');
    expect(letter?.text).toContain('9 days ago');
    api.clock.forward({ days: -10 });
  });

  it('are refused for a draft, a stale version and a bad address, and then none goes out', async () => {
    const draft = await books.draft();
    const to = 'nobody@customer.test';
    expect((await send(`/invoices/${draft.id}/send`, { to }, draft.version)).status).toBe(409);
    const issued = await books.issue(draft);
    expect((await send(`/invoices/${issued.id}/send`, { to }, 1)).status).toBe(412);
    const injected = { to: 'a@b.test\r\nBcc: c@d.test' };
    expect((await send(`/invoices/${issued.id}/send`, injected, issued.version)).status).toBe(422);
    expect(await api.lettersTo(to)).toEqual([]);
  });

  it('carry receipts and credit notes', async () => {
    const paid = await books.pay(await books.issued(), { amountCents: 4000 });
    const credited = await books.credit(paid, { amountCents: 1000, reason: 'A scratch on the door.' });
    const to = 'both@customer.test';
    expect((await send(`/payments/${paid.payments[0]!.id}/send`, { to })).status).toBe(204);
    expect((await send(`/credit-notes/${credited.creditNotes[0]!.id}/send`, { to })).status).toBe(204);
    const [receipt, note] = await api.lettersTo(to);
    expect(receipt?.text).toContain('We have received $40.00');
    expect(note?.text).toContain('We have taken $10.00 off');
    expect(note?.text).toContain('A scratch on the door.');
    expect([receipt, note].map((letter) => letter?.attachments[0]?.name)).toEqual([
      `Receipt for invoice ${paid.number}.pdf`,
      'Credit note 501.pdf',
    ]);
    expect((await books.read(paid.id)).sends.map(({ document }) => document)).toEqual([
      'payment-receipt',
      'credit-note',
    ]);
  });

  it('thank for no payment that was taken back', async () => {
    const paid = await books.pay(await books.issued());
    const { id } = paid.payments[0]!;
    expect((await send(`/payments/${id}/reverse`, { reason: 'The check bounced.' })).status).toBe(201);
    const to = 'bounced@customer.test';
    expect((await send(`/payments/${id}/send`, { to })).status).toBe(409);
    expect(await api.lettersTo(to)).toEqual([]);
  });

  it('cannot be sent to a customer’s link of a draft', async () => {
    const draft = await books.draft();
    const answer = await send('/links', { subject: 'invoice', subjectId: draft.id });
    expect(answer.status).toBe(409);
  });
});
