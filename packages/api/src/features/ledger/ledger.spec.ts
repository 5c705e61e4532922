import type { AccountActivity, LedgerEntry } from '@bookmatch/common/ledger/ledger-contract';
import { Books } from '../../../test/harness/books.js';
import { TestApi } from '../../../test/harness/test-api.js';
import { postEntry } from './ledger-public.js';

describe('the ledger', () => {
  let api: TestApi;
  let books: Books;
  let ines: string;
  let sten: string;
  beforeAll(async () => {
    api = await TestApi.open();
    books = new Books(api, await api.signUp());
    ines = await books.customer({ name: 'Ines Calder' });
    sten = await books.customer({ name: 'Sten Halloran' });
    const first = await books.issued({ customerId: ines, taxRate: '0.1' }, [{ taxable: true }]);
    await books.pay(first, { amountCents: 5000, receivedOn: '2026-05-20' });
    await books.issued({ customerId: sten }, [{ unitPriceCents: 30_000 }]);
    const job = await books.job({ customerId: sten });
    await books.issue(await books.draftStage(job, 0));
  });
  afterAll(() => api.close());

  const entries = async (query: Record<string, string> = {}) =>
    (await books.client.get('/ledger/entries', query)).body as { rows: LedgerEntry[]; total: number };
  const activity = async (query: Record<string, string> = {}, code = '1200') =>
    (await books.client.get(`/ledger/accounts/${code}`, query)).body as AccountActivity;

  it('shows each entry with its lines, the newest first, and where it comes from', async () => {
    const { rows, total } = await entries();
    expect(total).toBe(4);
    expect(rows.map(({ number }) => number)).toEqual([4, 3, 2, 1]);
    expect(rows[0]).toMatchObject({
      kind: 'deposit-invoice',
      memo: 'Invoice 2003',
      source: { kind: 'invoice' },
    });
    expect(rows[3]?.lines).toMatchObject([
      { account: '1200', side: 'debit', amountCents: 11_000, customerId: ines },
      { account: '4000', side: 'credit', amountCents: 10_000 },
      { account: '2200', side: 'credit', amountCents: 1000 },
    ]);
    const one = await books.client.get(`/ledger/entries/${rows[0]?.id}`);
    expect(one.body).toEqual(rows[0]);
  });

  it('narrows by kind, customer, job, day and text, and pages', async () => {
    expect((await entries({ kind: 'payment' })).total).toBe(1);
    expect((await entries({ customerId: sten })).total).toBe(2);
    const { rows } = await entries({ kind: 'deposit-invoice' });
    expect((await entries({ jobId: rows[0]!.lines[0]!.jobId! })).total).toBe(1);
    expect((await entries({ to: '2026-05-31' })).total).toBe(1);
    const [payment] = (await entries({ kind: 'payment' })).rows;
    expect((await entries({ invoiceId: payment!.invoiceId })).rows.map(({ kind }) => kind)).toEqual([
      'payment',
      'invoice',
    ]);
    expect((await entries({ q: 'Payment of' })).total).toBe(1);
    const page = await entries({ limit: '3' });
    expect(page.rows).toHaveLength(3);
    expect((await books.client.get('/ledger/entries', { sort: 'memo' })).status).toBe(400);
  });

  it('balances every account at the end of a day', async () => {
    const { body } = await books.client.get('/ledger/trial-balance', { on: '2026-05-31' });
    expect(body).toMatchObject({ debitCents: 5000, creditCents: 5000 });
    const today = await books.client.get('/ledger/trial-balance');
    expect(today.body).toMatchObject({ on: '2026-06-01', debitCents: 84_300, creditCents: 84_300 });
    expect(await books.balances()).toEqual({
      '1000': 5000,
      '1200': 79_300,
      '2200': 1000,
      '2300': 43_300,
      '4000': 40_000,
    });
  });

  it('follows an account line by line with a running balance, in both directions and across pages', async () => {
    const all = await activity();
    expect(all).toMatchObject({
      name: 'Accounts receivable',
      openingBalanceCents: 0,
      closingBalanceCents: 79_300,
    });
    expect(all.rows.map(({ balanceCents }) => balanceCents)).toEqual([11_000, 6000, 36_000, 79_300]);
    const back = await activity({ sort: '-number' });
    expect(back.rows.map(({ balanceCents }) => balanceCents)).toEqual([79_300, 36_000, 6000, 11_000]);
    const first = await activity({ limit: '3' });
    const second = await activity({ limit: '3', after: first.next ?? '' });
    expect(second.rows.map(({ balanceCents }) => balanceCents)).toEqual([79_300]);
  });

  it('opens an account with what came before the first day', async () => {
    const june = await activity({ from: '2026-06-01' });
    expect(june).toMatchObject({ openingBalanceCents: -5000, closingBalanceCents: 79_300 });
    expect(june.rows.map(({ balanceCents }) => balanceCents)).toEqual([6000, 36_000, 79_300]);
    const hers = await activity({ customerId: ines });
    expect(hers.rows.map(({ balanceCents }) => balanceCents)).toEqual([11_000, 6000]);
    expect(hers.closingBalanceCents).toBe(6000);
  });

  it('knows no account but its own', async () => {
    for (const code of ['1234', 'x', '1200%20or%201'])
      expect((await books.client.get(`/ledger/accounts/${code}`)).status).toBe(404);
  });

  it('goes out as CSV, a line of the ledger in each row, that balances', async () => {
    const { text } = await books.client.get('/ledger/export');
    const [head, ...rows] = text.trim().split('\r\n');
    expect(head).toBe('Entry,Date,Kind,Memo,Account,Account name,Debit,Credit,Customer,Job');
    expect(rows).toHaveLength(9);
    const sum = (column: number) =>
      rows.reduce((total, row) => total + Math.round(Number(row.split(',')[column] || 0) * 100), 0);
    expect(sum(6)).toBe(sum(7));
    expect(
      (await books.client.get('/ledger/export', { to: '2026-05-31' })).text.trim().split('\r\n'),
    ).toHaveLength(3);
  });

  it('takes no entry that does not balance, and then nothing of its transaction', async () => {
    const before = await entries();
    const line = { customerId: ines, jobId: null };
    const stamp = { author: { kind: 'system' as const }, requestId: 'test', now: api.clock.read() };
    const id = before.rows[0]!.id;
    const post = api.platform.work.transaction(stamp, (scope) =>
      postEntry(scope.forShop(books.shop.id), {
        kind: 'payment',
        on: '2026-06-01',
        memo: 'Lopsided',
        source: { kind: 'payment', id },
        invoiceId: id,
        lines: [
          { ...line, account: '1000', side: 'debit', amountCents: 100 },
          { ...line, account: '1200', side: 'credit', amountCents: 99 },
        ],
      }),
    );
    await expect(post).rejects.toThrow('an entry must balance');
    expect((await entries()).total).toBe(before.total);
  });

  it('is read by owners and bookkeepers only, and never written over the wire', async () => {
    const { client: bookkeeper } = await books.shop.join('bookkeeper');
    expect((await bookkeeper.get('/ledger/trial-balance')).status).toBe(200);
    for (const role of ['lead-hand', 'crew'] as const) {
      const { client } = await books.shop.join(role);
      for (const path of [
        '/ledger/entries',
        '/ledger/trial-balance',
        '/ledger/accounts/1200',
        '/ledger/export',
      ])
        expect([role, path, (await client.get(path)).status]).toEqual([role, path, 403]);
    }
    const writing = api.product.routes.filter(
      ({ path, method }) => path.startsWith('/ledger') && method !== 'get',
    );
    expect(writing).toEqual([]);
  });
});
