import { randomUUID } from 'node:crypto';
import type { CustomerEstimate } from '@bookmatch/common/customer-page/customer-page-contract';
import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import type { Job, JobRow } from '@bookmatch/common/jobs/jobs-contract';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import { halfDown, line, sendEstimate } from '../../../test/harness/estimate-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

describe('the job of an accepted estimate', () => {
  let api: TestApi;
  let shop: TestShop;
  let operations: Operation[];
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    operations = ((await shop.owner.get('/operations')).body as { rows: Operation[] }).rows;
  });
  afterAll(() => api.close());

  const cut = () => operations.find(({ name }) => name === 'Cut sheet goods')!;
  const install = () => operations.find(({ costCategory }) => costCategory === 'install')!;

  const rooms = () => [
    {
      id: randomUUID(),
      name: 'Mudroom',
      lines: [
        line({ kind: 'material', quantity: '4', unitCostCents: 10_000, unitPriceCents: 16_000 }),
        line({
          ...{ kind: 'labor', unit: 'hour', quantity: '10', unitCostCents: 4_000, unitPriceCents: 7_500 },
          ...{ operationId: cut().id, plannedMinutesPerUnit: '60' },
        }),
        line({
          ...{ kind: 'install', unit: 'hour', quantity: '2.5', unitCostCents: 4_000, unitPriceCents: 8_000 },
          ...{ operationId: install().id, plannedMinutesPerUnit: '60' },
        }),
      ],
    },
  ];

  const accept = async () => {
    const { estimate, customer } = await sendEstimate(api, shop.owner, {
      rooms: rooms(),
      billingSchedule: halfDown(),
    });
    const { document, documentHash } = ((await customer.get('')).body as { estimate: CustomerEstimate })
      .estimate;
    const yes = { name: 'Ines Calder', revisionId: document.revisionId, documentHash, agreed: true };
    const accepted = await Promise.all(Array.from({ length: 5 }, () => customer.post('/accept', yes)));
    expect(accepted.some(({ status }) => status < 300)).toBe(true);
    const list = (await shop.owner.get('/jobs')).body as { rows: JobRow[] };
    const jobs = await Promise.all(
      list.rows.map(async ({ id }) => (await shop.owner.get(`/jobs/${id}`)).body as Job),
    );
    return { estimate, jobs: jobs.filter((job) => job.estimate?.id === estimate.id) };
  };

  it('is made once, with the plan and the schedule that were accepted', async () => {
    const { estimate, jobs } = await accept();
    expect(jobs).toHaveLength(1);
    const [job] = jobs;
    // 640.00 + 750.00 + 200.00 without tax; 5.5 % on it.
    expect(job).toMatchObject({
      title: 'Library wall',
      stage: 'accepted',
      estimate: { id: estimate.id, number: estimate.number, revisionNumber: 1 },
      stageHistory: [{ stage: 'accepted', by: null }],
      plannedMinutes: 750,
      operations: [
        { name: 'Cut sheet goods', plannedMinutes: 600, plannedCostCents: 40_000 },
        { name: 'Install', plannedMinutes: 150, plannedCostCents: 10_000 },
      ],
      money: {
        contractNetCents: 159_000,
        contractTaxCents: 8_745,
        contractTotalCents: 167_745,
        plannedCostCents: 90_000,
        costs: [
          { category: 'material', plannedCents: 40_000 },
          { category: 'labor', plannedCents: 40_000 },
          { category: 'install', plannedCents: 10_000 },
        ],
        billing: [
          {
            name: 'Deposit',
            deposit: true,
            plannedCents: 83_873,
            invoice: { number: null, standing: 'draft' },
          },
          { name: 'Installed', deposit: false, plannedCents: 83_872, invoice: null },
        ],
      },
    });
  });

  it('shows time as it is clocked and stages as they are billed, and closes when all is', async () => {
    const { jobs } = await accept();
    const { id } = jobs[0]!;
    const read = async () => (await shop.owner.get(`/jobs/${id}`)).body as Job;
    const { client: crew, memberId } = await shop.join('crew');
    const member = (
      (await shop.owner.get('/members')).body as { rows: { id: string; version: number }[] }
    ).rows.find((row) => row.id === memberId)!;
    await shop.owner.patch(
      `/members/${memberId}/labor-cost`,
      { laborCostCentsPerHour: 3_600 },
      member.version,
    );
    const entryId = randomUUID();
    const at = api.clock.read().toISOString();
    const punch = { jobId: id, operationId: cut().id, kind: 'work', source: 'phone' };
    expect((await crew.post('/time/clock-in', { ...punch, entryId, at })).status).toBeLessThan(300);
    const close = { stage: 'closed', confirmSkip: true };
    const early = await shop.owner.post(`/jobs/${id}/move`, close, { version: (await read()).version });
    expect(early.body).toMatchObject({ code: 'conflict', detail: expect.stringContaining('clocked in') });
    api.clock.forward({ hours: 2 });
    const out = { at: api.clock.read().toISOString() };
    expect((await crew.post(`/time/entries/${entryId}/clock-out`, out)).status).toBeLessThan(300);

    const worked = await read();
    expect(worked.operations[0]).toMatchObject({
      clockedMinutes: 120,
      thisWeekMinutes: 120,
      actualCostCents: 7_200,
    });
    expect(worked.money).toMatchObject({
      actualCostCents: 7_200,
      expectedCostCents: 90_000,
      percentComplete: '0.08',
      earnedCents: 12_720,
    });
    const row = ((await shop.owner.get('/jobs')).body as { rows: JobRow[] }).rows.find(
      (each) => each.id === id,
    );
    expect(row).toMatchObject({ clockedMinutes: 120, actualCostCents: 7_200 });

    const unbilled = await shop.owner.post(`/jobs/${id}/move`, close, { version: worked.version });
    expect(unbilled.body).toMatchObject({ fields: [{ path: 'reason' }] });
    const [deposit, last] = worked.money!.billing;
    const draft = (
      await shop.owner.post('/invoices', { from: 'stage', jobId: id, billingStageId: last!.billingStageId })
    ).body as Invoice;
    for (const invoiceId of [deposit!.invoice!.id, draft.id]) {
      const { version } = (await shop.owner.get(`/invoices/${invoiceId}`)).body as Invoice;
      expect((await shop.owner.post(`/invoices/${invoiceId}/issue`, {}, { version })).status).toBeLessThan(
        300,
      );
    }
    const billed = await read();
    expect(billed.money).toMatchObject({
      billedCents: 167_745,
      billedNetCents: 159_000,
      overBilledCents: 146_280,
    });
    expect(billed.money!.billing.map(({ invoice }) => invoice?.standing)).toEqual(['due', 'due']);
    const closed = await shop.owner.post(`/jobs/${id}/move`, close, { version: billed.version });
    expect(closed.body).toMatchObject({
      stage: 'closed',
      money: { percentComplete: '1', overBilledCents: 0 },
    });
    const late = { ...punch, entryId: randomUUID(), at: api.clock.read().toISOString() };
    expect((await crew.post('/time/clock-in', late)).status).toBeGreaterThanOrEqual(400);
  });
});
