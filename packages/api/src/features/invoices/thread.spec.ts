import type { CustomerPage } from '@bookmatch/common/customer-page/customer-page-contract';
import type { InvoiceRow } from '@bookmatch/common/invoices/invoices-contract';
import type { Job } from '@bookmatch/common/jobs/jobs-contract';
import { Books } from '../../../test/harness/books.js';
import { sendEstimate } from '../../../test/harness/estimate-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';
import { InvoiceDrafts } from './invoice-drafts.js';

describe('from the acceptance to the last payment', () => {
  let api: TestApi;
  let shop: TestShop;
  let books: Books;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    books = new Books(api, shop);
  });
  afterAll(() => api.close());

  async function accept() {
    const { customer } = await sendEstimate(api, shop.owner);
    const page = (await customer.get('')).body as Extract<CustomerPage, { subject: 'estimate' }>;
    const { document, documentHash } = page.estimate;
    const yes = { name: 'Ines Calder', revisionId: document.revisionId, documentHash, agreed: true };
    return { answer: await customer.post('/accept', yes), document };
  }
  const invoices = async () => ((await shop.owner.get('/invoices')).body as { rows: InvoiceRow[] }).rows;

  it('drafts the deposit with the acceptance, and books everything to the cent by the end', async () => {
    const { answer, document } = await accept();
    expect(answer.status).toBe(200);
    const [draft] = await invoices();
    const [first, second] = document.billingSchedule;
    expect(draft).toMatchObject({
      status: 'draft',
      kind: 'deposit',
      stageName: 'Deposit',
      totalCents: first!.totalCents,
    });
    expect(await books.balances()).toEqual({});

    const deposit = await books.issue(await books.read(draft!.id));
    await books.pay(deposit);
    expect(await books.balances()).toEqual({ '1000': first!.totalCents, '2300': first!.totalCents });

    const job = (await shop.owner.get(`/jobs/${draft!.jobId}`)).body as Job;
    expect(job.money?.billing[0]).toMatchObject({
      billedCents: first!.totalCents,
      paidCents: first!.totalCents,
    });
    const final = await books.pay(await books.issue(await books.draftStage(job, 1)));
    expect(final).toMatchObject({ kind: 'final', totalCents: second!.totalCents, standing: 'paid' });
    expect(await books.balances()).toEqual({
      '1000': document.totalCents,
      '2200': document.taxCents,
      '4000': document.netCents,
    });
  });

  it('takes the acceptance back when the deposit cannot be drafted: nothing half done', async () => {
    const before = (await invoices()).length;
    const broken = jest
      .spyOn(InvoiceDrafts.prototype, 'draftDueOnAcceptance')
      .mockRejectedValueOnce(new TypeError('no'));
    const { answer } = await accept();
    broken.mockRestore();
    expect(answer.status).toBe(500);
    expect(await invoices()).toHaveLength(before);
    const { body } = await shop.owner.get('/jobs');
    expect((body as { rows: unknown[] }).rows).toHaveLength(1);
  });
});
