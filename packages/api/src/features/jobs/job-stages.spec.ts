import { defineAbility } from '@bookmatch/common/access/ability';
import type { Role } from '@bookmatch/common/access/roles';
import type { Job as JobView, JobRow, MoveJob } from '@bookmatch/common/jobs/jobs-contract';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ClockedOperation } from './clocked-time.js';
import type { JobInvoice } from './job-billing.js';
import { JobBillingStage } from './job-billing-stage.entity.js';
import { JobsService, type JobsParts } from './jobs-service.js';

/** What the slices above would say, set by each test. */
class Above implements JobsParts {
  clocked: ClockedOperation[] = [];
  atWork: string[] = [];
  invoices: JobInvoice[] = [];
  closed: string[] = [];
  closingFails = false;
  readonly time: JobsParts['time'] = {
    byOperation: () => Promise.resolve(this.clocked),
    clockedIn: () => Promise.resolve(this.atWork),
    sums: { minutes: '0', costCents: '0' },
  };
  readonly billing: JobsParts['billing'] = { invoicesOf: () => Promise.resolve(this.invoices) };
  readonly onClosed: JobsParts['onClosed'] = (_scope, job) => {
    if (this.closingFails) return Promise.reject(new TypeError('The books are shut.'));
    this.closed.push(job.id);
    return Promise.resolve();
  };
}

