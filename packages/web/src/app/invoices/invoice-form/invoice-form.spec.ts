import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatAutocompleteHarness } from '@angular/material/autocomplete/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { buildCustomer } from '@bookmatch/common/testing/build-customer';
import { buildInvoice } from '@bookmatch/common/testing/build-invoice';
import { buildJob, buildJobMoney } from '@bookmatch/common/testing/build-job';
import { nextId } from '@bookmatch/common/testing/ids';
import type { JobBillingRow } from '@bookmatch/common/jobs/jobs-contract';
import { openShopScreen } from '../../testing/shop-screen';
import invoicesRoutes from '../invoices.routes';

const routes = [{ path: 'invoices', children: invoicesRoutes }];
const customer = buildCustomer();

async function open(url: string) {
  const screen = await openShopScreen(routes, url);
  const loader = TestbedHarnessEnvironment.documentRootLoader(screen.fixture);
  const press = async (text: string | RegExp) =>
    (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  const fields = async (name: string) => {
    const found = [];
    for (const input of await loader.getAllHarnesses(MatInputHarness))
      if ((await (await input.host()).getAttribute('formcontrolname')) === name) found.push(input);
    return found;
  };
  return { ...screen, loader, press, fields };
}

describe('InvoiceForm', () => {
  it('writes a free invoice, with its sums while it is typed', async () => {
    const { http, shop, press, fields, loader, element, fixture } = await open('/invoices/new');
    http.match(shop('/shop')).forEach((request) => request.flush({}, { status: 500, statusText: '' }));
    const who = await loader.getHarness(MatAutocompleteHarness);
    await who.enterText('Wre');
    await new Promise((resolve) => setTimeout(resolve, 300));
    http
      .expectOne((request) => request.url === shop('/customers'))
      .flush({ rows: [{ ...customer, city: 'Stowe' }], next: null });
    await fixture.whenStable();
    document.querySelector<HTMLElement>('mat-option')!.click();
    http.expectOne(shop(`/customers/${customer.id}`)).flush({ ...customer, sites: [] });
    http.expectOne((request) => request.url === shop('/jobs')).flush({ rows: [], next: null });
    await (await fields('taxRate'))[0]!.setValue('6');
    await (await fields('description'))[0]!.setValue('Repair of a door');
    await (await fields('quantity'))[0]!.setValue('2.5');
    await (await fields('unitPriceCents'))[0]!.setValue('100');
    await fixture.whenStable();
    expect(element.querySelector('.total')?.textContent).toContain('$265.00');
    await press('Save draft');
    const request = http.expectOne(shop('/invoices'));
    expect(request.request.body).toMatchObject({
      from: 'lines',
      customerId: customer.id,
      jobId: null,
      taxRate: '0.06',
      lines: [{ description: 'Repair of a door', quantity: '2.5', unitPriceCents: 10_000, taxable: true }],
    });
  });

  it('says at each field what is missing, and sends nothing', async () => {
    const { http, shop, press, element, fixture } = await open('/invoices/new');
    http.match(shop('/shop')).forEach((request) => request.flush({}, { status: 500, statusText: '' }));
    await press('Save draft');
    await fixture.whenStable();
    expect(element.textContent).toContain('Choose a customer from the list.');
    expect(element.textContent).toContain('The description cannot be empty.');
    http.expectNone(shop('/invoices'));
  });

  it('offers the stages of a job that wait to be billed, and drafts one at a press', async () => {
    const stage = (name: string, invoice: JobBillingRow['invoice']): JobBillingRow => ({
      ...{
        billingStageId: nextId(),
        name,
        share: { percent: '40' },
        deposit: false,
        due: 'by-hand',
        invoice,
      },
      ...{ plannedCents: 43_300, billedCents: 0, paidCents: 0 },
    });
    const draft = { id: nextId(), number: null, standing: 'draft', daysOverdue: 0 } as const;
    const billing = [stage('Deposit', draft), stage('Installed', null)];
    const job = buildJob({ money: buildJobMoney({ billing }) });
    const { http, shop, press, element, fixture } = await open(`/invoices/new?jobId=${job.id}`);
    http.match(shop('/shop')).forEach((request) => request.flush({}, { status: 500, statusText: '' }));
    http.expectOne(shop(`/jobs/${job.id}`)).flush(job);
    http
      .expectOne(shop(`/customers/${job.customer.id}`))
      .flush({ ...buildCustomer(job.customer), sites: [] });
    http.expectOne((request) => request.url === shop('/jobs')).flush({ rows: [], next: null });
    http.expectOne(shop(`/jobs/${job.id}`)).flush(job);
    await fixture.whenStable();
    const offered = element.querySelector('section[aria-label^="Stages"]')?.textContent ?? '';
    expect(offered).not.toContain('Bill Deposit');
    await press(/Bill Installed, \$433.00/);
    expect(http.expectOne(shop('/invoices')).request.body).toEqual({
      from: 'stage',
      jobId: job.id,
      billingStageId: billing[1]!.billingStageId,
    });
  });

  it('keeps the agreed amounts of a stage, and changes the note and the due date', async () => {
    const draft = buildInvoice({
      status: 'draft',
      taxRate: null,
      billingStage: { id: '01940000-0000-7000-8000-0000000000e1', name: 'Deposit' },
    });
    const { http, shop, press, fields, element, fixture } = await open(`/invoices/${draft.id}/edit`);
    http.expectOne(shop(`/invoices/${draft.id}`)).flush(draft);
    await fixture.whenStable();
    expect(element.textContent).toContain('were agreed with the customer');
    await (await fields('memo'))[0]!.setValue('Thank you.');
    await (await fields('dueOn'))[0]!.setValue('2027-02-10');
    await press('Save draft');
    const request = http.expectOne(shop(`/invoices/${draft.id}`));
    expect(request.request.method).toBe('PATCH');
    expect(request.request.body).toEqual({ memo: 'Thank you.', dueOn: '2027-02-10' });
  });
});
