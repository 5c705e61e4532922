import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import { buildCustomer, buildSite } from '@bookmatch/common/testing/build-customer';
import { buildJob } from '@bookmatch/common/testing/build-job';
import { openShopScreen } from '../../testing/shop-screen';
import jobsRoutes from '../jobs.routes';
import { idOf } from '../testing/build-jobs';

const routes = [{ path: 'jobs', children: jobsRoutes }];
const operation: Operation = {
  ...{ id: idOf(70), version: 1, name: 'Face frames', position: 1, costCategory: 'labor' },
  ...{ onJob: true, archived: false },
};

async function open(url: string) {
  const screen = await openShopScreen(routes, url);
  const { http, shop, fixture } = screen;
  const operations = [operation, { ...operation, id: idOf(71), name: 'Old way', archived: true }];
  http.expectOne(shop('/operations')).flush({ rows: operations });
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.loader(fixture);
  const type = async (label: RegExp, text: string) => {
    for (const field of screen.element.querySelectorAll('mat-form-field'))
      if (label.test(field.querySelector('mat-label')?.textContent ?? '')) {
        const input = await loader.getHarness(
          MatInputHarness.with({ selector: `#${field.querySelector('input')!.id}` }),
        );
        await input.setValue(text);
      }
  };
  const press = async () => (await loader.getHarness(MatButtonHarness.with({ text: 'Add job' }))).click();
  return { ...screen, type, press };
}

describe('JobForm', () => {
  it('names what is missing at its field and sends nothing', async () => {
    const { press, element, http, shop } = await open('/jobs/new');
    await press();
    expect(element.textContent).toContain('The title cannot be empty.');
    expect(element.textContent).toContain('Choose a customer from the list.');
    http.expectNone(shop('/jobs'));
  });

  it('sends the plan for the customer of the address, and opens the job that was made', async () => {
    const { http, shop, type, press, fixture, element, harness } = await open(
      `/jobs/new?customerId=${idOf(80)}`,
    );
    const site = buildSite({ id: idOf(81), customerId: idOf(80) });
    const customer = { ...buildCustomer({ id: idOf(80) }), sites: [site] };
    http.expectOne(shop(`/customers/${idOf(80)}`)).flush(customer);
    await fixture.whenStable();
    expect(element.textContent).not.toContain('Old way');
    await type(/^Title/, 'Window seat');
    await type(/^Price/, '1,200');
    await type(/^Face frames/, 'seven');
    await press();
    expect(element.textContent).toContain('Give hours, such as 7.5.');
    await type(/^Face frames/, '7.5');
    await press();
    const call = http.expectOne(shop('/jobs'));
    expect(call.request.body).toMatchObject({
      title: 'Window seat',
      customerId: idOf(80),
      siteId: idOf(81),
      contractNetCents: 120_000,
      operations: [{ operationId: idOf(70), plannedMinutes: 450 }],
      plannedCosts: [],
    });
    const made = buildJob();
    call.flush(made);
    await harness.fixture.whenStable();
    http.expectOne(shop(`/jobs/${made.id}`));
  });
});