describe('a job on its way', () => {
  let api: TestApi;
  let shop: TestShop;
  let leadHand: Awaited<ReturnType<TestShop['join']>>;
  let customerId: string;
  let operations: Operation[];
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    leadHand = await shop.join('lead-hand');
    customerId = (
      (await shop.owner.post('/customers', { kind: 'homeowner', name: 'Ezra Poole' })).body as { id: string }
    ).id;
    operations = ((await shop.owner.get('/operations')).body as { rows: Operation[] }).rows;
  });
  afterAll(() => api.close());

  const make = async (fields: object = {}) =>
    (
      await shop.owner.post('/jobs', {
        title: 'Built-in hutch',
        customerId,
        contractNetCents: 200_000,
        plannedCosts: [
          { category: 'material', plannedCents: 60_000 },
          { category: 'labor', plannedCents: 40_000 },
        ],
        ...fields,
      })
    ).body as JobView;

  /** Works in the shop as a member would, with what the slices above say. */
  const asMember = <Result>(work: (scope: ShopScope) => Promise<Result>, role: Role = 'lead-hand') => {
    const { memberId, personId } = leadHand;
    const stamp = {
      author: { kind: 'member' as const, personId, memberId, role },
      requestId: 'test',
      now: api.clock.read(),
    };
    return api.platform.work.transaction(stamp, (scope) =>
      work(scope.forShop(shop.id, defineAbility({ memberId, role }))),
    );
  };
  const move = (above: Above, job: { id: string; version: number }, input: Partial<MoveJob>) =>
    asMember((scope) =>
      new JobsService(above).move(
        scope,
        job.id,
        { stage: 'closed', confirmSkip: false, reason: '', ...input },
        job.version,
      ),
    );

  it('goes stage by stage and remembers who took it there', async () => {
    const job = await make();
    const measured = await leadHand.client.post(
      `/jobs/${job.id}/move`,
      { stage: 'measured' },
      { version: 1 },
    );
    expect(measured.status).toBe(200);
    const skip = await leadHand.client.post(`/jobs/${job.id}/move`, { stage: 'building' }, { version: 2 });
    expect(skip.status).toBe(409);
    expect((skip.body as { detail: string }).detail).toMatch(/Drawings approved and Materials in/);
    const sure = { stage: 'building', confirmSkip: true };
    const moved = (await leadHand.client.post(`/jobs/${job.id}/move`, sure, { version: 2 })).body as JobView;
    expect(moved.stageHistory.map(({ stage, by }) => [stage, by])).toEqual([
      ['accepted', 'Owner 1'],
      ['measured', expect.stringMatching(/^lead-hand/)],
      ['building', expect.stringMatching(/^lead-hand/)],
    ]);
    const rows = ((await shop.owner.get('/jobs', { stage: 'building' })).body as { rows: JobRow[] }).rows;
    expect(rows.map((row) => row.id)).toEqual([job.id]);
  });

  it('is moved once when two move it at the same time', async () => {
    const job = await make();
    const answers = await Promise.all(
      Array.from({ length: 10 }, () =>
        shop.owner.post(`/jobs/${job.id}/move`, { stage: 'measured' }, { version: 1 }),
      ),
    );
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    const read = (await shop.owner.get(`/jobs/${job.id}`)).body as JobView;
    expect(read.stageHistory).toHaveLength(2);
  });

  it('is not closed while somebody is clocked in to it', async () => {
    const above = new Above();
    above.atWork = ['Ada Thorne'];
    const job = await make({ contractNetCents: 0 });
    await expect(move(above, job, { confirmSkip: true })).rejects.toMatchObject({
      code: 'conflict',
      detail: 'Ada Thorne is clocked in to this job.',
    });
    above.atWork = [];
    expect(await move(above, job, { confirmSkip: true })).toMatchObject({ stage: 'closed' });
    expect(above.closed).toEqual([job.id]);
  });

  it('is not closed with a stage unbilled, unless a reason is given and kept', async () => {
    const above = new Above();
    const job = await make();
    const stages = await asMember((scope) =>
      scope.rows(JobBillingStage).findBy({ jobId: job.id }, 'position'),
    );
    const invoiceOf = (stage: JobBillingStage, standing: JobInvoice['standing']): JobInvoice => ({
      id: stage.id,
      number: 2001,
      billingStageId: stage.id,
      standing,
      daysOverdue: 0,
      billedCents: stage.totalCents,
      billedNetCents: stage.netCents,
      paidCents: 0,
    });
    const last = stages.at(-1)!;
    above.invoices = stages.map((stage) => invoiceOf(stage, stage === last ? 'draft' : 'paid'));
    await expect(move(above, job, { confirmSkip: true })).rejects.toMatchObject({
      detail: expect.stringContaining(`${last.name} is not billed yet`),
    });
    const closed = await move(above, job, { confirmSkip: true, reason: 'The rest is a gift' });
    expect(closed.stageHistory.at(-1)).toMatchObject({ stage: 'closed', reason: 'The rest is a gift' });
    expect(closed.closedAt).not.toBeNull();

    const billed = await make();
    const own = await asMember((scope) => scope.rows(JobBillingStage).findBy({ jobId: billed.id }));
    above.invoices = own.map((stage) => invoiceOf(stage, 'due'));
    expect(await move(above, billed, { confirmSkip: true })).toMatchObject({ stage: 'closed' });
  });

  it('stays open when what has to happen at closing fails', async () => {
    const above = new Above();
    above.closingFails = true;
    const job = await make({ contractNetCents: 0 });
    await expect(move(above, job, { confirmSkip: true })).rejects.toThrow('The books are shut.');
    const read = (await shop.owner.get(`/jobs/${job.id}`)).body as JobView;
    expect(read).toMatchObject({ stage: 'accepted', closedAt: null, version: 1 });
    expect(read.stageHistory).toHaveLength(1);
  });

  it('is opened again to installing, and leaves the closed list', async () => {
    const above = new Above();
    const job = await make({ contractNetCents: 0 });
    const closed = await move(above, job, { confirmSkip: true });
    await expect(move(above, closed, { stage: 'building', confirmSkip: true })).rejects.toMatchObject({
      code: 'conflict',
    });
    expect(await move(above, closed, { stage: 'installing' })).toMatchObject({
      stage: 'installing',
      closedAt: null,
    });
  });

  it('lays clocked time and invoices beside the plan', async () => {
    const above = new Above();
    const [measure, cut] = operations;
    const install = operations.find((operation) => operation.costCategory === 'install')!;
    const job = await make({ operations: [{ operationId: cut!.id, plannedMinutes: 600 }] });
    const [deposit] = await asMember((scope) =>
      scope.rows(JobBillingStage).findBy({ jobId: job.id }, 'position'),
    );
    above.clocked = [
      { operationId: cut!.id, minutes: 240, thisWeekMinutes: 60, costCents: 20_000 },
      { operationId: install.id, minutes: 30, thisWeekMinutes: 30, costCents: 2_500 },
    ];
    above.invoices = [
      {
        ...{
          id: deposit!.id,
          number: 2001,
          billingStageId: deposit!.id,
          standing: 'overdue',
          daysOverdue: 6,
        },
        ...{ billedCents: 80_000, billedNetCents: 80_000, paidCents: 10_000 },
      },
      {
        ...{ id: job.id, number: null, billingStageId: null, standing: 'draft', daysOverdue: 0 },
        ...{ billedCents: 0, billedNetCents: 0, paidCents: 0 },
      },
    ];
    await shop.owner.post(`/jobs/${job.id}/costs`, {
      category: 'material',
      description: 'Maple plywood',
      amountCents: 70_000,
      onDate: '2026-06-01',
    });
    const read = await asMember((scope) => new JobsService(above).get(scope, job.id), 'owner');
    expect(read.operations).toEqual([
      {
        ...{ operationId: cut!.id, name: cut!.name, plannedMinutes: 600, clockedMinutes: 240 },
        ...{ category: 'labor', thisWeekMinutes: 60, plannedCostCents: 0, actualCostCents: 20_000 },
      },
      {
        ...{ operationId: install.id, name: install.name, plannedMinutes: 0, clockedMinutes: 30 },
        ...{ category: 'install', thisWeekMinutes: 30, plannedCostCents: 0, actualCostCents: 2_500 },
      },
    ]);
    expect(read.operations.map((row) => row.operationId)).not.toContain(measure!.id);
    // Planned 60,000 + 40,000; spent 70,000 + 20,000 + 2,500; so 112,500 is expected and 92,500 of it is done.
    expect(read.money).toMatchObject({
      plannedCostCents: 100_000,
      actualCostCents: 92_500,
      expectedCostCents: 112_500,
      percentComplete: '0.8222',
      earnedCents: 164_444,
      billedNetCents: 80_000,
      overBilledCents: -84_444,
      paidCents: 10_000,
    });
    expect(read.money!.costs).toContainEqual({ category: 'install', plannedCents: 0, actualCents: 2_500 });
    expect(read.money!.billing[0]).toMatchObject({
      billedCents: 80_000,
      invoice: { number: 2001, standing: 'overdue', daysOverdue: 6 },
    });
    expect(read.money!.billing.at(-1)).toMatchObject({ billedCents: 0, invoice: null });
  });
});
