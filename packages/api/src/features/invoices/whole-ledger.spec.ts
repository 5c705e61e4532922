import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import type { Job } from '@bookmatch/common/jobs/jobs-contract';
import { Books } from '../../../test/harness/books.js';
import { TestApi } from '../../../test/harness/test-api.js';
import { CardCheckout } from './card-checkout.entity.js';
import { Invoice as InvoiceRow } from './invoice.entity.js';
import { PaymentsService } from './payments-service.js';

const SEEDS = [7, 1848, 20_260_601];
const ACTS = 70;

/** A small generator with a seed (Park and Miller's minimal standard), so that a failure can be run again. */
function randomFrom(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state = (state * 48_271) % 2_147_483_647;
    return state % below;
  };
}

describe.each(SEEDS)('after random acts of a shop (seed %i), the ledger', (seed) => {
  let api: TestApi;
  let books: Books;
  const random = randomFrom(seed);
  const invoices = new Map<string, Invoice>();
  const jobs: Job[] = [];
  const refused: number[] = [];

  beforeAll(async () => {
    api = await TestApi.open();
    books = new Books(api, await api.signUp());
    for (let index = 0; index < ACTS; index += 1) await act();
  }, 120_000);
  afterAll(() => api.close());

  const pick = <Item>(items: Item[]): Item | undefined => items[random(Math.max(1, items.length))];
  /** Read again, since an act on its job may have moved it. */
  const some = async (status: string) => {
    const known = pick([...invoices.values()].filter((invoice) => invoice.status === status));
    return known && books.read(known.id);
  };
  const keep = async (id: string) => invoices.set(id, await books.read(id));

  async function act(): Promise<void> {
    const acts = [
      newJob,
      billStage,
      draftFree,
      issue,
      issue,
      payPart,
      payAll,
      credit,
      reverse,
      payByCard,
      close,
    ];
    await acts[random(acts.length)]!();
  }
  async function newJob() {
    const net = 10_000 + random(900_000);
    jobs.push(await books.job({ contractNetCents: net, contractTaxCents: random(Math.floor(net / 10)) }));
  }
  async function billStage() {
    const job = pick(jobs);
    if (!job) return;
    const stages = books.stages(job);
    const body = { from: 'stage', jobId: job.id, billingStageId: stages[random(stages.length)] };
    const answer = await books.client.post('/invoices', body);
    if (answer.status === 201) await keep((answer.body as Invoice).id);
    else refused.push(answer.status);
  }
  async function draftFree() {
    const line = () => ({
      quantity: String(1 + random(9)),
      unitPriceCents: 1 + random(40_000),
      taxable: random(2) === 0,
    });
    const { id } = await books.draft({ taxRate: `0.0${random(10)}` }, [line(), line()]);
    await keep(id);
  }
  async function issue() {
    const draft = await some('draft');
    if (draft) await keep((await books.issue(draft)).id);
  }
  async function payPart() {
    const invoice = await some('issued');
    if (invoice) await keep((await books.pay(invoice, { amountCents: 1 + random(invoice.balanceCents) })).id);
  }
  async function payAll() {
    const invoice = await some('issued');
    if (invoice) await keep((await books.pay(invoice, { method: 'transfer' })).id);
  }
  async function credit() {
    const invoice = await some('issued');
    if (invoice)
      await keep((await books.credit(invoice, { amountCents: 1 + random(invoice.balanceCents) })).id);
  }
  async function reverse() {
    const invoice = pick([...invoices.values()].filter(({ payments }) => payments.length > 0));
    const payment = pick(invoice?.payments ?? []);
    if (!invoice || !payment) return;
    const answer = await books.client.post(`/payments/${payment.id}/reverse`, {
      reason: 'A test of nerves.',
    });
    if (answer.status === 201) await keep(invoice.id);
    else refused.push(answer.status);
  }
  /** A card that was charged for some amount, whatever is owed by the time the news arrives. */
  async function payByCard() {
    const invoice = (await some('issued')) ?? (await some('paid'));
    if (!invoice) return;
    const stamp = { author: { kind: 'system' as const }, requestId: 'test', now: api.clock.read() };
    await api.platform.work.transaction(stamp, async (scope) => {
      const inShop = scope.forShop(books.shop.id);
      const row = await inShop.rows(InvoiceRow).getForUpdate(invoice.id);
      const checkout = await inShop.rows(CardCheckout).insert({
        ...{
          id: scope.newId(),
          invoiceId: invoice.id,
          linkId: scope.newId(),
          status: 'paid',
          payerEmail: '',
        },
        ...{ amountCents: 1, accountId: 'acct_test', sessionId: null, url: null, expiresAt: null },
      });
      const amountCents = 1 + random(60_000);
      await new PaymentsService().receiveCard(inShop, row, checkout, {
        amountCents,
        on: '2026-06-01',
        reference: 'pi',
      });
    });
    await keep(invoice.id);
  }
  async function close() {
    const job = pick(jobs);
    if (!job) return;
    const { version } = (await books.client.get(`/jobs/${job.id}`)).body as Job;
    const body = { stage: 'closed', confirmSkip: true, reason: 'Done.' };
    const answer = await books.client.post(`/jobs/${job.id}/move`, body, { version });
    if (answer.status !== 200) refused.push(answer.status);
  }

  const sumOf = (values: number[]) => values.reduce((sum, value) => sum + value, 0);
  const query = <Row>(sql: string) => api.platform.dataSource.query<Row[]>(sql);
  const balance = (account: string, sign: string, by: string) =>
    query<{ key: string | null; cents: string }>(
      `select ${by} as \`key\`, sum(case side when '${sign}' then amount_cents else -amount_cents end) as cents
       from ledger_line where account = '${account}' group by ${by} having cents <> 0`,
    );

  it('was put through acts of every kind', async () => {
    const kinds = await query<{ kind: string }>('select distinct kind from ledger_entry');
    expect(kinds.map(({ kind }) => kind).sort()).toEqual(
      expect.arrayContaining(['credit-note', 'invoice', 'payment']),
    );
    for (const status of refused) expect(status).toBe(409);
  });

  it('balances entry by entry and in all, numbered without a gap', async () => {
    const lopsided = await query(
      `select entry_id from ledger_line group by entry_id
       having sum(case side when 'debit' then amount_cents else -amount_cents end) <> 0`,
    );
    expect(lopsided).toEqual([]);
    const entries = await query<{ number: number }>('select number from ledger_entry order by number');
    expect(entries.map(({ number }) => number)).toEqual(entries.map((_, index) => index + 1));
    const { body } = await books.client.get('/ledger/trial-balance', { on: '2030-12-31' });
    const { debitCents, creditCents } = body as { debitCents: number; creditCents: number };
    expect(debitCents).toBe(creditCents);
    expect(debitCents).toBeGreaterThan(0);
  });

  it('says of every invoice what the invoice says of itself', async () => {
    const owed = await query<{ id: string; cents: string }>(
      `select coalesce(p.invoice_id, c.invoice_id, e.source_id) as id,
              sum(case l.side when 'debit' then l.amount_cents else -l.amount_cents end) as cents
       from ledger_line l join ledger_entry e on e.shop_id = l.shop_id and e.id = l.entry_id
       left join payment p on p.shop_id = e.shop_id and p.id = e.source_id
       left join credit_note c on c.shop_id = e.shop_id and c.id = e.source_id
       where l.account = '1200' group by id`,
    );
    const byInvoice = new Map(owed.map(({ id, cents }) => [id, Number(cents)]));
    for (const { id } of invoices.values()) {
      const { balanceCents, totalCents, paidCents, creditedCents, status } = await books.read(id);
      expect([id, byInvoice.get(id) ?? 0]).toEqual([id, balanceCents]);
      if (status !== 'draft') expect(balanceCents).toBe(totalCents - paidCents - creditedCents);
      expect(balanceCents).toBeGreaterThanOrEqual(0);
    }
  });

  it('holds as deposits, job by job, exactly what was billed ahead and is not earned', async () => {
    const held = await balance('2300', 'credit', 'job_id');
    const expected = await query<{ key: string; cents: string }>(
      `select job_id as \`key\`, sum(total_cents - credited_cents) as cents from invoice
       where kind = 'deposit' and status <> 'draft' and deposit_earned_on is null group by job_id having cents <> 0`,
    );
    const plain = (rows: { key: string | null; cents: string }[]) =>
      Object.fromEntries(rows.map(({ key, cents }) => [key, Number(cents)]));
    expect(plain(held)).toEqual(plain(expected));
  });

  it('owes the state the tax of what was sold, less credits, and customers what came beyond their debt', async () => {
    const [tax] = await query<{ cents: string | null }>(
      `select sum(tax_cents) - coalesce((select sum(c.tax_cents) from credit_note c
          join invoice of_note on of_note.shop_id = c.shop_id and of_note.id = c.invoice_id
          where of_note.kind <> 'deposit' or of_note.deposit_earned_on is not null), 0) as cents
       from invoice where status <> 'draft' and (kind <> 'deposit' or deposit_earned_on is not null)`,
    );
    const balances = await books.balances();
    expect(balances['2200'] ?? 0).toBe(Number(tax?.cents ?? 0));
    const all = await Promise.all([...invoices.keys()].map((id) => books.read(id)));
    expect(balances['2350'] ?? 0).toBe(sumOf(all.map(({ overpaidCents }) => overpaidCents)));
    expect(balances['1200'] ?? 0).toBe(sumOf(all.map(({ balanceCents }) => balanceCents)));
    const { aging } = (await books.client.get('/invoices/totals')).body as { aging: { totalCents: number } };
    expect(aging.totalCents).toBe(balances['1200'] ?? 0);
  });
});
