import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import type { Role } from '@bookmatch/common/access/roles';
import type { Job } from '@bookmatch/common/jobs/jobs-contract';
import { buildJob, buildJobMoney, buildJobOperation } from '@bookmatch/common/testing/build-job';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { LeafPairHarness } from '../../ui/leaf-pair/leaf-pair.harness';
import jobsRoutes from '../jobs.routes';
import { buildBillingRow, buildJobCost, buildJobFile, idOf } from '../testing/build-jobs';

const routes = [
  { path: 'jobs', children: jobsRoutes },
  { path: 'invoices/:id', children: [] },
];
const money = buildJobMoney({
  costs: [
    { category: 'material', plannedCents: 218_000, actualCents: 206_100 },
    { category: 'hardware', plannedCents: 51_200, actualCents: 61_800 },
  ],
  billing: [
    buildBillingRow({
      billedCents: 40_000,
      invoice: { id: idOf(50), number: 2207, standing: 'overdue', daysOverdue: 6 },
    }),
    buildBillingRow({
      billingStageId: idOf(21),
      name: 'Installed',
      deposit: false,
      share: { remainder: true },
    }),
  ],
});
const job = buildJob({
  stage: 'building',
  version: 3,
  operations: [buildJobOperation({ plannedMinutes: 540, clockedMinutes: 258, thisWeekMinutes: 60 })],
  money,
});

async function open(role: Role = 'owner', answered: Job = job) {
  const screen = await openShopScreen(routes, `/jobs/${answered.id}`, buildMembership({ role }));
  const { http, shop, fixture } = screen;
  http.expectOne(shop(`/jobs/${answered.id}`)).flush(answered);
  await fixture.whenStable();
  http.match(shop(`/jobs/${answered.id}/costs`)).forEach((call) => call.flush({ rows: [buildJobCost()] }));
  http.match(shop(`/jobs/${answered.id}/files`)).forEach((call) => call.flush({ rows: [buildJobFile()] }));
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
  const press = async (text: string | RegExp) =>
    (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { ...screen, loader, press };
}

describe('JobDetail', () => {
  it('lays planned and built side by side for cost, hours and billing', async () => {
    const { loader } = await open();
    const pairs = await loader.getAllHarnesses(LeafPairHarness);
    expect(pairs).toHaveLength(3);
    expect(await pairs[0]!.lines()).toEqual([
      ['Material', '$2,180', '$2,061', '−$119'],
      ['Hardware', '$512', '$618', '+$106'],
      ['Total', '$2,692', '$2,679', expect.stringMatching(/^on pace for \$2,798$/)],
    ]);
    expect((await pairs[1]!.lines())[0]).toEqual(['Face frames', '9.0 h', '4.3 h', '−4.7 h']);
    expect((await pairs[2]!.lines())[1]).toEqual(['Installed', '$400', '$0', 'not billed']);
  });

  it('opens what a figure is made of', async () => {
    const { loader } = await open();
    const [cost] = await loader.getAllHarnesses(LeafPairHarness);
    await cost!.openWorking(0);
    const dialog = await loader.getHarness(MatDialogHarness);
    expect(await dialog.getText()).toMatch(/Material: what it is made of[^]*Maple plywood[^]*\$206\.10/);
  });

  it('drafts the invoice of a stage and goes to it', async () => {
    const { http, shop, press, element, harness } = await open();
    expect(element.textContent).toContain('6 days late');
    await press(/^Bill this stage/);
    const call = http.expectOne(shop('/invoices'));
    expect(call.request.body).toEqual({ from: 'stage', jobId: job.id, billingStageId: idOf(21) });
    call.flush({ id: idOf(60) } as never);
    await harness.fixture.whenStable();
  });

  it('goes on to the next stage by its one primary button, with the version that was read', async () => {
    const { http, shop, press, fixture, element } = await open();
    await press('Start finishing');
    const call = http.expectOne(shop(`/jobs/${job.id}/move`));
    expect(call.request.body).toEqual({ stage: 'finishing', confirmSkip: false, reason: '' });
    expect(call.request.headers.get('If-Match')).toBe('"3"');
    call.flush({ ...job, stage: 'finishing', version: 4 });
    await fixture.whenStable();
    expect(element.querySelector('[aria-current="step"]')?.textContent).toContain('Finishing');
  });

  it('asks before stages are skipped', async () => {
    const { http, shop, press, loader } = await open('owner', { ...job, stage: 'accepted' });
    await press('Site is measured').then(() => http.expectOne(shop(`/jobs/${job.id}/move`)));
    const stages = [...document.querySelectorAll<HTMLButtonElement>('bm-stage-track button')];
    stages.find((button) => button.textContent?.includes('Building'))!.click();
    const dialog = await loader.getHarness(MatDialogHarness);
    expect(await dialog.getText()).toContain('This skips Measured, Drawings approved, Materials in.');
  });

  it('reverses a cost for a reason, and reads every figure again', async () => {
    const { http, shop, press, loader, fixture } = await open();
    document.querySelector<HTMLButtonElement>('[aria-label="Reverse Maple plywood"]')!.click();
    await fixture.whenStable();
    await (
      await loader.getHarness(MatInputHarness.with({ ancestor: 'bm-confirm-dialog' }))
    ).setValue('Twice');
    await press('Reverse');
    const call = http.expectOne(shop(`/jobs/${job.id}/costs/${idOf(30)}/reverse`));
    expect(call.request.body).toEqual({ reason: 'Twice' });
    call.flush(buildJobCost({ id: idOf(31), amountCents: -20_610, reversesId: idOf(30) }));
    http.expectOne(shop(`/jobs/${job.id}/costs`));
    http.expectOne(shop(`/jobs/${job.id}`));
  });

  it('shows a lead hand hours and no money', async () => {
    const { element, loader, http, shop } = await open('lead-hand', { ...job, money: undefined });
    expect(await loader.getAllHarnesses(LeafPairHarness)).toHaveLength(1);
    expect(element.textContent).not.toMatch(/\$|Billing|Costs besides/);
    http.expectNone(shop(`/jobs/${job.id}/costs`));
    expect(element.querySelector('bm-page-head')?.textContent).toContain('Start finishing');
  });

  it('shows crew where, when and what, and lets them add photos and nothing else', async () => {
    const { element } = await open('crew', { ...job, money: undefined, notes: 'Scribe the left stile.' });
    expect(element.querySelector('h1')?.textContent).toBe(job.title);
    expect(element.textContent).toContain('Scribe the left stile.');
    const buttons = [...element.querySelectorAll('button, a[matbutton]')].map((each) =>
      each.textContent?.trim(),
    );
    expect(buttons.filter(Boolean)).toEqual(['Clock in', 'Take photo', 'Add files']);
    expect(element.textContent).not.toContain('$');
  });
});
