import { randomUUID } from 'node:crypto';
import type { CustomerInvoice } from '@bookmatch/common/customer-page/customer-page-contract';
import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import type { Job } from '@bookmatch/common/jobs/jobs-contract';
import type { TrialBalance } from '@bookmatch/common/ledger/ledger-contract';
import { Shop } from '../../src/features/shops/shops-public.js';
import type { Client } from './client.js';
import type { TestApi, TestShop } from './test-api.js';

type Line = { description: string; quantity: string; unitPriceCents: number; taxable: boolean };
const THREE_STAGES = [
  { name: 'Deposit', share: { percent: '40' }, deposit: true, due: 'on-acceptance' },
  { name: 'Ready to finish', share: { percent: '40' }, deposit: false, due: 'by-hand' },
  { name: 'Installed', share: { remainder: true }, deposit: false, due: 'by-hand' },
];

/** What a bookkeeper does in a test, each act through HTTP. Throws when an act that should work is refused. */
export class Books {
  private customerId: string | undefined;

  constructor(
    readonly api: TestApi,
    readonly shop: TestShop,
    readonly client: Client = shop.owner,
  ) {}

  async customer(fields: object = {}): Promise<string> {
    const body = { kind: 'homeowner', name: 'Ines Calder', email: 'ines@customer.test', ...fields };
    return (await this.done<{ id: string }>(this.client.post('/customers', body))).id;
  }

  async anyCustomer(): Promise<string> {
    return (this.customerId ??= await this.customer());
  }

  /** A job of $1,000.00 and $82.50 tax, billed 40 % down, 40 %, and the rest. */
  async job(fields: object = {}): Promise<Job> {
    const body = {
      title: 'Mudroom lockers',
      customerId: await this.anyCustomer(),
      contractNetCents: 100_000,
      contractTaxCents: 8250,
      billingSchedule: THREE_STAGES,
      ...fields,
    };
    return this.done<Job>(this.client.post('/jobs', body));
  }

  /** The ids of the job's billing stages, in order. */
  stages(job: Job): string[] {
    return (job.money?.billing ?? []).map(({ billingStageId }) => billingStageId);
  }

  draftStage(job: Job, index: number): Promise<Invoice> {
    const stage = { from: 'stage', jobId: job.id, billingStageId: this.stages(job)[index] };
    return this.done<Invoice>(this.client.post('/invoices', stage));
  }

  /** A free draft; $100.00 without tax unless said otherwise. */
  async draft(fields: object = {}, lines: Partial<Line>[] = [{}]): Promise<Invoice> {
    const body = {
      from: 'lines',
      customerId: await this.anyCustomer(),
      taxRate: '0',
      lines: lines.map((line) => this.line(line)),
      ...fields,
    };
    return this.done<Invoice>(this.client.post('/invoices', body));
  }

  line(line: Partial<Line> = {}) {
    const usual = { description: 'Repair', quantity: '1', unitPriceCents: 10_000, taxable: false };
    return { id: randomUUID(), ...usual, ...line };
  }

  issue({ id, version }: Invoice): Promise<Invoice> {
    return this.done<Invoice>(this.client.post(`/invoices/${id}/issue`, {}, { version }));
  }

  async issued(fields: object = {}, lines: Partial<Line>[] = [{}]): Promise<Invoice> {
    return this.issue(await this.draft(fields, lines));
  }

  read(id: string): Promise<Invoice> {
    return this.done<Invoice>(this.client.get(`/invoices/${id}`));
  }

  pay({ id, version, balanceCents }: Invoice, fields: object = {}): Promise<Invoice> {
    const body = { method: 'check', amountCents: balanceCents, receivedOn: '2026-06-01', ...fields };
    return this.done<Invoice>(this.client.post(`/invoices/${id}/payments`, body, { version }));
  }

  credit({ id, version }: Invoice, fields: object = {}): Promise<Invoice> {
    const body = { reason: 'A door came late.', ...fields };
    return this.done<Invoice>(this.client.post(`/invoices/${id}/credit-notes`, body, { version }));
  }

  /** The trial balance as code → balance on the account's own side, accounts at zero left out. */
  async balances(): Promise<Record<string, number>> {
    const { rows } = await this.done<TrialBalance>(
      this.client.get('/ledger/trial-balance', { on: '2030-12-31' }),
    );
    const sides = rows.map(({ account, normalSide, debitCents, creditCents }) => [
      account,
      normalSide === 'debit' ? debitCents - creditCents : creditCents - debitCents,
    ]);
    return Object.fromEntries(sides.filter(([, cents]) => cents !== 0)) as Record<string, number>;
  }

  /** A customer's link to the invoice, as a browser with paths below it. */
  async customerPage({ id }: Invoice): Promise<{ client: Client; read(): Promise<CustomerInvoice> }> {
    const body = { subject: 'invoice', subjectId: id };
    const { url } = await this.done<{ url: string }>(this.client.post('/links', body));
    const client = this.api.browser().below(`/api/links/${url.split('/c/')[1]}`);
    return {
      client,
      read: async () => (await this.done<{ invoice: CustomerInvoice }>(client.get(''))).invoice,
    };
  }

  /** Puts the shop's connected account in place, as its onboarding would. */
  async takeCards(): Promise<string> {
    const { payments, work } = this.api.platform;
    const account = await payments.accounts.create({
      country: 'US',
      email: 'shop@shop.test',
      type: 'standard',
    });
    const link = await payments.accountLinks.create({
      account: account.id,
      type: 'account_onboarding',
      refresh_url: 'http://shop.test/refresh',
      return_url: 'http://shop.test/return',
    });
    await submit(link.url, { action: 'complete', business_name: 'Alder Court Cabinets' });
    const stamp = { author: { kind: 'system' as const }, requestId: 'test', now: this.api.clock.read() };
    await work.transaction(stamp, async (scope) => {
      const shops = scope.global(Shop);
      const row = await shops.get(this.shop.id, true);
      await shops.update(row, { paymentAccountId: account.id, cardPayments: 'ready' });
    });
    return account.id;
  }

  async done<Body>(call: Promise<{ status: number; body: unknown; text: string }>): Promise<Body> {
    const answer = await call;
    if (answer.status >= 300) throw new Error(`${answer.status}: ${answer.text}`);
    return answer.body as Body;
  }
}

/** Posts a form of the provider's hosted pages, without following where it leads. */
export function submit(url: string, form: Record<string, string>): Promise<Response> {
  return fetch(url, { method: 'POST', redirect: 'manual', body: new URLSearchParams(form) });
}
