import { buildJob, buildJobMoney } from '@bookmatch/common/testing/build-job';
import type { JobBillingRow } from '@bookmatch/common/jobs/jobs-contract';
import { nextStep } from './next-step';

const all = { bill: true, move: true };
const row = (overrides: Partial<JobBillingRow> = {}): JobBillingRow => ({
  billingStageId: '0190a1b2-0000-7000-8000-000000000001',
  name: 'Deposit',
  share: { percent: '40' },
  deposit: true,
  due: 'on-acceptance',
  plannedCents: 40_000,
  billedCents: 0,
  paidCents: 0,
  invoice: null,
  ...overrides,
});
const last = row({
  billingStageId: '0190a1b2-0000-7000-8000-000000000002',
  name: 'Installed',
  deposit: false,
});
const issued = {
  id: '0190a1b2-0000-7000-8000-000000000003',
  number: 2207,
  standing: 'due',
  daysOverdue: 0,
} as const;
const withBilling = (billing: JobBillingRow[], stage: 'building' | 'installing' = 'building') =>
  buildJob({ stage, money: buildJobMoney({ billing }) });

describe("a job's next step", () => {
  it('is a draft that waits to be issued, before everything', () => {
    const draft = { ...issued, number: null, standing: 'draft' } as const;
    const step = nextStep(withBilling([row({ invoice: draft }), last]), all);
    expect(step).toEqual({ kind: 'open-invoice', label: 'Issue the deposit', invoiceId: issued.id });
  });

  it('is to bill a deposit that nobody billed', () => {
    expect(nextStep(withBilling([row(), last]), all)).toMatchObject({
      kind: 'bill',
      label: 'Bill the deposit',
    });
  });

  it('is to bill the last stage only once the work is being installed', () => {
    const rows = [row({ invoice: issued }), last];
    expect(nextStep(withBilling(rows), all)).toMatchObject({ kind: 'move', label: 'Start finishing' });
    expect(nextStep(withBilling(rows, 'installing'), all)).toMatchObject({
      kind: 'bill',
      label: 'Bill Installed',
      billingStageId: last.billingStageId,
    });
  });

  it('is to close when all is billed, and nothing once closed', () => {
    const rows = [row({ invoice: issued }), { ...last, invoice: issued }];
    expect(nextStep(withBilling(rows, 'installing'), all)).toMatchObject({
      label: 'Close job',
      stage: 'closed',
    });
    expect(nextStep(buildJob({ stage: 'closed' }), all)).toBeNull();
  });

  it('is only what the member may do', () => {
    expect(nextStep(buildJob({ stage: 'accepted' }), { bill: false, move: true })).toMatchObject({
      label: 'Site is measured',
    });
    expect(nextStep(withBilling([row({ invoice: issued })]), { bill: true, move: false })).toBeNull();
    expect(nextStep(withBilling([row()]), { bill: false, move: false })).toBeNull();
  });
});
